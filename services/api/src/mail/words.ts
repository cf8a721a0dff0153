/** Months and instants as mails write them. Where the reader sits is not known, so an instant names its zone. */

const inWords = (at: Date, parts: Intl.DateTimeFormatOptions): string =>
  new Intl.DateTimeFormat('en-GB', { ...parts, timeZone: 'UTC' }).format(at);

/** `2026-11` as "November 2026". */
export const monthInWords = (month: string): string => inWords(new Date(`${month}-01T00:00:00Z`), { month: 'long', year: 'numeric' });

/** "3 November 2026, 14:05 UTC" */
export function instantInWords(instant: string): string {
  const at = new Date(instant);
  const day = inWords(at, { day: 'numeric', month: 'long', year: 'numeric' });
  return `${day}, ${inWords(at, { hour: '2-digit', minute: '2-digit', hourCycle: 'h23' })} UTC`;
}
