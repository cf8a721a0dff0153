import { tableKeys } from '@cairnstep/dictionary';
import type { TableKey } from '@cairnstep/dictionary';
import { addMonths } from './calendar.ts';
import { clinicFiles } from './clinic-files.ts';
import { drawCohort, firstMonthOf, monthsHeld, sitesWithNextMonth } from './cohort.ts';
import { demoCsv } from './csv.ts';
import { plantMistakes } from './mistakes.ts';
import type { Participant } from './people/participant.ts';
import { siteProfiles } from './sites.ts';
import type { DemoFiles, DemoMonth, DemoOptions, DemoRegistry, DemoRow } from './types.ts';

/** The seed of the demonstration that comes with the product. */
export const demoSeed = 20_260_719;

type Tables = Map<TableKey, DemoRow[]>;

/** Rows by site and month. */
function sortRows(cohort: readonly Participant[]): Map<string, Tables> {
  const sorted = new Map<string, Tables>();
  for (const { person, rows } of cohort) {
    for (const { table, month, row } of rows) {
      const key = `${person.site.code} ${month}`;
      const tables: Tables = sorted.get(key) ?? new Map<TableKey, DemoRow[]>();
      sorted.set(key, tables);
      const list = tables.get(table);
      if (list) list.push(row);
      else tables.set(table, [row]);
    }
  }
  return sorted;
}

/** The tables that have rows, in the dictionary's order. */
function inOrder<T>(tables: Tables, make: (table: TableKey, rows: readonly DemoRow[]) => T): Partial<Record<TableKey, T>> {
  return Object.fromEntries(
    tableKeys.flatMap((table) => {
      const rows = tables.get(table);
      return rows ? [[table, make(table, rows)]] : [];
    }),
  );
}

/**
 * Invents the registry: 12 sites, 600 participants, 24 months, and two files of the month after.
 *
 * The same options give the same rows and bytes on every machine. Every row passes the error rules of the dictionary, except
 * those with planted mistakes.
 * @throws RangeError when the seed or the month is not one.
 */
export function demoRegistry({ seed, lastMonth }: DemoOptions): DemoRegistry {
  if (!Number.isInteger(seed) || seed < 0 || seed > 0xffffffff) throw new RangeError('a seed is a whole number from 0 to 4,294,967,295');
  const nextMonth = addMonths(lastMonth, 1);
  const cohort = drawCohort({ seed, lastMonth });
  const sorted = sortRows(cohort);
  const tablesOf = (site: string, month: string): Tables => sorted.get(`${site} ${month}`) ?? new Map<TableKey, DemoRow[]>();
  const filesOf = (site: string): DemoFiles => inOrder(tablesOf(site, nextMonth), demoCsv);

  function* months(): Generator<DemoMonth, void> {
    for (let back = monthsHeld - 1; back >= 0; back -= 1) {
      const month = addMonths(lastMonth, -back);
      for (const { code } of siteProfiles) {
        const tables = inOrder(tablesOf(code, month), (_, rows) => rows);
        if (Object.keys(tables).length > 0) yield { site: code, month, tables };
      }
    }
  }

  return {
    sites: siteProfiles.map((site) => ({ code: site.code, name: site.name, firstMonth: firstMonthOf(site, lastMonth) })),
    months,
    next: {
      clean: filesOf(sitesWithNextMonth.clean),
      fromTheClinic: clinicFiles(
        cohort.filter(({ person }) => person.site.code === sitesWithNextMonth.clean),
        nextMonth,
      ),
      ...plantMistakes(filesOf(sitesWithNextMonth.mistakes)),
    },
  };
}
