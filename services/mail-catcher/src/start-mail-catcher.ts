/** An SMTP server that delivers nothing, and the pages that show what it was given. */
import { createServer } from 'node:http';
import type { Server } from 'node:net';
import type { AddressInfo } from 'node:net';
import { buffer } from 'node:stream/consumers';
import { standInHeaders, stylesheet, stylesheetPath } from '@cairnstep/fake-oidc/stand-in-page';
import express from 'express';
import type { Express } from 'express';
import { SMTPServer } from 'smtp-server';
import { openMailbox } from './mailbox.ts';
import type { CaughtMail, Mailbox } from './mailbox.ts';
import { listPage, messagePage, notFoundPage } from './pages.ts';

export interface MailCatcherOptions {
  /** 0 takes any free port. */
  readonly smtpPort: number;
  /** 0 takes any free port. */
  readonly httpPort: number;
  readonly host?: string;
  /** How many mails are kept; the oldest give way. Default 500. */
  readonly cap?: number;
  /** Where mails outlast a restart; without it they are kept in memory alone. */
  readonly folder?: string;
}

export interface MailCatcher {
  readonly smtpPort: number;
  readonly httpUrl: string;
  /** Newest first. */
  messages(): readonly CaughtMail[];
  clear(): void;
  close(): Promise<void>;
}

const largestMailBytes = 10_000_000;

function makePages(mailbox: Mailbox): Express {
  const app = express();
  app.disable('x-powered-by');
  app.use(standInHeaders());
  app.use((_request, response, next) => {
    response.set('cache-control', 'no-store');
    next();
  });
  app.get(stylesheetPath, (_request, response) => void response.type('css').send(stylesheet));
  app.get('/', (_request, response) => void response.send(listPage(mailbox.all())));
  app.get('/messages.json', (_request, response) => void response.json(mailbox.all()));
  app.get('/messages/:id', (request, response) => {
    const mail = mailbox.all().find(({ id }) => String(id) === request.params.id);
    if (mail === undefined) response.status(404).send(notFoundPage());
    else response.send(messagePage(mail));
  });
  app.post('/clear', (_request, response) => {
    mailbox.clear();
    response.redirect(303, '/');
  });
  app.use((_request, response) => void response.status(404).send(notFoundPage()));
  return app;
}

function makeSmtpServer(mailbox: Mailbox): SMTPServer {
  return new SMTPServer({
    banner: 'local mail catcher, delivers nothing',
    // On the loopback interface, for one program: neither encryption nor a password would protect anything.
    disabledCommands: ['AUTH', 'STARTTLS'],
    size: largestMailBytes,
    onData(stream, _session, done) {
      buffer(stream)
        .then((raw) => {
          if (stream.sizeExceeded) throw Object.assign(new Error(`Mail larger than ${largestMailBytes} bytes`), { responseCode: 552 });
          return mailbox.keep(raw);
        })
        .then(
          () => done(),
          (error: Error) => done(error),
        );
    },
  });
}

const listening = (server: Server, port: number, host: string): Promise<number> =>
  new Promise((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, host, () => resolve((server.address() as AddressInfo).port));
  });

/** Starts both doors and resolves once they answer. */
export async function startMailCatcher(options: MailCatcherOptions): Promise<MailCatcher> {
  const host = options.host ?? '127.0.0.1';
  const mailbox = openMailbox(options.cap ?? 500, options.folder);
  const smtp = makeSmtpServer(mailbox);
  const http = createServer(makePages(mailbox));
  const smtpPort = await listening(smtp.server, options.smtpPort, host);
  const httpPort = await listening(http, options.httpPort, host);
  return {
    smtpPort,
    httpUrl: `http://${host}:${httpPort}`,
    messages: () => mailbox.all(),
    clear: () => mailbox.clear(),
    async close() {
      http.closeAllConnections();
      await Promise.all([
        new Promise<void>((resolve) => http.close(() => resolve())),
        new Promise<void>((resolve) => smtp.close(() => resolve())),
      ]);
    },
  };
}
