/** How the client's pages are served: what the page that sees record numbers may do, and what the page around it. */
import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import supertest from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startTestServer, type TestServer } from '../support/server.ts';

const carried = "default-src 'none'; script-src 'sha256-AAAA'; worker-src data:; connect-src 'none'; form-action 'none'; base-uri 'none'";

let folder: string;
let server: TestServer;
beforeAll(async () => {
  folder = mkdtempSync(join(tmpdir(), 'cairnstep-client-'));
  mkdirSync(join(folder, 'assets'));
  writeFileSync(join(folder, 'index.html'), '<title>client</title>');
  writeFileSync(join(folder, 'prepare.html'), '<title>preparing</title>');
  writeFileSync(
    join(folder, 'prepare.json'),
    JSON.stringify({ file: 'prepare.html', bytes: 24, sha256: 'ab', contentSecurityPolicy: carried }),
  );
  server = await startTestServer({ WEB_DIST: folder });
});
afterAll(async () => {
  await server.close();
  rmSync(folder, { recursive: true, force: true });
});

const get = (path: string) => supertest(server.url).get(path);
const policyOf = (answer: supertest.Response): ReadonlyMap<string, string> =>
  new Map(
    (answer.headers['content-security-policy'] as string).split(';').map((part) => {
      const [name = '', ...values] = part.trim().split(' ');
      return [name, values.join(' ')];
    }),
  );

describe('the preparing page', () => {
  it('is answered with the policy that it carries itself, in a sandbox without its address’s origin', async () => {
    const answer = await get('/prepare.html').expect(200, '<title>preparing</title>');
    expect(answer.headers['content-security-policy']).toContain(carried);
    const policy = policyOf(answer);
    expect(policy.get('connect-src')).toBe("'none'");
    expect(policy.get('form-action')).toBe("'none'");
    expect(policy.get('sandbox')).toBe('allow-scripts allow-downloads allow-forms');
  });

  it('may be framed by the client and by nobody else', async () => {
    const answer = await get('/prepare.html');
    expect(policyOf(answer).get('frame-ancestors')).toBe("'self'");
    expect(answer.headers['x-frame-options']).toBe('SAMEORIGIN');
    expect(answer.headers['cross-origin-resource-policy']).toBe('same-origin');
  });

  it('is asked for anew each time, and so is the note of what it hashes to', async () => {
    expect((await get('/prepare.html')).headers['cache-control']).toBe('no-cache');
    const note = await get('/prepare.json').expect(200);
    expect(note.headers['cache-control']).toBe('no-cache');
    expect(note.body).toMatchObject({ file: 'prepare.html', sha256: 'ab' });
  });
});

describe('every other page', () => {
  it('may frame pages of this address, runs nothing inline, and may itself be framed by nobody', async () => {
    const policy = policyOf(await get('/submit/anything/prepare').expect(200, '<title>client</title>'));
    expect(policy.get('frame-src')).toBe("'self'");
    expect(policy.get('frame-ancestors')).toBe("'none'");
    expect(policy.get('script-src')).toBe("'self'");
    expect(policy.has('sandbox')).toBe(false);
  });
});

describe('a client built without the preparing page', () => {
  it('is served as it is', async () => {
    const without = mkdtempSync(join(tmpdir(), 'cairnstep-client-'));
    writeFileSync(join(without, 'index.html'), '<title>client</title>');
    const other = await startTestServer({ WEB_DIST: without });
    await supertest(other.url).get('/prepare.html').expect(200, '<title>client</title>');
    await other.close();
    rmSync(without, { recursive: true, force: true });
  });
});

describe('the client’s page', () => {
  const page = '<!doctype html>\n<html lang="en-GB">\n<title>client</title>';

  it.each([
    ['yes', '<html data-demonstration lang="en-GB">'],
    ['no', '<html lang="en-GB">'],
  ])('says itself whether the data are invented (%s), at every address', async (demonstration, tag) => {
    writeFileSync(join(folder, 'index.html'), page);
    const other = await startTestServer({ WEB_DIST: folder, DEMONSTRATION: demonstration });
    try {
      const answer = await supertest(other.url).get('/explore').expect(200);
      expect(answer.text).toContain(tag);
      expect(answer.headers['content-type']).toMatch(/^text\/html/);
      expect(answer.headers['cache-control']).toBe('no-cache');
      await supertest(other.url)
        .get('/explore')
        .set('If-None-Match', answer.headers['etag'] as string)
        .expect(304);
    } finally {
      await other.close();
    }
  });
});
