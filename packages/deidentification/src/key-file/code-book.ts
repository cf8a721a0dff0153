import { hmacKey, keyedHash } from '../pseudonyms/keyed-hash.ts';
import { pseudonymFromHmac } from '../pseudonyms/pseudonym-from-hmac.ts';
import { randomPseudonym } from '../pseudonyms/random-pseudonym.ts';
import type { ReplacedCode } from '../preparation/month.ts';
import { toBase64 } from './base64.ts';
import { joinPeople } from './join-people.ts';
import type { KeyGeneration, KnownPerson, SiteKey } from './site-key.ts';

export interface FoundCode {
  readonly code: string;
  /** Nobody with this record number was known before. */
  readonly isNew: boolean;
}

/** 128 bits of a keyed hash: enough to tell a site's people apart, and nothing to read for who glances at the opened table. */
const lookUpBytes = 16;

interface OpenGeneration {
  readonly keyId: string;
  readonly secret: KeyGeneration['secret'];
  readonly hmac: CryptoKey;
  readonly codes: Map<string, string>;
  readonly replacedBy: Map<string, string>;
}

/**
 * The codes of a site's people while they are being looked up. New people get a code; people known under an older secret get one of the
 * present secret, and the pair is remembered for the registry.
 */
export class CodeBook {
  private readonly people: Map<string, KnownPerson>;
  private readonly replaced: ReplacedCode[] = [];
  private readonly found = new Map<string, FoundCode>();

  private constructor(
    private readonly key: SiteKey,
    private readonly generations: readonly [OpenGeneration, ...OpenGeneration[]],
  ) {
    this.people = new Map(key.people);
  }

  static async open(key: SiteKey): Promise<CodeBook> {
    const openGeneration = async ({ keyId, secret, codes, replacedBy }: KeyGeneration): Promise<OpenGeneration> => ({
      keyId,
      secret,
      hmac: await hmacKey(secret),
      codes: new Map(codes),
      replacedBy: new Map(replacedBy),
    });
    const [current, ...earlier] = key.generations;
    return new CodeBook(key, [await openGeneration(current), ...(await Promise.all(earlier.map(openGeneration)))]);
  }

  /** The code of a normalised record number. */
  async codeOf(localId: string): Promise<FoundCode> {
    const before = this.found.get(localId);
    if (before !== undefined) return { ...before, isNew: false };
    const known = await this.knownCodeOf(localId);
    const found = { code: known ?? (await this.makeCode(localId)), isNew: known === undefined };
    this.found.set(localId, found);
    return found;
  }

  /** The present code of somebody whose code stands in the file already. */
  presentCodeOf(code: string): string {
    return this.generations.reduceRight((present, { replacedBy }) => replacedBy.get(present) ?? present, code);
  }

  /** What is remembered of the person with this code. */
  person(code: string): KnownPerson {
    return this.people.get(code) ?? {};
  }

  remember(code: string, facts: KnownPerson): void {
    this.people.set(code, { ...this.person(code), ...facts });
  }

  /** Lets a record number lead to the code of another one: the same person, twice in the clinic's system. */
  async join(localId: string, code: string): Promise<void> {
    const { code: own, isNew } = await this.codeOf(localId);
    if (own === code) return;
    this.generations[0].codes.set(await this.lookUpIn(this.generations[0], localId), code);
    this.found.set(localId, { code, isNew: false });
    if (isNew) this.people.delete(own);
    else this.replace(own, code);
  }

  /** Codes that others replaced while the book was open. */
  get replacedCodes(): readonly ReplacedCode[] {
    return this.replaced;
  }

  /** The key with everything that was added. */
  close(): SiteKey {
    const closeGeneration = ({ keyId, secret, codes, replacedBy }: OpenGeneration): KeyGeneration => ({ keyId, secret, codes, replacedBy });
    const [current, ...earlier] = this.generations;
    return {
      ...this.key,
      people: this.people,
      generations: [closeGeneration(current), ...earlier.map(closeGeneration)],
    };
  }

  /** The present code of somebody known, carried over from an older secret where needed. */
  async knownCodeOf(localId: string): Promise<string | undefined> {
    const [current, ...earlier] = this.generations;
    const known = await this.knownIn(current, localId);
    if (known !== undefined) return known;
    for (const generation of earlier) {
      const old = await this.knownIn(generation, localId);
      if (old !== undefined) return this.carryOver(generation, old, localId);
    }
    return undefined;
  }

  private async knownIn(generation: OpenGeneration, localId: string): Promise<string | undefined> {
    const remembered = generation.codes.get(await this.lookUpIn(generation, localId));
    if (remembered !== undefined || this.key.mode === 'random') return remembered;
    const code = await this.computed(generation, localId);
    return this.people.has(code) || generation.replacedBy.has(code) ? code : undefined;
  }

  /** The code under the present secret of somebody known under an older one. */
  private async carryOver(generation: OpenGeneration, old: string, localId: string): Promise<string> {
    const already = generation.replacedBy.get(old);
    if (already !== undefined) {
      this.generations[0].codes.set(await this.lookUpIn(this.generations[0], localId), already);
      return already;
    }
    const code = await this.makeCode(localId);
    generation.replacedBy.set(old, code);
    this.replace(old, code);
    return code;
  }

  private async makeCode(localId: string): Promise<string> {
    const [current] = this.generations;
    const code = this.key.mode === 'hmac' ? await this.computed(current, localId) : await randomPseudonym();
    if (this.key.mode === 'random') current.codes.set(await this.lookUpIn(current, localId), code);
    this.people.set(code, {});
    return code;
  }

  private replace(from: string, to: string): void {
    this.replaced.push({ from, to });
    this.people.set(to, joinPeople(this.people.get(to), this.people.get(from)));
    this.people.delete(from);
  }

  private computed({ hmac }: OpenGeneration, localId: string): Promise<string> {
    return pseudonymFromHmac(hmac, this.key.site, this.key.idType, localId);
  }

  private async lookUpIn({ hmac }: OpenGeneration, localId: string): Promise<string> {
    const hash = await keyedHash(hmac, ['sci-gait-lookup', '1', this.key.site, this.key.idType, localId]);
    return toBase64(hash.subarray(0, lookUpBytes));
  }
}
