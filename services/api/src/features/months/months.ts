/** Calendar months as `2026-11`, compared as text. */

/** Day of the following month by which a month is due. */
export const dueDay = 15;

export const monthOf = (date: Date): string => date.toISOString().slice(0, 7);

export function nextMonth(month: string): string {
  const [year, number] = month.split('-').map(Number) as [number, number];
  return number === 12 ? `${year + 1}-01` : `${year}-${String(number + 1).padStart(2, '0')}`;
}

/** The month so many months before: `monthsBefore('2026-02', 3)` is `2025-11`. */
export function monthsBefore(month: string, count: number): string {
  const [year, number] = month.split('-').map(Number) as [number, number];
  return monthOf(new Date(Date.UTC(year, number - 1 - count, 1)));
}

/** From the first to the last, both included; empty when the last lies before the first. */
export function monthsBetween(first: string, last: string): string[] {
  const months: string[] = [];
  for (let month = first; month <= last; month = nextMonth(month)) months.push(month);
  return months;
}

export const dueOn = (month: string): string => `${nextMonth(month)}-${String(dueDay).padStart(2, '0')}`;
