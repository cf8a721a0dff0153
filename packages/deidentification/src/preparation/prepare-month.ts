import { detectIdentifiers } from '../detection/detect-identifiers.ts';
import type { ColumnRole } from '../detection/detection-context.ts';
import { roleOf } from '../detection/declared-column.ts';
import type { Strength } from '../detection/identifier-class.ts';
import type { IdentifierFinding } from '../detection/identifier-finding.ts';
import type { IsoDate } from '../dates/date-format.ts';
import { studyDay } from '../dates/study-day.ts';
import { CodeBook } from '../key-file/code-book.ts';
import { normaliseLocalId } from '../pseudonyms/normalise-local-id.ts';
import { capAges } from './cap-ages.ts';
import { cleanTable } from './clean-table.ts';
import type { ColumnMatch } from './column-match.ts';
import { identifyingColumns } from './identifying-columns.ts';
import { fillIndexDates } from './index-dates.ts';
import { matchColumns } from './match-columns.ts';
import type { MonthInput, NewParticipant, PreparedMonth, RawTable } from './month.ts';
import { peopleOfMonth } from './people-of-month.ts';
import { previewOf } from './preview.ts';
import { ProblemLog } from './problem-log.ts';
import { resolveMatches } from './resolve-matches.ts';
import type { ResolvedMatch } from './resolve-matches.ts';
import { planTable } from './table-plan.ts';
import type { TablePlan } from './table-plan.ts';

interface LookedThrough {
  readonly matches: readonly ColumnMatch[];
  readonly findings: readonly IdentifierFinding[];
  readonly plan: TablePlan;
}

/**
 * Takes the identity out of a month: record numbers become participant codes, dates study days, ages over 89 one class, and only columns
 * and values of the dictionary are left. Nothing of the result but its key links back to a person; the key belongs into the key file.
 *
 * What is wrong with the files is reported, not thrown. The input is not changed, so the coordinator can look, change matches and call again.
 *
 * @throws RangeError when a stated first training day is not written `2026-01-15` or does not exist
 */
export async function prepareMonth(input: MonthInput): Promise<PreparedMonth> {
  const { key } = input;
  const log = new ProblemLog();
  const tables = input.tables.map((raw) => lookThrough(raw, input, log));
  const plans = tables.map(({ plan }) => plan);

  const book = await CodeBook.open(key);
  const people = await peopleOfMonth(plans, key, book);
  const stated = await statedDates(input, book);
  const basis = fillIndexDates(plans, people, stated, book, log);
  const rough = plans.map((plan) => cleanTable(plan, people.codes.get(plan) ?? [], book, log));
  const { clean, count } = capAges(rough, book, log);

  const newParticipants = [...people.newCodes].flatMap((code): NewParticipant[] => {
    const place = people.firstPlaces.get(code);
    return place === undefined ? [] : [{ code, ...place, indexDate: basis.get(code) ?? 'unknown' }];
  });
  return {
    clean,
    dropped: plans.flatMap(({ dropped }) => dropped),
    newParticipants,
    replacedCodes: book.replacedCodes,
    problems: log.problems(),
    findings: tables.flatMap(({ findings }) => findings),
    agesTopCoded: count,
    preview: clean.map(previewOf),
    lengthChange: people.lengthChange,
    matches: tables.map(({ matches, plan }) => ({ table: plan.raw.table, matches })),
    key: {
      ...book.close(),
      matches: new Map([...key.matches, ...tables.map(({ matches, plan }) => [plan.raw.table, decided(plan.raw, matches)] as const)]),
      idLengths: people.idLengths.size === 0 ? key.idLengths : people.idLengths,
    },
  };
}

/** Nobody has decided to leave a column behind of which there was nothing to see: once it has cells, it is matched like a new one. */
function decided({ headers, rows }: RawTable, matches: readonly ColumnMatch[]): readonly ColumnMatch[] {
  return matches.filter((match) => {
    const position = headers.indexOf(match.header);
    return match.as !== 'left-out' || rows.some((row) => (row[position] ?? '').trim() !== '');
  });
}

function lookThrough(raw: RawTable, { key, safeHeaders = new Set() }: MonthInput, log: ProblemLog): LookedThrough {
  const matches = raw.matches ?? matchColumns(raw.table, raw, key.matches.get(raw.table));
  const resolved = resolveMatches(raw, matches, log);
  const findings = detectIdentifiers(raw, { table: raw.table, roles: rolesOf(resolved), safeHeaders });
  const participant = resolved.find(({ match }) => match.as === 'participant')?.position ?? null;
  const withheld = identifyingColumns(raw, findings, safeHeaders, participant, key.normalisation);
  const purposes = new Map(resolved.map(({ match, position }) => [position, match.as]));
  return {
    matches,
    findings: findings
      .filter(({ columnNumber, strength }) => matters(purposes.get(columnNumber - 1), strength))
      .map((finding) => ({ ...finding, column: null })),
    plan: planTable(raw, resolved, withheld, log),
  };
}

/**
 * Whether a finding is worth a look. Record numbers and dates are expected where they were matched, and replaced; text in a column of
 * values is left out, because only codes and numbers come out of it.
 */
function matters(as: ColumnMatch['as'] | undefined, strength: Strength): boolean {
  if (as === undefined || as === 'left-out') return true;
  return as === 'value' && strength === 'block';
}

function rolesOf(resolved: readonly ResolvedMatch[]): ReadonlyMap<string, ColumnRole> {
  return new Map(
    resolved.flatMap(({ match, variable }) => (variable && match.as === 'value' ? [[match.header, roleOf(variable)] as const] : [])),
  );
}

async function statedDates({ key, indexDates = new Map() }: MonthInput, book: CodeBook): Promise<Map<string, IsoDate>> {
  const dates = new Map<string, IsoDate>();
  for (const [localId, date] of indexDates) {
    const normalised = normaliseLocalId(localId, key.normalisation);
    const code = normalised === '' ? undefined : await book.knownCodeOf(normalised);
    if (code === undefined) continue;
    studyDay(date, date);
    dates.set(code, date);
  }
  return dates;
}
