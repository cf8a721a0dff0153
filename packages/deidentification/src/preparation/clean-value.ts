/** From a cell of a clinic's file to the text of a cell that may leave the site: a code or a number of the dictionary, or nothing. */
import { cellParser, findMeasure, measureParser } from '@cairnstep/dictionary';
import type { CellParser, Measure, Variable } from '@cairnstep/dictionary';
import { topAge } from '../dates/age.ts';

export type CleanValue =
  { readonly ok: true; readonly text: string } | { readonly ok: false; readonly isReadable: boolean; readonly message: string };

export interface ValueManner {
  readonly unit?: string | undefined;
  readonly decimalMark: '.' | ',';
  /** The clinic's words → codes of the dictionary. */
  readonly codes?: Readonly<Record<string, string>> | undefined;
}

export type ValueCleaner = (cell: string, namedMeasure: string) => CleanValue;

/** No measurement of the dictionary is as fine. */
const finestDecimals = 12;

function plainNumber(value: number): string {
  const text = String(value);
  return text.includes('e') ? value.toFixed(finestDecimals).replace(/\.?0+$/, '') : text;
}

/** Nobody on record has reached 130; more is a typing error, not an age. */
const oldAge = /^(?:9\d|1[0-2]\d)(?:\.\d{1,3})?\+?$/;

/**
 * How the cells of one variable are cleaned. What comes out was made from a parsed value, so nothing else can slip through with it.
 *
 * @returns a function of the cell and of the code in the column that names the measure, '' where there is none
 */
export function valueCleaner(variable: Variable, { unit, decimalMark, codes = {} }: ValueManner): ValueCleaner {
  const words = new Map((variable.codes ?? []).map(({ code, label }) => [label.toLowerCase(), code]));
  for (const [word, code] of Object.entries(codes)) words.set(word.trim().toLowerCase(), code);
  const parse = cellParser(variable);
  const isNumber = variable.type === 'integer' || variable.type === 'decimal';
  const measured = new Map<string, CellParser>();

  function parserFor(namedMeasure: string): CellParser {
    const measure = variable.measuredBy && findMeasure(`${variable.measuredBy.prefix}${namedMeasure}`);
    return measure === undefined ? parse : (measured.get(measure.key) ?? remember(measure));
  }
  function remember(measure: Measure): CellParser {
    const parser = measureParser(measure);
    measured.set(measure.key, parser);
    return parser;
  }

  return (cell, namedMeasure) => {
    let text = cell.normalize('NFKC').replace('\u2212', '-').trim();
    if (text === '') return { ok: true, text: '' };
    if (isNumber && decimalMark === ',') {
      if (text.includes('.'))
        return {
          ok: false,
          isReadable: false,
          message: 'Write a comma as the decimal mark throughout, or choose the point for this file.',
        };
      text = text.replace(',', '.');
    }
    if (variable.key === 'age_at_index' && oldAge.test(text)) text = String(topAge);
    const parsed = parserFor(namedMeasure)(words.get(text.toLowerCase()) ?? text, unit);
    if (!parsed.ok) return { ok: false, isReadable: parsed.problem.kind === 'outside-limits', message: parsed.problem.message };
    if (parsed.value === undefined) return { ok: true, text: '' };
    return { ok: true, text: typeof parsed.value === 'number' ? plainNumber(parsed.value) : parsed.value };
  };
}
