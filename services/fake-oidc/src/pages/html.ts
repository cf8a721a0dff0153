/** Markup as a type of its own, so that text reaches a page escaped or not at all. */

export class Html {
  readonly markup: string;
  constructor(markup: string) {
    this.markup = markup;
  }
}

type Part = string | number | Html | readonly Html[];

const entities: Readonly<Record<string, string>> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' };

function rendered(part: Part): string {
  if (part instanceof Html) return part.markup;
  if (typeof part === 'object') return part.map(rendered).join('');
  return String(part).replace(/[&<>"']/g, (character) => entities[character] ?? character);
}

/** A template whose interpolated text is escaped, for element content and quoted attributes. */
export function html(strings: TemplateStringsArray, ...parts: readonly Part[]): Html {
  return new Html(strings.reduce((markup, string, index) => markup + rendered(parts[index - 1] ?? '') + string));
}
