import { describe, expect, it } from 'vitest';
import { withLinks } from './with-links.ts';

const link = (address: string): string => `<a href="${address}" rel="noreferrer">${address}</a>`;

describe('the text of a mail', () => {
  it.each([
    [
      'Open this address:\nhttp://127.0.0.1:3000/invitation/abc_-1\nIt works once.',
      `Open this address:\n${link('http://127.0.0.1:3000/invitation/abc_-1')}\nIt works once.`,
    ],
    [
      'See https://a.example/b. And (https://a.example/c), then https://a.example/d_(e)',
      `See ${link('https://a.example/b')}. And (${link('https://a.example/c')}), then ${link('https://a.example/d_(e)')}`,
    ],
    ['https://a.example/?x=1&y=2', link('https://a.example/?x=1&amp;y=2')],
  ])('has its addresses as links: %s', (text, shown) => {
    expect(withLinks(text).markup).toBe(shown);
  });

  it.each(['javascript:alert(1)', 'data:text/html,x', 'ftp://a.example/b', 'mailto:a@a.example', 'http://', 'no address at all'])(
    'keeps anything else as text: %s',
    (text) => {
      expect(withLinks(text).markup).not.toContain('<a');
    },
  );

  it('lets no markup through, in an address or around it', () => {
    const shown = withLinks(`<b>x</b> https://a.example/"onclick="alert(1) <script>https://b.example/'</script>`).markup;
    expect(shown).not.toMatch(/<(?!\/?a[ >])/);
    expect(shown).not.toMatch(/"onclick/);
  });
});
