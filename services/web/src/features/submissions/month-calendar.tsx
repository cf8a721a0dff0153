/** A site's months by year as stones: which are in, which are missing. The table beside it says the same in words. */
import { formatMonth } from '../../lib/format.ts';
import { monthStates } from './months.ts';
import type { Month } from './months.ts';

const letters = ['J', 'F', 'M', 'A', 'M', 'J', 'J', 'A', 'S', 'O', 'N', 'D'];
const looks: Readonly<Record<Month['state'], string>> = {
  accepted: 'fill-lichen stroke-lichen',
  'in-progress': 'fill-chosen stroke-lichen stroke-2',
  due: 'fill-transparent stroke-ink stroke-2',
  overdue: 'fill-transparent stroke-oxide stroke-2',
  'not-yet-due': 'fill-transparent stroke-edge [stroke-dasharray:2_2]',
};

export function MonthCalendar({ months }: { readonly months: readonly Month[] }) {
  const years = [...new Set(months.map(({ month }) => month.slice(0, 4)))].sort();
  const byMonth = new Map(months.map((month) => [month.month, month]));
  return (
    <table className="w-full max-w-md table-fixed border-collapse">
      <caption className="sr-only">Months by year</caption>
      <thead className="text-small text-quiet">
        <tr>
          <th scope="col" className="w-11 text-left font-normal">
            <span className="sr-only">Year</span>
          </th>
          {letters.map((letter, index) => (
            <th key={index} scope="col" className="font-normal">
              <abbr className="no-underline" title={nameOf(index)}>
                {letter}
              </abbr>
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {years.map((year) => (
          <tr key={year}>
            <th scope="row" className="numbers text-left text-small font-normal text-quiet">
              {year}
            </th>
            {letters.map((_, index) => (
              <td key={index} className="py-1 text-center">
                <Stone month={byMonth.get(`${year}-${String(index + 1).padStart(2, '0')}`)} />
              </td>
            ))}
          </tr>
        ))}
      </tbody>
    </table>
  );
}

function Stone({ month }: { readonly month: Month | undefined }) {
  if (month === undefined) return null;
  return (
    <>
      <svg aria-hidden="true" width="20" height="12" viewBox="0 0 20 12" className="mx-auto">
        <rect x="1" y="1" width="18" height="10" rx="5" className={looks[month.state]} />
      </svg>
      <span className="sr-only">{monthStates[month.state]}</span>
    </>
  );
}

const nameOf = (index: number): string => formatMonth(`2000-${String(index + 1).padStart(2, '0')}`).split(' ')[0] ?? '';
