import { mkdtempSync, readdirSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { createTransport } from 'nodemailer';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { startMailCatcher } from './index.ts';
import type { MailCatcher } from './index.ts';

let catcher: MailCatcher;
beforeEach(async () => {
  catcher = await startMailCatcher({ smtpPort: 0, httpPort: 0, cap: 3 });
});
afterEach(() => catcher.close());

interface Letter {
  readonly subject: string;
  readonly text?: string;
  readonly html?: string;
  readonly attachments?: { filename: string; content: string }[];
}

async function send(letter: Letter, to = catcher): Promise<void> {
  const transport = createTransport({ host: '127.0.0.1', port: to.smtpPort });
  await transport.sendMail({ from: 'Registry <registry@cairnstep.example>', to: 'mira.okafor@alder-ridge.example', ...letter });
  transport.close();
}

const page = async (path: string): Promise<string> => (await fetch(`${catcher.httpUrl}${path}`)).text();

describe('the mail catcher', () => {
  it('keeps what was sent, with text, HTML and the names of attachments', async () => {
    await send({
      subject: 'Decision on request 7 – approved',
      text: 'Approved.',
      html: '<p>Approved.</p>',
      attachments: [{ filename: 'letter.csv', content: 'a,b' }],
    });
    expect(catcher.messages()).toMatchObject([
      {
        subject: 'Decision on request 7 – approved',
        from: 'Registry <registry@cairnstep.example>',
        to: ['mira.okafor@alder-ridge.example'],
        text: expect.stringContaining('Approved.') as string,
        html: expect.stringContaining('<p>Approved.</p>') as string,
        attachments: [{ name: 'letter.csv', type: 'text/csv', bytes: 3 }],
      },
    ]);
    expect(await (await fetch(`${catcher.httpUrl}/messages.json`)).json()).toEqual(catcher.messages());
  });

  it('shows mails as text, whatever markup they carry, on labelled pages', async () => {
    await send({ subject: '<b>bold</b>', text: 'x', html: '<script>alert(1)</script><img src="http://elsewhere.example/a.png">' });
    const list = await page('/');
    expect(list).toContain('&lt;b&gt;bold&lt;/b&gt;');
    const message = await page(`/messages/${catcher.messages()[0]?.id}`);
    expect(message).toContain('&lt;script&gt;alert(1)&lt;/script&gt;');
    expect(message).not.toMatch(/<script|<img/);
    for (const shown of [list, message, await page('/messages/99'), await page('/elsewhere')]) expect(shown).toContain('Stand-in.');
  });

  it('makes links of the addresses in a mail, and says in words when it came', async () => {
    await send({ subject: 'An invitation', text: 'Open http://127.0.0.1:3000/invitation/abc.' });
    const [mail] = catcher.messages();
    const message = await page(`/messages/${mail?.id}`);
    expect(message).toContain(
      'Open <a href="http://127.0.0.1:3000/invitation/abc" rel="noreferrer">http://127.0.0.1:3000/invitation/abc</a>.',
    );
    for (const shown of [message, await page('/')])
      expect(shown).toMatch(new RegExp(`<time datetime="${mail?.receivedAt}">\\d{1,2} [A-Z][a-z]+ \\d{4}, \\d\\d:\\d\\d UTC</time>`));
  });

  it('lets the oldest give way, newest first, and can be emptied', async () => {
    for (const subject of ['1', '2', '3', '4']) await send({ subject, text: 'x' });
    expect(catcher.messages().map(({ subject }) => subject)).toEqual(['4', '3', '2']);
    await fetch(`${catcher.httpUrl}/clear`, { method: 'POST' });
    expect(catcher.messages()).toEqual([]);
    expect(await page('/')).toContain('No mail has been sent yet');
  });

  it('keeps mails over a restart when it has a folder, and removes their files with them', async () => {
    const folder = mkdtempSync(join(tmpdir(), 'mail-catcher-test-'));
    const first = await startMailCatcher({ smtpPort: 0, httpPort: 0, folder });
    await send({ subject: 'kept', text: 'x' }, first);
    await first.close();
    const second = await startMailCatcher({ smtpPort: 0, httpPort: 0, folder });
    await send({ subject: 'newer', text: 'x' }, second);
    expect(second.messages().map(({ subject }) => subject)).toEqual(['newer', 'kept']);
    second.clear();
    expect(readdirSync(folder)).toEqual([]);
    await second.close();
    rmSync(folder, { recursive: true });
  });
});
