/** The built client: hashed files for ever, pages always asked for anew, and the preparing page under a policy of its own. */
import { existsSync, readFileSync } from 'node:fs';
import { readFile } from 'node:fs/promises';
import path from 'node:path';
import express, { type Express, type RequestHandler } from 'express';
import { z } from 'zod';

const preparingPage = 'prepare.html';
/** Written beside the page by its build: what it hashes to, and the policy it carries itself. */
const PreparingNote = z.object({ sha256: z.string(), contentSecurityPolicy: z.string().min(1) });

/**
 * The preparing page sees record numbers and dates. As an answer it has the policy that it carries in itself, and is put into a
 * sandbox besides: an origin of its own, so that it reaches neither the page around it, nor its session, nor any storage; no pop-up and
 * no other page in the window. Its forms are heard by its script alone: the policy lets none be sent.
 */
function servePreparing(folder: string): RequestHandler {
  const note = PreparingNote.parse(JSON.parse(readFileSync(path.join(folder, preparingPage.replace('.html', '.json')), 'utf8')));
  const policy = `${note.contentSecurityPolicy}; frame-ancestors 'self'; sandbox allow-scripts allow-downloads allow-forms`;
  return (_request, response) => {
    response.setHeader('Content-Security-Policy', policy);
    response.setHeader('Cache-Control', 'no-cache');
    // An origin of its own cannot be keyed by the address.
    response.removeHeader('Origin-Agent-Cluster');
    response.sendFile(path.join(folder, preparingPage));
  };
}

export interface WebSettings {
  /** Where the built client is; undefined where another server has it. */
  readonly folder: string | undefined;
  /** Said in the page itself, so that the line about invented data is there before any answer and moves nothing. */
  readonly demonstration: boolean;
}

export function serveWeb(app: Express, { folder, demonstration }: WebSettings): void {
  if (!folder || !existsSync(path.join(folder, 'index.html'))) return;
  app.use('/assets', express.static(path.join(folder, 'assets'), { immutable: true, maxAge: '1y', fallthrough: false }));
  if (existsSync(path.join(folder, preparingPage))) {
    app.get(`/${preparingPage}`, servePreparing(folder));
    app.get('/prepare.json', (_request, response, next) => {
      response.setHeader('Cache-Control', 'no-cache');
      next();
    });
  }
  app.use(express.static(folder, { index: false, maxAge: '1h' }));
  app.get('/{*path}', async (_request, response) => {
    const page = await readFile(path.join(folder, 'index.html'), 'utf8');
    response.setHeader('Cache-Control', 'no-cache');
    response.type('html').send(demonstration ? page.replace('<html', '<html data-demonstration') : page);
  });
}
