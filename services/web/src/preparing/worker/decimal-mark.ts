/** So many rows tell how a file writes its numbers. */
const sampled = 2_000;
const withComma = /^[-\u2212]?\d+,\d+$/;
const withPoint = /^[-\u2212]?\d+\.\d+$/;

/** How the numbers of a file are written; a comma only where no number has a point. */
export function decimalMarkOf(rows: readonly (readonly string[])[]): { readonly mark: '.' | ','; readonly hasBoth: boolean } {
  let commas = 0;
  let points = 0;
  for (const row of rows.slice(0, sampled)) {
    for (const cell of row) {
      const text = cell.trim();
      if (withComma.test(text)) commas += 1;
      else if (withPoint.test(text)) points += 1;
    }
  }
  return { mark: commas > points ? ',' : '.', hasBoth: commas > 0 && points > 0 };
}
