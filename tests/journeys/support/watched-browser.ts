/**
 * A browser with a profile of its own, all of whose traffic passes a recorder: pages, frames and workers alike, addresses, headers,
 * bodies and the bytes of every tunnel. What it keeps is on disk afterwards, to be looked through.
 */
import { mkdtempSync, readdirSync, readFileSync, rmSync } from 'node:fs';
import { createServer, request } from 'node:http';
import type { IncomingMessage, ServerResponse } from 'node:http';
import { connect } from 'node:net';
import type { AddressInfo, Socket } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { chromium } from '@playwright/test';
import type { BrowserContext, Page } from '@playwright/test';
import { test as journey } from './journey.ts';

export interface WatchedBrowser {
  readonly context: BrowserContext;
  readonly page: Page;
  /** Every byte that has left the browser so far. */
  readonly sent: () => Buffer;
  /** Closes it; then everything that it left on disk, downloads apart. */
  readonly closeAndRead: () => Promise<Buffer>;
}

/** Passes requests on and keeps what it passed. */
function recordingProxy(pieces: Buffer[]) {
  const proxy = createServer((incoming: IncomingMessage, answer: ServerResponse) => {
    pieces.push(Buffer.from(`${incoming.method} ${incoming.url}\r\n${incoming.rawHeaders.join('\r\n')}\r\n`));
    incoming.on('data', (chunk: Buffer) => pieces.push(chunk));
    const onward = request(incoming.url ?? '', { method: incoming.method, headers: incoming.headers }, (response) => {
      answer.writeHead(response.statusCode ?? 502, response.rawHeaders);
      response.pipe(answer);
    });
    onward.on('error', () => answer.destroy());
    incoming.pipe(onward);
  });
  // Web sockets, and whatever else asks for a tunnel.
  proxy.on('connect', (incoming: IncomingMessage, socket: Socket, head: Buffer) => {
    pieces.push(Buffer.from(`CONNECT ${incoming.url}\r\n`), head);
    const [host = '', port = '443'] = (incoming.url ?? '').split(':');
    const onward = connect(Number(port), host, () => {
      socket.write('HTTP/1.1 200 Connection established\r\n\r\n');
      onward.write(head);
      onward.pipe(socket);
    });
    socket.on('data', (chunk: Buffer) => {
      pieces.push(chunk);
      onward.write(chunk);
    });
    for (const end of [onward, socket]) end.on('error', () => end.destroy());
    socket.on('close', () => onward.destroy());
  });
  return proxy;
}

function filesUnder(folder: string): Buffer[] {
  return readdirSync(folder, { withFileTypes: true, recursive: true })
    .filter((entry) => entry.isFile())
    .map((entry) => readFileSync(join(entry.parentPath, entry.name)));
}

/** A journey in such a browser. */
export const test = journey.extend<{ readonly watched: WatchedBrowser }>({
  watched: async ({ launchOptions, contextOptions, locale, timezoneId, baseURL, listen }, use) => {
    const pieces: Buffer[] = [];
    const proxy = recordingProxy(pieces);
    // Tunnels too: the server itself forgets them.
    const sockets = new Set<Socket>();
    proxy.on('connection', (socket) => sockets.add(socket));
    await new Promise<void>((resolve) => proxy.listen(0, '127.0.0.1', resolve));
    const folder = mkdtempSync(join(tmpdir(), 'cairnstep-watched-'));
    const context = await chromium.launchPersistentContext(join(folder, 'profile'), {
      ...launchOptions,
      ...contextOptions,
      downloadsPath: join(folder, 'downloads'),
      proxy: { server: `http://127.0.0.1:${(proxy.address() as AddressInfo).port}` },
      ...(locale === undefined ? {} : { locale }),
      ...(timezoneId === undefined ? {} : { timezoneId }),
      ...(baseURL === undefined ? {} : { baseURL }),
    });
    listen(context);
    await use({
      context,
      page: context.pages()[0] ?? (await context.newPage()),
      sent: () => Buffer.concat(pieces),
      closeAndRead: async () => {
        await context.close();
        return Buffer.concat(filesUnder(join(folder, 'profile')));
      },
    });
    await context.close();
    for (const socket of sockets) socket.destroy();
    await new Promise((resolve) => proxy.close(resolve));
    rmSync(folder, { recursive: true, force: true });
  },
});
