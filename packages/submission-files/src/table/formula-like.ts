/**
 * Whether a spreadsheet could take the text for a formula: it begins, perhaps behind blanks or separators that another
 * program would split at, with an equals sign, an at sign, a sign before something other than a number, or a tab.
 * Full-width forms count as their plain ones. Signed numbers are no formulas.
 */
export function isFormulaLike(text: string): boolean {
  if (text.startsWith('\t') || text.startsWith('\r')) return true;
  const plain = text
    .slice(0, 100)
    .normalize('NFKC')
    .replace(/^[\s;,|"']+/, '');
  return /^[=@]|^[+\-\u2212][^\d.,]/.test(plain);
}
