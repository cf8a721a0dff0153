/**
 * Hides what must not be shown of a two-way table: small counts, and whatever else has to go so that they cannot be worked out.
 *
 * Order of preference: hide cells only, at the least number of people hidden; totals of rows and columns only when cells cannot do it;
 * the whole table (zeros too) when nothing else suffices. The grand total is the size of the cohort and is shown on every page, so it is
 * treated as known and hidden only when it is itself too small, which withholds the table.
 */
import type { CountTable, HiddenPattern, PerPlace, Place, TableWithTotals } from './count-table.ts';
import { flagsOf, perPlace, placeAt, positionOf, withTotals } from './count-table.ts';
import type { HiddenInterval, Knowledge } from './interval-audit.ts';
import { intervalAudit } from './interval-audit.ts';
import { chooseComplement } from './choose-complement.ts';
import { isSafe } from './protection-problem.ts';
import { requireSmallestShown, SMALLEST_SHOWN } from './smallest-shown.ts';
import { tableNetwork } from './table-network.ts';

/** The one mark for every hidden figure: it does not tell a small count from one hidden to protect it. */
export const HIDDEN = 'hidden';
export type PublishedCount = number | typeof HIDDEN;

/** What may leave: the same shape for every reader. */
export interface PublishedTable extends PerPlace<PublishedCount> {
  /** The whole table is hidden, zeros included. */
  readonly withheld: boolean;
}

/** For stewards and tests. Tells small counts from complementary ones, so it must never be sent to a reader. */
export interface ProtectionAudit {
  readonly smallestShown: number;
  readonly primary: readonly Place[];
  readonly complementary: readonly Place[];
  /** Hidden because the caller asked (`alsoHide`), whatever the count. */
  readonly asked: readonly Place[];
  /** What a reader can derive of every hidden place; `high` is `Infinity` when unbounded. */
  readonly intervals: readonly HiddenInterval[];
  /** People in complementary cells. */
  readonly cost: number;
  /** The cost is the least possible. Large tables with many choices may end with a good pattern that was not proven best. */
  readonly provenLeast: boolean;
}

export interface ProtectedTable {
  readonly published: PublishedTable;
  readonly hidden: HiddenPattern;
  readonly audit: ProtectionAudit;
}

export interface ProtectionOptions {
  /** Smallest count shown. Policy may raise it above 11, not lower it. */
  readonly smallestShown?: number;
  /** Places to hide whatever they hold, zeros too: for instance those already hidden in the table of people this one goes with. */
  readonly alsoHide?: HiddenPattern;
  /** Most people a place can hold as far as the reader knows, from figures outside this table; without it, no limit. */
  readonly atMost?: (place: Place) => number;
}

/**
 * Hides small counts and what would give them back. Deterministic; protecting the result again (with `alsoHide: result.hidden`)
 * changes nothing. A published zero is left alone and never used as cover.
 *
 * @throws RangeError for a malformed table or pattern, or a `smallestShown` below 11.
 */
export function protectTable(table: CountTable, options: ProtectionOptions = {}): ProtectedTable {
  const smallestShown = requireSmallestShown(options.smallestShown ?? SMALLEST_SHOWN);
  const full = withTotals(table);
  const asked = options.alsoHide ? flagsOf(full, options.alsoHide) : full.values.map(() => false);
  const primary = full.values.map((value) => value > 0 && value < smallestShown);
  const grand = full.values.length - 1;
  const required = full.values.map((_, position) => primary[position] === true || asked[position] === true);
  const mostAt = (position: number) => options.atMost?.(placeAt(full, position)) ?? Number.POSITIVE_INFINITY;
  // A place hidden on request may be empty; any other hidden place is known not to be, since zeros are shown.
  const zerosShown = (position: number): Knowledge => ({ least: asked[position] === true ? 0 : 1, most: mostAt(position) });
  const zerosHidden = (position: number): Knowledge => ({ least: 0, most: mostAt(position) });

  const choice = required[grand] === true ? undefined : chooseComplement(full, required, zerosShown, smallestShown);
  const flags = choice?.hidden ?? withholding(full, required[grand] === true, zerosHidden, smallestShown);
  const knowledgeAt = choice === undefined ? zerosHidden : zerosShown;
  const hidden = perPlace(full, (position) => flags[position] === true);
  const complementary = flags.map((isHidden, position) => isHidden && required[position] !== true);
  return {
    published: {
      ...perPlace<PublishedCount>(full, (position) => (flags[position] === true ? HIDDEN : (full.values[position] ?? 0))),
      withheld: flags.every((isHidden, position) => isHidden || position === grand),
    },
    hidden,
    audit: {
      smallestShown,
      primary: placesWhere(full, primary),
      complementary: placesWhere(full, complementary),
      asked: placesWhere(full, asked),
      intervals: intervalAudit(table, hidden, { knowledge: (place) => knowledgeAt(positionOf(full, place)) }),
      cost: peopleIn(full, complementary),
      provenLeast: choice?.provenLeast ?? true,
    },
  };
}

/** Everything hidden, zeros too, so that a reader cannot even tell which cells are empty; the grand total only if it must be. */
function withholding(
  full: TableWithTotals,
  grandRequired: boolean,
  knowledgeAt: (position: number) => Knowledge,
  smallestShown: number,
): boolean[] {
  const allButGrand = full.values.map((_, position) => position !== full.values.length - 1 || grandRequired);
  const costs = full.values.map(() => undefined);
  const problem = { table: full, network: tableNetwork(full), smallestShown, required: allButGrand, knowledgeAt, costs };
  return isSafe(problem, allButGrand) ? allButGrand : full.values.map(() => true);
}

function placesWhere(full: TableWithTotals, flags: readonly boolean[]): Place[] {
  return flags.flatMap((flag, position) => (flag ? [placeAt(full, position)] : []));
}

function peopleIn(full: TableWithTotals, flags: readonly boolean[]): number {
  return full.values.reduce((sum, value, position) => {
    const { row, column } = placeAt(full, position);
    return flags[position] === true && row !== 'total' && column !== 'total' ? sum + value : sum;
  }, 0);
}
