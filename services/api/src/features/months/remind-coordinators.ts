/**
 * The job that reminds coordinators of months that are due or overdue. It may run as often as it likes, beside itself and after a crash: each
 * mail is an event of (site, month, kind of reminder, person), and an event is mailed once.
 */
import { recordAudit } from '../../audit/record-audit.ts';
import { registry } from '../../authority/actor.ts';
import type { Config } from '../../config.ts';
import type { Context } from '../../context.ts';
import { asActor, type Tx } from '../../database/as-actor.ts';
import { queueMail, type Mail } from '../../mail/queue-mail.ts';
import { dueOn, monthOf, monthsBefore, monthsBetween } from './months.ts';
import { coordinatorAddresses, listSitesWithFirstMonth, type SiteWithFirstMonth } from '../people/sites.repository.ts';
import { settledMonthsSince } from './reminders.repository.ts';
import { reminderKind, weeklyReminders, type ReminderKind } from './reminder-kind.ts';

/** A month is due half a month after it ended and recalled for five weeks: older ones are past reminding. */
const monthsLookedBack = 3;

export async function remindCoordinators({ config, database, clock }: Context): Promise<void> {
  const now = clock();
  const today = now.toISOString().slice(0, 10);
  const first = monthsBefore(monthOf(now), monthsLookedBack);
  const past = monthsBetween(first, monthsBefore(monthOf(now), 1));
  const called = past.flatMap((month) => {
    const kind = reminderKind(dueOn(month), today);
    return kind === null ? [] : [{ month, kind }];
  });
  for (const site of await asActor(database, registry, listSitesWithFirstMonth)) {
    await asActor(database, registry, async (tx) => {
      const settled = await settledMonthsSince(tx, site.id, first);
      for (const { month, kind } of called) {
        if (month >= site.firstMonth && !settled.has(month)) await remind(tx, config, { site, month, kind, today });
      }
    });
  }
}

interface Reminder {
  readonly site: SiteWithFirstMonth;
  readonly month: string;
  readonly kind: ReminderKind;
  readonly today: string;
}

async function remind(tx: Tx, config: Config, reminder: Reminder): Promise<void> {
  const { site, month, kind, today } = reminder;
  let sent = 0;
  for (const email of await coordinatorAddresses(tx, site.id, today)) {
    if (await queueMail(tx, mailOf(config, reminder, email))) sent += 1;
  }
  if (sent > 0)
    await recordAudit(tx, registry, {
      act: 'month.remind',
      object: `${site.code} ${month}`,
      site: site.id,
      detail: { month, kind, mails: sent },
    });
}

function mailOf(config: Config, { site, month, kind }: Reminder, email: string): Mail {
  const due = dueOn(month);
  const isLast = kind === `overdue-${weeklyReminders}`;
  return {
    event: `month-reminder:${site.id}:${month}:${kind}`,
    recipient: email,
    subject: kind === 'due' ? `Cairnstep: ${month} of ${site.code} is due on ${due}` : `Cairnstep: ${month} of ${site.code} is overdue`,
    body: [
      kind === 'due'
        ? `The month ${month} of ${site.name} (${site.code}) is due on ${due}. It has not been accepted yet.`
        : `The month ${month} of ${site.name} (${site.code}) was due on ${due}. It has not been accepted yet.`,
      '',
      'Submit it, or say that there was nothing to report:',
      `${config.PUBLIC_URL}/month?site=${site.code}`,
      '',
      isLast ? 'This is the last reminder of this month.' : 'Reminders of this month end as soon as it is accepted or closed.',
      `If you are not the one who submits for this site, tell ${config.CONTACT}.`,
    ].join('\n'),
  };
}
