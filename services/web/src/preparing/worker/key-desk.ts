/** The opened key of the site: it never leaves this object but as an encrypted file. */
import {
  KeyFileRefusal,
  createKeyFile,
  joinLocalIds,
  mergeKeys,
  normaliseLocalId,
  openKeyFile,
  rotateKey,
  saveKeyFile,
  usualNormalisation,
} from '@cairnstep/deidentification';
import type { ReplacedCode, SiteKey } from '@cairnstep/deidentification';
import { chainCodes } from './chain-codes.ts';
import { hexadecimal } from './hexadecimal.ts';
import { keyChanges, noActs } from './key-changes.ts';
import type { KeyActs } from './key-changes.ts';
import type { Circumstances, KeyPicture, NewKey, SavedFile } from './protocol.ts';
import { Refusal } from './refusal.ts';
import { spellingsOf } from './spellings.ts';

interface OpenedKey {
  readonly key: SiteKey;
  readonly passphrase: string;
  /** What the file holds, to tell whether the key has more. */
  readonly saved: SiteKey;
  /** Since the file was saved or opened. */
  readonly acts: KeyActs;
}

/** What a month adds to the key, as long as it is neither saved nor given up. */
interface Addition {
  readonly key: SiteKey;
  readonly replaced: readonly ReplacedCode[];
}

/** Characters of a digest by which two files are told apart. */
const digestShown = 4;
/** Bytes; no key file comes near it, and something larger need not be read to be refused. */
const largestFile = 40_000_000;

export class KeyDesk {
  private opened: OpenedKey | null = null;
  private addition: Addition | null = null;
  private replaced: readonly ReplacedCode[] = [];
  /** Codes of people whom the file did not know when it was opened, and that were saved since. */
  private metHere: ReadonlySet<string> = new Set();

  constructor(private readonly circumstances: () => Circumstances) {}

  /** The key that a month goes on from. @throws Refusal when none is open */
  get key(): SiteKey {
    return this.require().key;
  }

  get isOpen(): boolean {
    return this.opened !== null;
  }

  async make({ mode, idType, stripLeadingZeros, passphrase }: NewKey): Promise<SavedFile> {
    const { site, today } = this.circumstances();
    const normalisation = { ...usualNormalisation, stripLeadingZeros };
    const { key, file } = await createKeyFile({ site, keyId: today.slice(0, 7), mode, idType, normalisation }, passphrase);
    this.take({ key, passphrase });
    return this.fileOf(key, file);
  }

  async open(file: Blob, typed: string): Promise<void> {
    this.take(await this.read(file, typed));
  }

  /** Whether nobody but this visit has brought the person into the key. */
  wasMetHere(code: string): boolean {
    return this.metHere.has(code);
  }

  /** Goes on with what a month has added, until it is saved or worked out again. */
  add(addition: Addition): void {
    this.addition = addition;
  }

  giveUpAddition(): void {
    this.addition = null;
  }

  async save(): Promise<SavedFile> {
    const { passphrase } = this.require();
    const { key, file } = await saveKeyFile(this.current, passphrase);
    this.replaced = this.codesToReplace;
    this.metHere = this.metUntilNow();
    this.opened = { key, passphrase, saved: key, acts: noActs };
    this.addition = null;
    return this.fileOf(key, file);
  }

  /** @returns codes of people whose rows have to be sent again, and how many codes were replaced */
  async merge(file: Blob, typed: string): Promise<{ replaced: number; firstDaysMoved: readonly string[] }> {
    const { key: other } = await this.read(file, typed);
    const { key, replaced, indexDatesMoved } = mergeKeys(this.key, other);
    this.change(key, replaced);
    return { replaced: replaced.length, firstDaysMoved: indexDatesMoved };
  }

  /** @returns how many people were carried over at once */
  async rotate(recordNumbers: readonly string[]): Promise<number> {
    const { key, replaced } = await rotateKey(this.key, this.freshKeyId(), this.normalised(recordNumbers));
    this.change(key, replaced);
    return replaced.length;
  }

  /** @returns the person's code where their first training day moved with it */
  async join(keptNumber: string, joinedNumber: string): Promise<{ replaced: number; firstDayMoved: string | null }> {
    const before = this.key;
    const [kept, joined] = this.normalised([keptNumber, joinedNumber]);
    if (kept === undefined || joined === undefined) throw new Refusal('nobody-known', 'Give both record numbers.');
    if (kept === joined) throw new Refusal('same-number', 'Both are the same record number, in different spellings.');
    const { key, replaced } = await joinLocalIds(before, kept, joined);
    // Joined to itself, a number of somebody known changes nothing.
    const alone = await joinLocalIds(before, kept, kept);
    if (alone.key.people.size > before.people.size)
      throw new Refusal('nobody-known', 'The key knows nobody with the record number to be kept. Check how it is written.');
    this.change(key, replaced);
    const days = replaced.flatMap(({ from, to }) => [from, to]).map((code) => before.people.get(code)?.indexDate);
    const moved = new Set(days.filter((day) => day !== undefined)).size > 1;
    return { replaced: replaced.length, firstDayMoved: moved ? (replaced[0]?.to ?? null) : null };
  }

  /** The present file stays locked with the old passphrase; the key counts as unsaved until a file is locked with the new one. */
  changePassphrase(passphrase: string): void {
    const opened = this.require();
    this.opened = { ...opened, passphrase, acts: { ...opened.acts, hasNewPassphrase: true } };
  }

  /** Codes of which the registry does not know yet that others took their place. */
  get codesToReplace(): readonly ReplacedCode[] {
    return chainCodes(this.replaced, this.addition?.replaced ?? []);
  }

  /** The registry was told. */
  forgetReplaced(): void {
    this.replaced = [];
    if (this.addition !== null) this.addition = { ...this.addition, replaced: [] };
  }

  picture(): KeyPicture | null {
    if (this.opened === null) return null;
    const { key, saved, acts } = this.opened;
    const changes = keyChanges(saved, this.current, acts);
    const { mode, idType, normalisation, people, generations, matches } = this.current;
    return {
      keyId: generations[0].keyId,
      revision: key.revision,
      mode,
      idType,
      stripLeadingZeros: normalisation.stripLeadingZeros,
      people: people.size,
      peopleWithFirstDay: [...people.values()].filter(({ indexDate }) => indexDate !== undefined).length,
      secrets: generations.length,
      tables: [...matches.keys()],
      isUnsaved: changes !== null,
      changes,
      lacking: this.lacking(),
      codesToReplace: this.codesToReplace.length,
    };
  }

  /** @returns the key, and its passphrase as the file is locked with it */
  private async read(file: Blob, typed: string): Promise<Pick<OpenedKey, 'key' | 'passphrase'>> {
    if (file.size > largestFile) throw new KeyFileRefusal('not-a-key-file');
    const text = await file.text();
    const { site } = this.circumstances();
    for (const passphrase of spellingsOf(typed)) {
      try {
        return { key: await openKeyFile(text, passphrase, { site }), passphrase };
      } catch (error) {
        if (!(error instanceof KeyFileRefusal) || error.code !== 'cannot-be-opened') throw error;
      }
    }
    throw new KeyFileRefusal('cannot-be-opened');
  }

  private get current(): SiteKey {
    return this.addition?.key ?? this.key;
  }

  private require(): OpenedKey {
    if (this.opened === null) throw new Refusal('failed', 'Open the key file first.');
    return this.opened;
  }

  private take({ key, passphrase }: Pick<OpenedKey, 'key' | 'passphrase'>): void {
    this.opened = { key, passphrase, saved: key, acts: noActs };
    this.addition = null;
    this.metHere = new Set();
    this.replaced = this.leftToReplace(key);
  }

  /** After a rotation of which the registry was never told: codes it still holds, though the key has led them on. */
  private leftToReplace({ generations }: SiteKey): ReplacedCode[] {
    return (this.circumstances().knownParticipants ?? []).flatMap((from) => {
      const to = generations.reduceRight((code, { replacedBy }) => replacedBy.get(code) ?? code, from);
      return to === from ? [] : [{ from, to }];
    });
  }

  private change(key: SiteKey, replaced: readonly ReplacedCode[]): void {
    const opened = this.require();
    this.opened = { ...opened, key, acts: { ...opened.acts, hasOtherCodes: true } };
    this.addition = null;
    this.metHere = renamed(this.metHere, replaced);
    this.replaced = chainCodes(this.replaced, replaced);
  }

  private metUntilNow(): Set<string> {
    const replaced = this.addition?.replaced ?? [];
    const carriedOver = new Set(replaced.map(({ to }) => to));
    const added = [...this.current.people.keys()].filter((code) => !this.key.people.has(code) && !carriedOver.has(code));
    return new Set([...renamed(this.metHere, replaced), ...added]);
  }

  private normalised(recordNumbers: readonly string[]): string[] {
    return recordNumbers.map((each) => normaliseLocalId(each, this.key.normalisation)).filter((each) => each !== '');
  }

  /** The month, with a number behind it where the month has had a secret already. */
  private freshKeyId(): string {
    const month = this.circumstances().today.slice(0, 7);
    const used = new Set(this.key.generations.map(({ keyId }) => keyId));
    let keyId = month;
    for (let number = 2; used.has(keyId); number += 1) keyId = `${month}-${number}`;
    return keyId;
  }

  private lacking(): KeyPicture['lacking'] {
    const { knownParticipants } = this.circumstances();
    if (knownParticipants === null) return null;
    const { people, generations } = this.current;
    const replaced = new Set(this.codesToReplace.map(({ from }) => from));
    const knows = (code: string) => people.has(code) || replaced.has(code) || generations.some(({ replacedBy }) => replacedBy.has(code));
    const missing = knownParticipants.filter((code) => !knows(code)).length;
    return missing === 0 ? null : { missing, of: knownParticipants.length };
  }

  /** The number in the name says which file is the newest; two copies that went on separately differ in what stands behind it. */
  private async fileOf({ site, revision }: SiteKey, text: string): Promise<SavedFile> {
    const digest = hexadecimal(await crypto.subtle.digest('SHA-256', new TextEncoder().encode(text)));
    return { name: `${site}-site-key-r${revision}-${this.circumstances().today}-${digest.slice(0, digestShown)}.json`, text };
  }
}

function renamed(codes: ReadonlySet<string>, replaced: readonly ReplacedCode[]): Set<string> {
  const names = new Map(replaced.map(({ from, to }) => [from, to]));
  return new Set([...codes].map((code) => names.get(code) ?? code));
}
