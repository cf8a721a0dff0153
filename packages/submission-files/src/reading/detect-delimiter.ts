import { defaultLimits } from '../limits.ts';
import type { HeaderNames } from '../table/header-names.ts';
import { RecordScanner } from './record-scanner.ts';
import { UnreadableFile } from './unreadable-file.ts';

export type Delimiter = ',' | ';' | '\t';

export const delimiters: readonly Delimiter[] = [',', ';', '\t'];

/**
 * The separator under which the first row names most columns of the table; of equals, the one that gives most cells.
 * Deciding by names and not by counting keeps decimal commas and commas in headers from misleading it.
 * @param beginning The beginning of the file; the header may be cut off by its end.
 */
export function detectDelimiter(beginning: string, names: HeaderNames): Delimiter {
  let best: { delimiter: Delimiter; recognised: number; cells: number } = { delimiter: ',', recognised: -1, cells: 0 };
  for (const delimiter of delimiters) {
    const header = firstRecord(beginning, delimiter);
    const recognised = header.filter((cell) => names.meaning(cell).kind !== 'undeclared').length;
    if (recognised > best.recognised || (recognised === best.recognised && header.length > best.cells))
      best = { delimiter, recognised, cells: header.length };
  }
  return best.delimiter;
}

function firstRecord(text: string, delimiter: Delimiter): readonly string[] {
  let first: readonly string[] | null = null;
  const scanner = new RecordScanner(delimiter, defaultLimits, (cells, count) => {
    if (!first && cells.slice(0, count).some((cell) => cell.trim() !== '')) first = cells.slice(0, count);
  });
  try {
    scanner.push(text, true);
  } catch (error) {
    // What is wrong here is told when the file is read in earnest.
    if (!(error instanceof UnreadableFile)) throw error;
  }
  return first ?? [];
}
