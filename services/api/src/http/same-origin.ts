/**
 * Requests that change something must come from the application itself. Browsers state where a request comes from;
 * the custom header cannot be sent by a form or across origins without a permission this server never gives.
 */
import type { RequestHandler } from 'express';
import { bearerToken } from './bearer-token.ts';
import { Refusal } from './refusal.ts';

const safe = new Set(['GET', 'HEAD', 'OPTIONS']);

export function sameOrigin(publicUrl: string, exempt: readonly string[]): RequestHandler {
  const origin = new URL(publicUrl).origin;
  return (request, _response, next) => {
    // A token is sent by a program on purpose, never by a browser on its own as it sends cookies; both together have been refused before.
    if (safe.has(request.method) || exempt.includes(request.path) || bearerToken(request) !== null) return next();
    const from = request.get('origin');
    const site = request.get('sec-fetch-site');
    const ours =
      request.get('x-cairnstep-request') === '1' &&
      (from === undefined || from === origin) &&
      (site === undefined || site === 'same-origin');
    if (!ours) return next(new Refusal('request-not-from-here', 'Open the application itself and try again. Nothing was changed.'));
    next();
  };
}
