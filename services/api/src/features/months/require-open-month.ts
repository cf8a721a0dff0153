import { Refusal } from '../../http/refusal.ts';
import { monthOf } from './months.ts';

/** A month is open to its site once it is over, from the first the site submits on. */
export function requireOpenMonth(month: string, site: { readonly firstMonth: string }, now: Date): void {
  if (month >= monthOf(now)) throw new Refusal('month-not-open', 'A month can be submitted, or closed, once it has ended.');
  if (month < site.firstMonth) throw new Refusal('month-not-open', 'The site had not joined the registry in that month.');
}
