/** Characters that XML cannot hold stand as `_x000D_` in the texts of workbooks, and `_x005F_` for an underscore before such (ECMA-376-1, 22.9.2.19). */
export function decodeCharacters(text: string): string {
  if (!text.includes('_x')) return text;
  return text.replace(/_x([0-9a-f]{4})_/gi, (_, code: string) => String.fromCharCode(Number.parseInt(code, 16)));
}
