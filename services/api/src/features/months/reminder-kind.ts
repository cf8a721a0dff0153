/** Which reminder of an unsettled month a day calls for. Days are calendar days as `2026-12-10`. */

/** Days before the due day from which on the site is told that it comes. */
export const reminderDaysBefore = 5;
/** How often an overdue month is recalled, a week apart, after the first mail on the day after the due day. */
export const weeklyReminders = 4;

/** `due`: the day comes. `overdue-0`: it has passed. `overdue-1` to `overdue-4`: weekly after that. */
export type ReminderKind = 'due' | `overdue-${number}`;

const dayNumber = (day: string): number => Date.parse(`${day}T00:00:00Z`) / 86_400_000;

/**
 * A reminder stays fitting until the next one takes its place, so that one missed while the registry stood still is made up for. Five weeks
 * after the due day reminders end.
 */
export function reminderKind(dueOn: string, today: string): ReminderKind | null {
  const daysLate = dayNumber(today) - dayNumber(dueOn);
  if (daysLate < -reminderDaysBefore) return null;
  if (daysLate <= 0) return 'due';
  const week = Math.floor((daysLate - 1) / 7);
  return week > weeklyReminders ? null : `overdue-${week}`;
}
