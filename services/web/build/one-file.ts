/**
 * Puts a page with its script, worker, styles and fonts into one HTML file that fetches nothing, and writes down what that file
 * hashes to. No published plugin does both this and a security policy by hash, and there is little to it.
 */
import { createHash } from 'node:crypto';
import { gzipSync } from 'node:zlib';
import type { Plugin } from 'vite';
import { ways } from './ways-out.ts';

export interface OneFileOptions {
  /** The page, as it is called in the source and in the output. */
  readonly page: string;
  /** Ceiling of the whole file, bytes gzipped. */
  readonly limit: number;
}

const hashOf = (text: string): string => `'sha256-${createHash('sha256').update(text).digest('base64')}'`;

/** What the file may do, in a browser that has it from a server or from a disk: run just these texts, and connect to nothing. */
const policyOf = (script: string, style: string): string =>
  [
    "default-src 'none'",
    `script-src ${hashOf(script)}`,
    `style-src ${hashOf(style)}`,
    'font-src data:',
    'img-src data:',
    'worker-src data:',
    "connect-src 'none'",
    "form-action 'none'",
    "base-uri 'none'",
  ].join('; ');

/** Within a script element these would end it, or begin a comment; in strings and patterns of JavaScript the escape means the same. */
const asInlineScript = (code: string): string => code.replaceAll(/<(?=\/script|!--)/gi, '\\x3C').trim();

/** Every browser that runs the client reads woff2; the second format would only make the file larger. */
const withoutOldFonts = (css: string): string =>
  css.replaceAll(/,\s*url\(["']?data:font\/woff;base64,[^)]*\)\s*format\(["']woff["']\)/g, '');

const inlineWorker = /\?worker&inline$/;

/**
 * A page in a sandbox or on a disk has an origin of its own. There Chromium starts no module from a `blob:` address, and takes a
 * script from one for insecure, without cryptography; from a `data:` address both are as they should be.
 */
const startingFrom = (text: string): string =>
  `export default function start(options) {
    return new Worker('data:text/javascript;charset=utf-8,' + encodeURIComponent(${text}), { type: 'module', name: options?.name });
  }`;

/** `<page>` becomes one file, and `<page without .html>.json` tells its size, its SHA-256 and the policy it carries. */
export function oneFile({ page, limit }: OneFileOptions): Plugin {
  return {
    name: 'one-file',
    enforce: 'pre',
    apply: 'build',
    config: () => ({
      build: {
        assetsInlineLimit: Number.MAX_SAFE_INTEGER,
        cssCodeSplit: false,
        modulePreload: false,
        rolldownOptions: { input: page, output: { codeSplitting: false } },
      },
    }),
    // The worker's text is in the file, and its address holds that text: it is bound by the policy of the page that starts it.
    resolveId: {
      filter: { id: /\?worker$/ },
      handler(source, importer) {
        return this.resolve(`${source}&inline`, importer, { skipSelf: true });
      },
    },
    transform: {
      filter: { id: inlineWorker },
      handler(code) {
        const text = /^\s*const jsContent = (".*");$/m.exec(code)?.[1];
        if (text === undefined) return this.error('The bundler hands over the text of a worker in a form that is not known here.');
        return startingFrom(text);
      },
    },
    generateBundle: {
      order: 'post',
      handler(_options, bundle) {
        const outputs = Object.values(bundle);
        const html = outputs.find(({ fileName }) => fileName === page);
        const script = outputs.find((output) => output.type === 'chunk');
        const style = outputs.find(({ fileName }) => fileName.endsWith('.css'));
        if (html?.type !== 'asset' || script?.type !== 'chunk' || style?.type !== 'asset' || outputs.length !== 3)
          return this.error(`Expected a page, a script and a style sheet, and there are: ${Object.keys(bundle).join(', ')}.`);
        const found = ways(script.code);
        if (found.length > 0) this.error(`The file could connect or keep something by: ${found.join(', ')}.`);

        const code = asInlineScript(script.code);
        const css = withoutOldFonts(String(style.source)).trim();
        const policy = policyOf(code, css);
        const head = `<meta http-equiv="Content-Security-Policy" content="${policy}" />`;
        const text = String(html.source)
          .replace(/<meta charset="[^"]*"\s*\/?>/i, (charset) => `${charset}\n    ${head}`)
          .replace(/<script type="module"[^>]*src="[^"]*"[^>]*><\/script>/, () => `<script type="module">${code}</script>`)
          .replace(/<link rel="stylesheet"[^>]*>/, () => `<style>${css}</style>`);
        for (const part of [head, `>${code}</script>`, `<style>${css}</style>`])
          if (!text.includes(part)) this.error(`${page} has no place for all its parts.`);

        const bytes = Buffer.from(text);
        const zipped = gzipSync(bytes).length;
        if (zipped > limit) this.error(`${page} is ${zipped} bytes gzipped, ${zipped - limit} over the limit of ${limit}.`);
        this.info(`${page}: ${zipped} of ${limit} bytes gzipped`);
        for (const { fileName } of [script, style]) delete bundle[fileName];
        html.source = text;
        this.emitFile({
          type: 'asset',
          fileName: page.replace(/\.html$/, '.json'),
          source: `${JSON.stringify({ file: page, bytes: bytes.length, sha256: createHash('sha256').update(bytes).digest('hex'), contentSecurityPolicy: policy }, null, 2)}\n`,
        });
      },
    },
  };
}
