import { tableOf } from '@cairnstep/dictionary';
import type { TableKey, Variable } from '@cairnstep/dictionary';
import { fittingFormats } from '../dates/fitting-formats.ts';
import type { DateFormat } from '../dates/date-format.ts';
import { columnTraits } from '../detection/column-traits.ts';
import { headerHits } from '../detection/header-rules.ts';
import { headerTokens } from '../detection/header-tokens.ts';
import { dateWords } from '../detection/header-words.ts';
import type { TextTable } from '../detection/text-table.ts';
import { wordSet } from '../word-set.ts';
import type { ColumnMatch } from './column-match.ts';
import { dayVariables } from './day-variables.ts';
import { nameSimilarity } from './name-similarity.ts';
import { VariableNames } from './variable-names.ts';

/** So many filled cells tell whether a column holds dates. */
const sampled = 200;
/** Names less alike than this are not proposed, nor where a second variable is nearly as alike as the first. */
const alikeEnough = 0.75;
const clearLead = 0.08;

const birth = wordSet('birth born dob birthdate birthday geburtsdatum geburtstag dateofbirth');
const injury = wordSet('injury accident trauma onset doi injurydate unfalldatum');
const index = wordSet('index first');
const noMeaning = wordSet(`${dateWords} day of the on time start`);

interface FileColumn {
  readonly header: string;
  readonly words: readonly string[];
  /** The formats that all of its cells fit; numbers of days only where the header speaks of a date. */
  readonly formats: readonly DateFormat[];
  /** Its cells are dates; or it has none, and its header speaks of one. */
  readonly isOfDates: boolean;
}

/**
 * A proposal for what each column of a clinic's file means: as last month, else by key, name or alias, else by what dates and numbers are
 * usual, else by likeness of names. Columns without a match stay behind. The coordinator looks it over and changes it.
 */
export function matchColumns(table: TableKey, file: TextTable, lastMonth: readonly ColumnMatch[] = []): ColumnMatch[] {
  const proposal = new Proposal(table);
  const columns = file.headers.flatMap((header, position): FileColumn[] =>
    header.trim() === '' || file.headers.indexOf(header) !== file.headers.lastIndexOf(header) ? [] : [fileColumn(file, header, position)],
  );
  for (const column of columns)
    for (const match of lastMonth) if (match.header === column.header) proposal.add(asWrittenNow(table, match, column));
  for (const propose of [byName, asParticipant, byDate, byLikeness]) for (const column of columns) propose(table, column, proposal);
  return file.headers.flatMap((header) => proposal.matches.find((match) => match.header === header) ?? []);
}

function fileColumn(file: TextTable, header: string, position: number): FileColumn {
  const cells: string[] = [];
  for (const row of file.rows) {
    const cell = row[position] ?? '';
    if (cell.trim() !== '') cells.push(cell);
    if (cells.length >= sampled) break;
  }
  const { isDate } = columnTraits(header, 'unknown');
  const formats = fittingFormats(cells).filter((format) => isDate || !format.startsWith('serial'));
  return { header, words: headerTokens(header), formats, isOfDates: cells.length === 0 ? isDate : formats.length > 0 };
}

/** Matches so far; each column and each variable gets one. */
class Proposal {
  readonly matches: ColumnMatch[] = [];
  private readonly headers = new Set<string>();
  private readonly targets = new Set<string>();

  constructor(readonly table: TableKey) {}

  isOpen(header: string): boolean {
    return !this.headers.has(header);
  }

  isFree(target: string): boolean {
    return !this.targets.has(target);
  }

  add(match: ColumnMatch): void {
    const target = 'variable' in match ? match.variable : match.as;
    if (target !== 'left-out' && !this.isFree(target)) return;
    this.matches.push(match);
    this.headers.add(match.header);
    this.targets.add(target);
  }
}

type Propose = (table: TableKey, column: FileColumn, proposal: Proposal) => void;

const names = new Map<TableKey, VariableNames>();

function namesOf(table: TableKey): VariableNames {
  const known = names.get(table) ?? new VariableNames(table);
  names.set(table, known);
  return known;
}

const withFormat = ({ formats }: FileColumn): { dateFormat?: DateFormat } =>
  formats.length === 1 && formats[0] !== undefined ? { dateFormat: formats[0] } : {};

/** Dates may be written in another way than last month, as when a workbook follows a CSV file; or stand where last month nothing did. */
function asWrittenNow(table: TableKey, match: ColumnMatch, column: FileColumn): ColumnMatch {
  const [only, ...others] = column.formats;
  if (match.as === 'value' && column.isOfDates && dayVariables(table).some(({ key }) => key === match.variable))
    return { header: match.header, as: 'study-day', variable: match.variable, ...withFormat(column) };
  const isRemembered = 'dateFormat' in match && match.dateFormat !== undefined;
  if (!isRemembered || only === undefined || others.length > 0) return match;
  return { ...match, dateFormat: only };
}

const byName: Propose = (table, column, proposal) => {
  const { header, isOfDates } = column;
  const named = namesOf(table).find(header);
  if (named === undefined || !proposal.isOpen(header)) return;
  const { variable, unit } = named;
  if (variable.type === 'pseudonym') proposal.add({ header, as: 'participant' });
  else if (!isOfDates) proposal.add({ header, as: 'value', variable: variable.key, ...(unit === undefined ? {} : { unit }) });
  else if (dayVariables(table).includes(variable)) proposal.add({ header, as: 'study-day', variable: variable.key, ...withFormat(column) });
};

const asParticipant: Propose = (_, { header }, proposal) => {
  if (!proposal.isOpen(header) || !proposal.isFree('participant')) return;
  const isRecordNumber = headerHits(header).some((hit) => hit.class === 'record_number' || hit.class === 'national_id');
  if (isRecordNumber) proposal.add({ header, as: 'participant' });
};

const byDate: Propose = (table, column, proposal) => {
  const { header, words, isOfDates } = column;
  const has = (list: ReadonlySet<string>) => words.some((word) => list.has(word));
  if (!proposal.isOpen(header) || !isOfDates) return;
  if (table === 'participants') {
    const as = has(birth) ? 'birth-date' : has(injury) ? 'injury-date' : has(index) ? 'index-date' : undefined;
    if (as !== undefined) proposal.add({ header, as, ...withFormat(column) });
    return;
  }
  const meaning = words.filter((word) => !noMeaning.has(word)).join(' ');
  const variable = meaning === '' ? tableOf(table).studyDay : dayVariables(table).find((day) => dayMeanings(day).includes(meaning))?.key;
  if (variable !== undefined) proposal.add({ header, as: 'study-day', variable, ...withFormat(column) });
};

const dayMeanings = ({ key, name, aliases = [] }: Variable): string[] =>
  [key, name, ...aliases].map((each) =>
    headerTokens(each)
      .filter((word) => !noMeaning.has(word))
      .join(' '),
  );

const byLikeness: Propose = (table, { header, isOfDates }, proposal) => {
  if (!proposal.isOpen(header) || isOfDates || headerHits(header).some(({ strength }) => strength === 'block')) return;
  const [best, second] = tableOf(table)
    .variables.filter(({ key, type }) => type !== 'pseudonym' && proposal.isFree(key))
    .map(({ key, name, aliases = [] }) => ({
      key,
      likeness: Math.max(...[key, name, ...aliases].map((each) => nameSimilarity(header, each))),
    }))
    .sort((one, other) => other.likeness - one.likeness);
  if (best === undefined || best.likeness < alikeEnough || best.likeness - (second?.likeness ?? 0) < clearLead) return;
  proposal.add({ header, as: 'value', variable: best.key });
};
