/**
 * A month as an invented clinic has it in its own files: record numbers, names, dates, remarks and serial numbers beside what the
 * registry asks for. The people are those of an invented registry of another seed, each with the rows of their first month.
 */
import { clinicDateHeaders as dateHeaders, demoRegistry, typedRows } from '../../../packages/demo-data/src/index.ts';
import type { DemoRow } from '../../../packages/demo-data/src/index.ts';
import { tableKeys, tableOf } from '../../../packages/dictionary/src/index.ts';
import type { Row, TableKey } from '../../../packages/dictionary/src/index.ts';

export interface ClinicFile {
  readonly table: TableKey;
  /** The first row names the columns. */
  readonly rows: readonly (readonly string[])[];
}

export interface ClinicMonth {
  readonly files: readonly ClinicFile[];
  readonly people: number;
  /** Everything in the files that must not leave the clinic: each value once, as it is written there. */
  readonly planted: readonly string[];
}

const seed = 41;
const dayLength = 86_400_000;
const ofPerson = ['Patient name', 'Date of birth', 'Phone', 'Date of injury', 'First training date', 'Remarks'];

const dayAfter = (iso: string, days: number): string =>
  new Date(Date.parse(`${iso}T00:00:00Z`) + days * dayLength).toISOString().slice(0, 10);
/** 26/03/2024, as the clinic writes dates. */
const written = (iso: string): string => iso.split('-').reverse().join('/');

const syllables = ['bar', 'dol', 'fen', 'gri', 'hus', 'jav', 'kel', 'lom', 'mir', 'nus', 'pol', 'ruv', 'sek', 'tam', 'vor', 'zil'];
/** An invented word, another for each number below 4,096. */
const word = (number: number): string => [number % 16, (number >> 4) % 16, (number >> 8) % 16].map((at) => syllables[at] ?? '').join('');
const capital = (text: string): string => text.slice(0, 1).toUpperCase() + text.slice(1);

/** What only the clinic knows of the person with this number. */
function identityOf(number: number, { age_at_index: age, injury_year: year, days_injury_to_index: sinceInjury }: Row, firstDay: string) {
  const indexDate = dayAfter(firstDay, Math.floor(number / 4));
  return {
    recordNumber: `H${4_100_000 + number * 7919}`,
    name: `${capital(word(number * 37 + 11))} ${capital(word(number * 53 + 700))}`,
    phone: `+44 20 7946 ${String(1_000 + number)}`,
    remark: `Lives with ${word(number * 29 + 1_500)} near the ${word(number * 31 + 2_100)} bridge`,
    indexDate,
    birthDate: dayAfter(indexDate, -Math.floor(((Number(age) >= 90 ? 93 : Number(age)) + 0.4) * 365.25) - number),
    injuryDate: sinceInjury === undefined ? `${year}-06-15` : dayAfter(indexDate, -Number(sinceInjury)),
  };
}
type Identity = ReturnType<typeof identityOf>;

/**
 * @param site Code of the site that the people train at.
 * @param month `2026-11`; first training days lie around its beginning.
 * @param copies Everybody so many times over, each time as somebody else; for large months.
 */
export function clinicMonth(site: string, month: string, copies = 1): ClinicMonth {
  const firstRows = new Map<TableKey, DemoRow[]>();
  for (const { site: at, tables } of demoRegistry({ seed, lastMonth: month }).months()) {
    if (at !== site) continue;
    const newcomers = new Set((tables.participants ?? []).map(([participant]) => participant));
    for (const table of tableKeys) {
      const own = (tables[table] ?? []).filter(([participant]) => newcomers.has(participant ?? null));
      firstRows.set(table, [...(firstRows.get(table) ?? []), ...own]);
    }
  }
  const participants = typedRows('participants', firstRows.get('participants') ?? []);
  const planted = new Set<string>();
  const identities = Array.from({ length: copies }, (_, copy) => {
    const known = new Map<unknown, Identity>();
    for (const [index, row] of participants.entries()) {
      const one = identityOf(copy * participants.length + index, row, `${month}-02`);
      known.set(row.participant, one);
      for (const value of [one.recordNumber, one.name, one.phone, one.remark, written(one.birthDate), written(one.injuryDate)])
        planted.add(value);
    }
    return known;
  });

  const files = tableKeys.flatMap((table): ClinicFile[] => {
    const rows = typedRows(table, firstRows.get(table) ?? []);
    if (rows.length === 0) return [];
    const columns = tableOf(table).variables.filter(
      ({ key }) => !['participant', 'age_at_index', 'injury_year', 'days_injury_to_index'].includes(key),
    );
    const extra = table === 'participants' ? ofPerson : ['Therapist', 'Device serial no', 'Notes'];
    const headers = ['MRN', ...columns.map(({ key, name }) => dateHeaders[key] ?? name), ...extra];
    const body = identities.flatMap((known) =>
      rows.map((row, line) => {
        const who = known.get(row.participant);
        if (who === undefined) throw new Error('A row belongs to nobody.');
        const cells = columns.map(({ key }) => {
          const value = row[key];
          return value === undefined
            ? ''
            : dateHeaders[key] === undefined
              ? String(value)
              : written(dayAfter(who.indexDate, Number(value)));
        });
        for (const [at, { key }] of columns.entries()) if (dateHeaders[key] !== undefined && cells[at] !== '') planted.add(cells[at] ?? '');
        if (table === 'participants')
          return [
            who.recordNumber,
            ...cells,
            who.name,
            written(who.birthDate),
            who.phone,
            written(who.injuryDate),
            written(who.indexDate),
            who.remark,
          ];
        const [therapist, serial, note] = [
          `${capital(word(line % 7))} ${capital(word(900 + (line % 7)))}`,
          `SN-${word(line % 97)}-${7_000 + (line % 97)}`,
          `Said that ${word((line % 89) * 17)} hurt`,
        ];
        for (const value of [therapist, serial, note]) planted.add(value);
        return [who.recordNumber, ...cells, therapist, serial, note];
      }),
    );
    return [{ table, rows: [headers, ...body] }];
  });
  return { files, people: participants.length * copies, planted: [...planted] };
}

const quoted = (cell: string): string => (/[",\r\n]/.test(cell) ? `"${cell.replaceAll('"', '""')}"` : cell);

/** The file as a clinic's program writes CSV. */
export const csvOf = ({ rows }: ClinicFile): string => rows.map((cells) => `${cells.map(quoted).join(',')}\r\n`).join('');
