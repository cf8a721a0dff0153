/** A site's months by year as stones: which are in, which are missing. The table beside it says the same in words. */
import { formatMonth } from '../../lib/format.ts';
import { monthStateWords } from '../../lib/month-states.ts';
import { MonthStone } from '../../ui/month-stone.tsx';
import type { Month } from './months.ts';

const letters = ['J', 'F', 'M', 'A', 'M', 'J', 'J', 'A', 'S', 'O', 'N', 'D'];
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
      <span className="grid justify-items-center">
        <MonthStone state={month.state} />
      </span>
      <span className="sr-only">{monthStateWords[month.state]}</span>
    </>
  );
}

const nameOf = (index: number): string => formatMonth(`2000-${String(index + 1).padStart(2, '0')}`).split(' ')[0] ?? '';
