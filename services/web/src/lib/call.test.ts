import { acceptInvitation, getGrid, getPublicFigures, listSubmissions, putSubmissionFile, removeSubmissionFile } from '@cairnstep/contract';
import { describe, expect, it } from 'vitest';
import { fakeApi, nobody, refusal } from '../testing/fake-api.ts';
import { addressOf, call } from './call.ts';
import { ProblemError, UnexpectedAnswerError, UnreachableError } from './problem-error.ts';
import { worthRetrying } from './query-client.ts';

const id = '6f1de0c4-52f6-4f3a-9d0e-2b7f3f1c8a11';
const token = 'x'.repeat(43);

describe('the address of a call', () => {
  it('holds path and query parameters, encoded, and leaves out what was not given', () => {
    expect(addressOf(listSubmissions, { siteId: id, page: 3 })).toBe(`/api/submissions?siteId=${id}&page=3`);
    expect(addressOf(getGrid, { outcome: 'speed & more' })).toBe('/api/explore/grid?outcome=speed+%26+more');
    expect(addressOf(removeSubmissionFile, { submissionId: id, table: 'sessions' })).toBe(`/api/submissions/${id}/files/sessions`);
  });
});

describe('a call', () => {
  it('sends only the body as JSON and says that it comes from the client', async () => {
    const asked = fakeApi({ [`POST /api/invitations/${token}/accept`]: nobody });
    await call(acceptInvitation, { token });
    expect(asked[0]?.body).toEqual({});
    expect(asked[0]?.headers.get('X-Cairnstep-Request')).toBe('1');
    expect(asked[0]?.headers.get('Content-Type')).toBe('application/json');
  });

  it('sends a file as it is', async () => {
    const asked = fakeApi({});
    const file = new Blob(['a,b\r\n'], { type: 'text/csv' });
    await expect(call(putSubmissionFile, { submissionId: id, table: 'sessions', fileName: 'a b.csv' }, { file })).rejects.toThrow(
      ProblemError,
    );
    expect(asked[0]).toMatchObject({ method: 'PUT', search: '?fileName=a+b.csv', body: file });
    expect(asked[0]?.headers.get('Content-Type')).toBe('text/csv');
  });

  it('throws a refusal with its code, words and places', async () => {
    fakeApi({
      'GET /api/public/figures': () => refusal('invalid-input', 'Mend it.', [{ pointer: '/form/title', detail: 'Write a title' }]),
    });
    const failure = await call(getPublicFigures, {}).catch((error: unknown) => error);
    expect(failure).toBeInstanceOf(ProblemError);
    expect(failure).toMatchObject({
      code: 'invalid-input',
      status: 400,
      detail: 'Mend it.',
      errors: [{ pointer: '/form/title', detail: 'Write a title' }],
    });
  });

  it('does not pass on an answer that is not what the contract promises', async () => {
    fakeApi({ 'GET /api/public/figures': { sites: 'many' } });
    await expect(call(getPublicFigures, {})).rejects.toThrow(UnexpectedAnswerError);
  });

  it('tells a page of a proxy from a refusal', async () => {
    fakeApi({ 'GET /api/public/figures': () => new Response('<h1>Bad gateway</h1>', { status: 502 }) });
    await expect(call(getPublicFigures, {})).rejects.toMatchObject({ name: 'UnexpectedAnswerError', status: 502 });
  });

  it('says that the registry cannot be reached when no answer comes', async () => {
    fakeApi({
      'GET /api/public/figures': () => {
        throw new TypeError('network');
      },
    });
    await expect(call(getPublicFigures, {})).rejects.toThrow(UnreachableError);
  });
});

describe('another try', () => {
  it('is made after silence and failures on the other side, twice at most', () => {
    expect(worthRetrying(0, new UnreachableError())).toBe(true);
    expect(worthRetrying(1, new UnexpectedAnswerError(502))).toBe(true);
    expect(worthRetrying(2, new UnreachableError())).toBe(false);
  });

  it('is never made after a refusal', async () => {
    fakeApi({ 'GET /api/public/figures': () => refusal('not-permitted') });
    const failure = await call(getPublicFigures, {}).catch((error: unknown) => error);
    expect(worthRetrying(0, failure)).toBe(false);
    expect(worthRetrying(0, new UnexpectedAnswerError(400))).toBe(false);
  });
});
