/** What the mail catcher has. */
import { expect } from '@playwright/test';
import { mailUrlVariable } from '../product-variables.ts';

interface Mail {
  readonly to: readonly string[];
  readonly subject: string;
  readonly text: string;
}

async function mailsTo(address: string): Promise<readonly Mail[]> {
  const response = await fetch(`${process.env[mailUrlVariable]}/messages.json`);
  const mails = (await response.json()) as readonly Mail[];
  return mails.filter(({ to }) => to.some((recipient) => recipient.includes(address)));
}

/** The newest mail to an address whose subject fits; waits for it, for mails leave in the background. */
export async function mailTo(address: string, subject: RegExp): Promise<Mail> {
  const find = async () => (await mailsTo(address)).find((mail) => subject.test(mail.subject));
  await expect.poll(async () => (await find())?.subject, { timeout: 60_000, message: `a mail to ${address}` }).toMatch(subject);
  const mail = await find();
  if (mail === undefined) throw new Error('The mail is gone again.');
  return mail;
}
