const special: Readonly<Record<string, string>> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;' };

/** What XML cannot hold, and what would be read back as such, stands by its number: `_x0007_` (ECMA-376-1, 22.9.2.19). */
const unwritable = /(?![\t\n])[\p{Cc}\p{Cs}\ufffe\uffff]|_(?=x[0-9a-f]{4}_)/giu;

const asNumber = (character: string): string => `_x${character.charCodeAt(0).toString(16).toUpperCase().padStart(4, '0')}_`;

/** Text as it may stand in an element or an attribute of a workbook's part. */
export function escapeXml(text: string): string {
  if (/^[\w .,:;%/()+-]*$/.test(text) && !text.includes('_x')) return text;
  return text.replace(unwritable, asNumber).replace(/[&<>"]/g, (character) => special[character] ?? character);
}
