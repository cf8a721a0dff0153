/** What a column of a clinic's file can become, as one list to choose from. */
import type { ColumnMatch, DateFormat } from '@cairnstep/deidentification';
import { tableOf, variableOf } from '@cairnstep/dictionary';
import type { TableKey } from '@cairnstep/dictionary';
import { columnName } from '../features/submissions/table-names.ts';
import type { ComboOption } from '../ui/combo-box.tsx';

/** A key of the list: `participant`, `left-out`, `birth-date`, …, `study-day:session_day`, `value:steps_total`. */
export const meaningOf = (match: ColumnMatch): string => ('variable' in match ? `${match.as}:${match.variable}` : match.as);

const plain: Readonly<Record<'participant' | 'left-out' | 'birth-date' | 'injury-date' | 'index-date', string>> = {
  participant: 'Record number, becomes the participant code',
  'left-out': 'Stays behind',
  'birth-date': 'Date of birth, becomes the age',
  'injury-date': 'Date of injury, becomes the year and the days since',
  'index-date': 'First training day, from which days are counted; not sent',
};

/** Variables that hold a study day are filled from a date, or from a number of days. */
export function meaningsFor(table: TableKey): ComboOption[] {
  const options: ComboOption[] = [
    { value: 'left-out', label: plain['left-out'], words: 'leave out nothing drop' },
    { value: 'participant', label: plain.participant, words: 'MRN patient id' },
  ];
  if (table === 'participants')
    for (const as of ['birth-date', 'injury-date'] as const) options.push({ value: as, label: plain[as], words: 'DOB accident' });
  options.push({ value: 'index-date', label: plain['index-date'], words: 'index start' });
  for (const { key, type, exposure, unit, aliases = [] } of tableOf(table).variables) {
    if (type === 'pseudonym') continue;
    const words = [key, ...aliases].join(' ');
    if (exposure === 'time' && unit === 'days' && key.endsWith('_day'))
      options.push({ value: `study-day:${key}`, label: `Date, becomes ${columnName(table, key)}`, words });
    options.push({ value: `value:${key}`, label: columnName(table, key), words });
  }
  return options;
}

/** The match that a choice of the list means. What was said of unit, words and format is kept where it still fits. */
export function matchOf(meaning: string, before: ColumnMatch): ColumnMatch {
  const { header } = before;
  const [as, variable = ''] = meaning.split(':');
  const format: { dateFormat?: DateFormat } =
    'dateFormat' in before && before.dateFormat !== undefined ? { dateFormat: before.dateFormat } : {};
  switch (as) {
    case 'participant':
      return { header, as };
    case 'birth-date':
    case 'injury-date':
    case 'index-date':
      return { header, as, ...format };
    case 'study-day':
      return { header, as, variable, ...format };
    case 'value':
      return { header, as, variable };
    default:
      return { header, as: 'left-out' };
  }
}

/** What becomes of a column, in a few words. */
export function describeMatch(table: TableKey, match: ColumnMatch): string {
  switch (match.as) {
    case 'value': {
      const unit = match.unit === undefined ? '' : `, read in ${match.unit}`;
      const words = Object.keys(match.codes ?? {}).length;
      return `${columnName(table, match.variable)}${unit}${words === 0 ? '' : `, ${words} of your words known`}`;
    }
    case 'study-day':
      return `Date, becomes ${columnName(table, match.variable)}`;
    default:
      return plain[match.as];
  }
}

/** Units in which the column may be written; one alone is no choice. */
export function unitsFor(table: TableKey, match: ColumnMatch): readonly string[] {
  if (match.as !== 'value') return [];
  const { unit, acceptedUnits = [] } = variableOf(table, match.variable);
  return unit === undefined ? [] : [unit, ...acceptedUnits.map((accepted) => accepted.unit)];
}

export const dateFormatWords: Readonly<Record<DateFormat, string>> = {
  iso: 'Year, month, day: 2026-03-28',
  'day/month/year': 'Day first: 28/03/2026',
  'month/day/year': 'Month first: 03/28/2026',
  'day.month.year': 'Day first, with points: 28.03.2026',
  'serial-1900': 'Day numbers of a spreadsheet, counted from 1900',
  'serial-1904': 'Day numbers of a spreadsheet, counted from 1904',
};

export const isDated = (
  match: ColumnMatch,
): match is Extract<ColumnMatch, { readonly as: 'birth-date' | 'injury-date' | 'index-date' | 'study-day' }> =>
  match.as === 'study-day' || match.as === 'birth-date' || match.as === 'injury-date' || match.as === 'index-date';
