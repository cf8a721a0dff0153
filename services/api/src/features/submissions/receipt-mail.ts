/** The mail that follows a commit: what the registry took in, in words; the receipt itself stands behind the link. */
import type { SubmissionReceipt } from '@cairnstep/contract';
import { tableOf } from '@cairnstep/dictionary';
import type { Mail } from '../../mail/queue-mail.ts';
import { instantInWords, monthInWords } from '../../mail/words.ts';

export function receiptMail(receipt: SubmissionReceipt, address: string): Pick<Mail, 'subject' | 'body'> {
  const { site, month, acceptedAt, acceptedBy, tables, digest } = receipt;
  const statement = `${monthInWords(month)} of ${site.name} (${site.code}) is in the registry`;
  return {
    subject: `Cairnstep: ${statement}`,
    body: [
      `${statement}: accepted on ${instantInWords(acceptedAt)}, committed by ${acceptedBy}.`,
      '',
      ...tables.map(
        ({ table, added, changed, unchanged, removed }) =>
          `${tableOf(table).name}: ${added} new, ${changed} changed, ${unchanged} unchanged, ${removed} removed`,
      ),
      '',
      `Digest of what was committed: ${digest}`,
      `Receipt: ${address}`,
    ].join('\n'),
  };
}
