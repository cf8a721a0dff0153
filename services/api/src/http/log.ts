/** Structured logs: method, route pattern, status, time, request id. Never a body, a query value, a cookie, a token or a participant's value. */
import { randomUUID } from 'node:crypto';
import type { IncomingMessage, ServerResponse } from 'node:http';
import { pino, type Logger } from 'pino';
import { pinoHttp } from 'pino-http';
import type { RequestHandler } from 'express';

export const makeLogger = (level: string, part: string): Logger => pino({ level, base: { part } });

/** What of an error may be written: its kind and where it arose. Messages and details of PostgreSQL hold values, so they stay out. */
export function errorFacts(error: unknown): { kind: string; code?: string; at?: string } {
  if (!(error instanceof Error)) return { kind: typeof error };
  const code = (error as { code?: unknown }).code;
  const at = error.stack
    ?.split('\n')
    .filter((text) => text.trimStart().startsWith('at '))
    .slice(0, 6)
    .map((text) => text.trim())
    .join(' < ');
  return { kind: error.name, ...(typeof code === 'string' ? { code } : {}), ...(at ? { at } : {}) };
}

/** The pattern of the address, never the address: ids and tokens stand in it. */
const withRoute = (request: IncomingMessage, _response: ServerResponse, facts: object): object => ({
  ...facts,
  route: (request as { route?: { path?: string } }).route?.path ?? null,
});

export function requestLog(logger: Logger): RequestHandler {
  return pinoHttp({
    logger,
    genReqId: (_request, response) => {
      const id = randomUUID();
      response.setHeader('X-Request-Id', id);
      return id;
    },
    autoLogging: true,
    quietReqLogger: true,
    customSuccessObject: withRoute,
    customErrorObject: (request, response, _error, facts: object) => withRoute(request, response, facts),
    serializers: {
      req: (request: { id: unknown; method: string }) => ({ id: request.id, method: request.method }),
      res: (response: { statusCode: number }) => ({ status: response.statusCode }),
      err: errorFacts,
    },
  }) as unknown as RequestHandler;
}
