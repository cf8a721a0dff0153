/** Access tokens of systems (RFC 6750): in the Authorization header, never in an address or a form. */
import type { Request, RequestHandler } from 'express';
import { TokenRefusal } from './refusal.ts';
import { cookieName } from './session.ts';

/** The token; '' when something else than a token follows the word Bearer; null when the request names no bearer. */
export function bearerToken(request: Request): string | null {
  const header = request.get('authorization');
  if (header === undefined || !/^bearer(\s|$)/i.test(header)) return null;
  return /^bearer +([\w.~+/-]+=*)$/i.exec(header)?.[1] ?? '';
}

/** A browser's session beside a token: whose act it would be, nobody could say, and checks made for one would be skipped for the other. */
export function refuseTwoIdentities(secure: boolean): RequestHandler {
  const session = new RegExp(`(^|;\\s*)${cookieName(secure)}=`);
  return (request, _response, next) => {
    if (bearerToken(request) === null || !session.test(request.get('cookie') ?? '')) return next();
    next(
      new TokenRefusal(
        'invalid_request',
        'two-identities',
        'Send either the session of a person or the access token of a system. Nothing was changed.',
      ),
    );
  };
}

/** The `WWW-Authenticate` header of an answer 401, and of one 403 about a token's scope. */
export function challengeOf(error: unknown, scope: string): string {
  if (!(error instanceof TokenRefusal)) return 'Bearer';
  return error.error === 'insufficient_scope' ? `Bearer error="${error.error}", scope="${scope}"` : `Bearer error="${error.error}"`;
}
