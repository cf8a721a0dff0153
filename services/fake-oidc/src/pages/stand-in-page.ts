/** The frame of every page that a local stand-in shows: what it is stands first, before anything can be done on it. */
import { html } from './html.ts';
import type { Html } from './html.ts';
import { stylesheetPath } from './stylesheet.ts';

export { html } from './html.ts';
export type { Html } from './html.ts';
export { standInHeaders } from './stand-in-headers.ts';
export { stylesheet, stylesheetPath } from './stylesheet.ts';

export interface StandInPage {
  readonly title: string;
  /** One sentence saying what the page stands in for. */
  readonly notice: string;
  readonly body: Html;
}

/** A whole document. It loads its stylesheet from the same origin and nothing else. */
export function standInPage({ title, notice, body }: StandInPage): string {
  const page = html`<!doctype html>
    <html lang="en">
      <head>
        <meta charset="utf-8" />
        <meta name="viewport" content="width=device-width, initial-scale=1" />
        <title>${title}</title>
        <link rel="icon" href="data:," />
        <link rel="stylesheet" href="${stylesheetPath}" />
      </head>
      <body>
        <p class="notice" role="note"><strong>Stand-in.</strong> ${notice}</p>
        <main>
          <h1>${title}</h1>
          ${body}
        </main>
      </body>
    </html> `;
  return page.markup;
}
