import { html, standInPage, type Html } from '@cairnstep/fake-oidc/stand-in-page';
import type { CaughtMail } from './mailbox.ts';
import { withLinks } from './with-links.ts';

const notice = 'Mails that the registry sends on this machine are caught here and go nowhere else.';

/** "1 December 2026, 08:20 UTC": the stand-in knows nothing of its reader's clock. */
const whenReceived = (instant: string): Html => {
  const words = new Intl.DateTimeFormat('en-GB', {
    day: 'numeric',
    month: 'long',
    year: 'numeric',
    hour: '2-digit',
    minute: '2-digit',
    timeZone: 'UTC',
  })
    .format(new Date(instant))
    .replace(' at ', ', ');
  return html`<time datetime="${instant}">${words} UTC</time>`;
};

export function listPage(mails: readonly CaughtMail[]): string {
  const rows = mails.map(
    (mail) =>
      html`<li>
        <a href="/messages/${mail.id}"
          >${mail.subject === '' ? 'Without a subject' : mail.subject}<br /><span class="quiet"
            >to ${mail.to.join(', ')}, ${whenReceived(mail.receivedAt)}</span
          ></a
        >
      </li>`,
  );
  const body =
    mails.length === 0
      ? html`<p>No mail has been sent yet. Letters, invitations and reminders of the registry will appear here.</p>`
      : html`<ul class="sheet">
            ${rows}
          </ul>
          <form method="post" action="/clear"><button class="plain">Remove all ${mails.length}</button></form>`;
  return standInPage({ title: 'Mail', notice, body });
}

export function messagePage(mail: CaughtMail): string {
  const attachments = mail.attachments.map(({ name, type, bytes }) => html`<dd>${name} (${type}, ${bytes} bytes)</dd>`);
  return standInPage({
    title: mail.subject === '' ? 'Without a subject' : mail.subject,
    notice,
    body: html`<dl>
        <dt>From</dt>
        <dd>${mail.from}</dd>
        <dt>To</dt>
        ${mail.to.map((address) => html`<dd>${address}</dd>`)}
        <dt>Received</dt>
        <dd>${whenReceived(mail.receivedAt)}</dd>
        ${
          attachments.length === 0
            ? html``
            : html`<dt>Attached</dt>
                ${attachments}`
        }
      </dl>
      ${
        mail.text === ''
          ? html``
          : html`<h2>Text</h2>
              <pre>${withLinks(mail.text)}</pre>`
      }
      ${
        mail.html === ''
          ? html``
          : html`<h2>HTML, as its source</h2>
              <pre>${mail.html}</pre>`
      }
      <p><a href="/">All mail</a></p>`,
  });
}

export function notFoundPage(): string {
  return standInPage({ title: 'No such mail', notice, body: html`<p>It may have been removed. <a href="/">All mail</a></p>` });
}
