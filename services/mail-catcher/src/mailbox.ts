/** The mails caught, newest first, at most `cap` of them; also as files when a folder is named. */
import { mkdirSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import PostalMime from 'postal-mime';
import type { Address } from 'postal-mime';

export interface CaughtMail {
  /** Counts up; also the order of arrival. */
  readonly id: number;
  readonly receivedAt: string;
  readonly from: string;
  readonly to: readonly string[];
  readonly subject: string;
  readonly text: string;
  /** The HTML part as its source text, '' without one. */
  readonly html: string;
  readonly attachments: readonly { readonly name: string; readonly type: string; readonly bytes: number }[];
}

export interface Mailbox {
  /** Reads a raw message (RFC 5322) and keeps it. */
  keep(raw: Uint8Array): Promise<CaughtMail>;
  all(): readonly CaughtMail[];
  clear(): void;
}

const written = (address: Address | undefined): string => {
  if (address === undefined) return '';
  if (address.address === undefined) return address.name;
  return address.name === '' ? address.address : `${address.name} <${address.address}>`;
};

async function read(raw: Uint8Array, id: number, receivedAt: string): Promise<CaughtMail> {
  const mail = await PostalMime.parse(raw);
  return {
    id,
    receivedAt,
    from: written(mail.from),
    to: [...(mail.to ?? []), ...(mail.cc ?? []), ...(mail.bcc ?? [])].map(written),
    subject: mail.subject ?? '',
    text: mail.text ?? '',
    html: mail.html ?? '',
    attachments: mail.attachments.map(({ filename, mimeType, content }) => ({
      name: filename ?? 'unnamed',
      type: mimeType,
      bytes: typeof content === 'string' ? Buffer.byteLength(content) : content.byteLength,
    })),
  };
}

const fileName = (id: number): string => `${String(id).padStart(6, '0')}.json`;

/** @param folder where mails outlast a restart, one JSON file each; undefined keeps them in memory alone */
export function openMailbox(cap: number, folder: string | undefined): Mailbox {
  if (folder !== undefined) mkdirSync(folder, { recursive: true, mode: 0o700 });
  const stored = folder === undefined ? [] : readdirSync(folder).filter((name) => /^\d+\.json$/.test(name));
  let mails = stored
    .sort()
    .reverse()
    .map((name) => JSON.parse(readFileSync(join(folder ?? '', name), 'utf8')) as CaughtMail);
  let nextId = (mails[0]?.id ?? 0) + 1;

  const forget = (gone: readonly CaughtMail[]): void => {
    if (folder !== undefined) for (const { id } of gone) rmSync(join(folder, fileName(id)), { force: true });
  };

  return {
    async keep(raw) {
      const id = nextId;
      nextId += 1;
      const mail = await read(raw, id, new Date().toISOString());
      if (folder !== undefined) writeFileSync(join(folder, fileName(id)), JSON.stringify(mail), { mode: 0o600 });
      mails = [mail, ...mails].sort((a, b) => b.id - a.id);
      forget(mails.slice(cap));
      mails = mails.slice(0, cap);
      return mail;
    },
    all: () => mails,
    clear() {
      forget(mails);
      mails = [];
    },
  };
}
