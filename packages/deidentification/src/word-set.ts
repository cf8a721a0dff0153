/** The words of a text, for lists that read better as text. */
export const wordSet = (text: string): ReadonlySet<string> => new Set(text.trim().split(/\s+/));
