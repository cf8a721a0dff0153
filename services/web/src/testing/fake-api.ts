/** The API as component tests need it: canned answers by method and path, and what was asked. Never part of the built client. */
import type { Account, ProblemCode } from '@cairnstep/contract';
import { problems } from '@cairnstep/contract';
import { afterEach, vi } from 'vitest';

export interface Asked {
  readonly method: string;
  readonly path: string;
  readonly search: string;
  readonly headers: Headers;
  readonly body: unknown;
}

type Answer = unknown | ((asked: Asked) => Response | Promise<Response>);

afterEach(() => vi.unstubAllGlobals());

/** Answers `'GET /api/account'` and the like; anything unlisted is a `not-found` refusal. Returns what was asked so far. */
export function fakeApi(answers: Readonly<Record<string, Answer>>): readonly Asked[] {
  const log: Asked[] = [];
  vi.stubGlobal('fetch', async (address: string, init: RequestInit = {}) => {
    const url = new URL(address, 'http://localhost');
    const asked = {
      method: init.method ?? 'GET',
      path: url.pathname,
      search: url.search,
      headers: new Headers(init.headers),
      body: typeof init.body === 'string' ? (JSON.parse(init.body) as unknown) : init.body,
    };
    log.push(asked);
    const answer = answers[`${asked.method} ${asked.path}`];
    if (answer === undefined) return refusal('not-found');
    return typeof answer === 'function' ? (answer as (asked: Asked) => Response)(asked) : json(answer);
  });
  return log;
}

export function json(body: unknown, status = 200): Response {
  return new Response(JSON.stringify(body), { status, headers: { 'Content-Type': 'application/json' } });
}

export function refusal(
  code: ProblemCode,
  detail = 'Nothing was changed.',
  errors?: readonly { pointer: string; detail: string }[],
): Response {
  const { status, title } = problems[code];
  const body = { type: `/problems/${code}`, status, title, detail, instance: '/requests/1', ...(errors && { errors }) };
  return new Response(JSON.stringify(body), { status, headers: { 'Content-Type': 'application/problem+json; charset=utf-8' } });
}

export const nobody: Account = {
  signedIn: false,
  name: null,
  institution: null,
  grants: [],
  may: [],
  demonstration: false,
  contact: 'office@cairnstep.example',
};

export const site = { id: '6f1de0c4-52f6-4f3a-9d0e-2b7f3f1c8a11', code: 'S01', name: 'North Harbour Clinic' };

export function signedInAs(...grants: readonly Pick<Account['grants'][number], 'role' | 'site'>[]): Account {
  return {
    ...nobody,
    signedIn: true,
    name: 'Mara Lind',
    institution: 'North Harbour Clinic',
    grants: grants.map(({ role, site: at }, index) => ({
      id: `6f1de0c4-52f6-4f3a-9d0e-0000000000${String(index).padStart(2, '0')}`,
      role,
      site: at,
      startsOn: '2026-01-01',
      endsOn: null,
    })),
  };
}
