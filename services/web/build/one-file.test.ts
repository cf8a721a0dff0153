/** A small page with a worker, a style and a font, built as the preparing page is. */
import { createHash } from 'node:crypto';
import { mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { build } from 'vite';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { oneFile } from './one-file.ts';

let folder: string;
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'cairnstep-one-file-'));
});
afterAll(() => rmSync(folder, { recursive: true, force: true }));

interface Built {
  readonly html: string;
  readonly note: { readonly file: string; readonly bytes: number; readonly sha256: string; readonly contentSecurityPolicy: string };
}

const main = `import './page.css';\nimport Start from './answer.ts?worker';\nnew Start().onmessage = ({ data }) => (document.title = data + '</script><!--');`;

async function buildPage({ script = main, worker = "postMessage('answered');", limit = 100_000 } = {}): Promise<Built> {
  const root = mkdtempSync(join(folder, 'page-'));
  const fonts = join(root, '@fontsource');
  mkdirSync(fonts);
  const files = {
    'page.html':
      '<!doctype html><html><head><meta charset="utf-8" /></head><body><script type="module" src="/main.ts"></script></body></html>',
    'main.ts': script,
    'answer.ts': worker,
    'page.css': "@import './@fontsource/font.css';\nbody { color: black }",
    '@fontsource/font.css': "@font-face { font-family: A; src: url(./a.woff2) format('woff2'), url(./a.woff) format('woff'); }",
    '@fontsource/a.woff2': 'new',
    '@fontsource/a.woff': 'old',
  };
  for (const [name, text] of Object.entries(files)) writeFileSync(join(root, name), text);
  await build({ root, configFile: false, logLevel: 'silent', plugins: [oneFile({ page: 'page.html', limit })], worker: { format: 'es' } });
  const html = readFileSync(join(root, 'dist/page.html'), 'utf8');
  return { html, note: JSON.parse(readFileSync(join(root, 'dist/page.json'), 'utf8')) as Built['note'] };
}

const sha256 = (text: string, encoding: 'base64' | 'hex') => createHash('sha256').update(text).digest(encoding);

describe('oneFile', () => {
  it('leaves nothing to fetch: script, worker, style and font are in the file', async () => {
    const { html } = await buildPage();
    expect(html).not.toMatch(/ (src|href)="/);
    expect(html).toContain('answered');
    expect(html).toMatch(/url\(["']?data:font\/woff2;base64,/);
    expect(html).not.toContain(Buffer.from('old').toString('base64'));
  });

  it('allows just the texts in it, by their hashes, and no connection', async () => {
    const { html, note } = await buildPage();
    const script = /<script type="module">([\s\S]*?)<\/script>/.exec(html)?.[1] ?? '';
    const style = /<style>([\s\S]*?)<\/style>/.exec(html)?.[1] ?? '';
    expect(note.contentSecurityPolicy).toBe(
      `default-src 'none'; script-src 'sha256-${sha256(script, 'base64')}'; style-src 'sha256-${sha256(style, 'base64')}'; font-src data:; img-src data:; worker-src data:; connect-src 'none'; form-action 'none'; base-uri 'none'`,
    );
    expect(html).toContain(`<meta http-equiv="Content-Security-Policy" content="${note.contentSecurityPolicy}" />`);
    // Neither ends the script early.
    expect(script).toMatch(/<\\\/script>\\x3C!--/);
  });

  it('says what the file hashes to, and comes out the same each time', async () => {
    const [first, second] = [await buildPage(), await buildPage()];
    expect(first.note).toMatchObject({ file: 'page.html', bytes: Buffer.byteLength(first.html), sha256: sha256(first.html, 'hex') });
    expect(second).toEqual(first);
  });

  it('refuses a script that could send or keep something, in the page and in its worker', async () => {
    await expect(buildPage({ script: "import './page.css';\nvoid fetch('/a');" })).rejects.toThrow(
      'could connect or keep something by: fetch.',
    );
    await expect(buildPage({ worker: "postMessage(indexedDB.open('a'));" })).rejects.toThrow('indexedDB');
  });

  it('refuses a file over its limit', async () => {
    await expect(buildPage({ limit: 100 })).rejects.toThrow(/bytes gzipped, \d+ over the limit of 100\./);
  });
});
