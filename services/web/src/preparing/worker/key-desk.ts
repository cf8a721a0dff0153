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
import type { Circumstances, KeyPicture, NewKey, SavedFile } from './protocol.ts';
import { Refusal } from './refusal.ts';

interface OpenedKey {
  readonly key: SiteKey;
  readonly passphrase: string;
  /** What the file holds, to tell whether the key has more. */
  readonly saved: string;
}

/** What a month adds to the key, as long as it is neither saved nor given up. */
interface Addition {
  readonly key: SiteKey;
  readonly replaced: readonly ReplacedCode[];
}

/** Bytes; no key file comes near it, and something larger need not be read to be refused. */
const largestFile = 40_000_000;

export class KeyDesk {
  private opened: OpenedKey | null = null;
  private addition: Addition | null = null;
  private replaced: readonly ReplacedCode[] = [];

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
    this.take(key, passphrase);
    return this.fileOf(key, file);
  }

  async open(file: Blob, passphrase: string): Promise<void> {
    this.take(await this.read(file, passphrase), passphrase);
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
    this.opened = { key, passphrase, saved: contentOf(key) };
    this.addition = null;
    return this.fileOf(key, file);
  }

  /** @returns codes of people whose rows have to be sent again, and how many codes were replaced */
  async merge(file: Blob, passphrase: string): Promise<{ replaced: number; firstDaysMoved: readonly string[] }> {
    const other = await this.read(file, passphrase);
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
    this.opened = { ...this.require(), passphrase, saved: '' };
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
    const { revision } = this.opened.key;
    const { mode, idType, normalisation, people, generations, matches } = this.current;
    return {
      keyId: generations[0].keyId,
      revision,
      mode,
      idType,
      stripLeadingZeros: normalisation.stripLeadingZeros,
      people: people.size,
      peopleWithFirstDay: [...people.values()].filter(({ indexDate }) => indexDate !== undefined).length,
      secrets: generations.length,
      tables: [...matches.keys()],
      isUnsaved: contentOf(this.current) !== this.opened.saved,
      lacking: this.lacking(),
      codesToReplace: this.codesToReplace.length,
    };
  }

  private async read(file: Blob, passphrase: string): Promise<SiteKey> {
    if (file.size > largestFile) throw new KeyFileRefusal('not-a-key-file');
    return openKeyFile(await file.text(), passphrase, { site: this.circumstances().site });
  }

  private get current(): SiteKey {
    return this.addition?.key ?? this.key;
  }

  private require(): OpenedKey {
    if (this.opened === null) throw new Refusal('failed', 'Open the key file first.');
    return this.opened;
  }

  private take(key: SiteKey, passphrase: string): void {
    this.opened = { key, passphrase, saved: contentOf(key) };
    this.addition = null;
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
    this.opened = { ...this.require(), key };
    this.addition = null;
    this.replaced = chainCodes(this.replaced, replaced);
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

  /** The revision in the name tells two copies apart. */
  private fileOf({ site, revision }: SiteKey, text: string): SavedFile {
    return { name: `${site}-site-key-r${revision}.json`, text };
  }
}

/** The content of a key as text that can be compared; the times it was saved are no content. */
function contentOf({ revision: _, ...content }: SiteKey): string {
  return JSON.stringify(content, (__, value: unknown) => {
    if (value instanceof Map) return [...(value as Map<unknown, unknown>)];
    return value instanceof Uint8Array ? [...value] : value;
  });
}
