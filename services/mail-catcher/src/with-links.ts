/** Plain text of a mail with its web addresses as links. Only http and https: anything else a mail carries stays text. */
import { html, type Html } from '@cairnstep/fake-oidc/stand-in-page';

const address = /https?:\/\/[^\s<>"'`]+/g;
/** Marks that end a sentence around an address rather than the address; a bracket only when the address opened none. */
const afterAddress = (found: string): string => {
  let end = found.length;
  while (end > 0) {
    const last = found.charAt(end - 1);
    const opened = found.slice(0, end).includes('(');
    if (!(/[.,;:!?]/.test(last) || (last === ')' && !opened))) break;
    end -= 1;
  }
  return found.slice(0, end);
};

export function withLinks(text: string): Html {
  const parts: Html[] = [];
  let from = 0;
  for (const { 0: found, index } of text.matchAll(address)) {
    const link = afterAddress(found);
    if (!URL.canParse(link)) continue;
    parts.push(html`${text.slice(from, index)}<a href="${link}" rel="noreferrer">${link}</a>`);
    from = index + link.length;
  }
  parts.push(html`${text.slice(from)}`);
  return html`${parts}`;
}
