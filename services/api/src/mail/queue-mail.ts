/** Puts a mail into the outbox in the caller's transaction. The event names what happened: the same event mails the same person once. */
import { createHash, randomUUID } from 'node:crypto';
import type { Tx } from '../database/as-actor.ts';
import { enqueue } from '../jobs/enqueue.ts';

export interface Mail {
  readonly event: string;
  readonly recipient: string;
  readonly subject: string;
  readonly body: string;
}

/** False when this event has mailed this person before. */
export async function queueMail(tx: Tx, mail: Mail): Promise<boolean> {
  const id = randomUUID();
  // The recipient enters the key as a hash, so the unique index needs no address.
  const event = `${mail.event}:${createHash('sha256').update(mail.recipient.toLowerCase()).digest('hex').slice(0, 16)}`;
  const inserted = (await tx.query('select queue_mail($1, $2, $3, $4, $5) as queued', [
    id,
    event,
    mail.recipient,
    mail.subject,
    mail.body,
  ])) as [{ queued: boolean }];
  const { queued } = inserted[0];
  if (queued) await enqueue(tx, 'send-mail', { mailId: id });
  return queued;
}
