/** A local mail catcher for demonstration and tests: nothing sent to it leaves the machine. */
export type { CaughtMail } from './mailbox.ts';
export { startMailCatcher } from './start-mail-catcher.ts';
export type { MailCatcher, MailCatcherOptions } from './start-mail-catcher.ts';
