/** The job that hands one mail to the SMTP server. */
import { createTransport, type Transporter } from 'nodemailer';
import { registry } from '../authority/actor.ts';
import type { Context } from '../context.ts';
import { asActor } from '../database/as-actor.ts';

export const makeTransport = (url: string): Transporter => createTransport(url, { connectionTimeout: 10_000, greetingTimeout: 10_000, socketTimeout: 20_000 } as object);

interface Waiting {
  readonly recipient: string;
  readonly subject: string;
  readonly body: string;
}

/**
 * `sending` is committed before the server is spoken to and `sent` after. A refusal by the server puts it back to `waiting` and fails the
 * job, which tries again later. After a crash in between nobody knows whether the mail left: it stays `sending` and is not sent twice.
 */
export async function sendMail({ database, config }: Context, transport: Transporter, mailId: string): Promise<void> {
  const setStatus = (status: string) =>
    asActor(database, registry, (tx) => tx.query("update mail_messages set status = $2, sent_at = case when $2 = 'sent' then now() end where id = $1", [mailId, status]));
  const taken = await asActor(database, registry, async (tx) => {
    const [rows] = (await tx.query("update mail_messages set status = 'sending' where id = $1 and status = 'waiting' returning recipient, subject, body", [mailId])) as [Waiting[], number];
    return rows[0];
  });
  if (!taken) return;
  try {
    await transport.sendMail({ from: config.MAIL_FROM, to: taken.recipient, subject: taken.subject, text: taken.body, messageId: `<${mailId}@cairnstep.example>` });
  } catch (error) {
    await setStatus('waiting');
    throw error;
  }
  await setStatus('sent');
}
