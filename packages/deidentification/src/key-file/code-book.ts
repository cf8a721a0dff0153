import { hmacKey, keyedHash } from '../pseudonyms/keyed-hash.ts';
import { pseudonymFromHmac } from '../pseudonyms/pseudonym-from-hmac.ts';
import { randomPseudonym } from '../pseudonyms/random-pseudonym.ts';
import type { ReplacedCode } from '../preparation/month.ts';
import { toBase64 } from './base64.ts';
import type { KeyGeneration, SiteKey } from './site-key.ts';

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
  /** First training days by code, to be read and filled while the book is open. */
  readonly indexDates: Map<string, string>;
  private readonly replaced: ReplacedCode[] = [];
  private readonly found = new Map<string, FoundCode>();

  private constructor(
    private readonly key: SiteKey,
    private readonly generations: readonly [OpenGeneration, ...OpenGeneration[]],
  ) {
    this.indexDates = new Map(key.indexDates);
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

  /** Lets a record number lead to the code of another one: the same person, twice in the clinic's system. */
  async join(localId: string, code: string): Promise<void> {
    const { code: own, isNew } = await this.codeOf(localId);
    if (own === code) return;
    this.generations[0].codes.set(await this.lookUpIn(this.generations[0], localId), code);
    this.found.set(localId, { code, isNew: false });
    if (!isNew) this.replace(own, code);
  }

  /** Codes that others replaced while the book was open. */
  get replacedCodes(): readonly ReplacedCode[] {
    return this.replaced;
  }

  /** The key with everything that was added. */
  close(): SiteKey {
    const closeGeneration = ({ keyId, secret, codes, replacedBy }: OpenGeneration): KeyGeneration => ({ keyId, secret, codes, replacedBy });
    const [current, ...earlier] = this.generations;
    return { ...this.key, indexDates: this.indexDates, generations: [closeGeneration(current), ...earlier.map(closeGeneration)] };
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
    return this.indexDates.has(code) || generation.replacedBy.has(code) ? code : undefined;
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
    if (this.key.mode === 'hmac') return this.computed(current, localId);
    const code = await randomPseudonym();
    current.codes.set(await this.lookUpIn(current, localId), code);
    return code;
  }

  /** The earlier of two first training days is the first one. */
  private replace(from: string, to: string): void {
    this.replaced.push({ from, to });
    const [lost, kept] = [this.indexDates.get(from), this.indexDates.get(to)];
    this.indexDates.delete(from);
    if (lost !== undefined && (kept === undefined || lost < kept)) this.indexDates.set(to, lost);
  }

  private computed({ hmac }: OpenGeneration, localId: string): Promise<string> {
    return pseudonymFromHmac(hmac, this.key.site, this.key.idType, localId);
  }

  private async lookUpIn({ hmac }: OpenGeneration, localId: string): Promise<string> {
    const hash = await keyedHash(hmac, ['sci-gait-lookup', '1', this.key.site, this.key.idType, localId]);
    return toBase64(hash.subarray(0, lookUpBytes));
  }
}
