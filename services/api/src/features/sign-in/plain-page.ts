/** A page that needs neither script nor session: what the browser shows when signing in did not work. */
import type { Response } from 'express';

const escape = (text: string): string => text.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;').replaceAll('"', '&quot;');

export const plainStyles = `:root{color-scheme:light dark}body{margin:0;background:#F5F2EA;color:#23272B;font:16px/1.5 system-ui,sans-serif}
main{max-width:36rem;margin:12vh auto 0;padding:24px;background:#FCFBF7;border:1px solid #D9D3C4}h1{font-size:1.375rem;margin:0 0 12px}a{color:#255E70}
@media(prefers-color-scheme:dark){body{background:#171A1C;color:#ECE8DD}main{background:#1F2326;border-color:#363C40}a{color:#7FB8C9}}`;

export function sendPlainPage(response: Response, status: number, title: string, text: string, requestId: string): void {
  response.status(status).type('html').send(`<!doctype html>
<html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width, initial-scale=1"><title>${escape(title)} · Cairnstep</title>
<link rel="stylesheet" href="/api/sign-in/plain.css"></head>
<body><main><h1>${escape(title)}</h1><p>${escape(text)}</p><p><a href="/sign-in">Try again</a> or go to <a href="/">the public pages</a>.</p>
<p><small>Number of this event: ${escape(requestId)}</small></p></main></body></html>`);
}
