import type { Hit } from '../hit.ts';
import type { IdentifierClass, Strength } from '../identifier-class.ts';
import { normaliseText } from '../normalise-text.ts';

/** Stands in for a piece of text that has been recognised; no pattern matches it. */
const taken = '\u0000';

export type Judgement = Strength | 'not-it';

/**
 * One cell on its way through the detectors. What one detector recognises is taken out, so that a later and vaguer one does not see the
 * same characters again: a card number is no telephone number.
 */
export class CellScan {
  private rest: string;
  private readonly found = new Set<string>();

  constructor(cell: string) {
    this.rest = normaliseText(cell);
  }

  /** What no detector has recognised yet. */
  get text(): string {
    return this.rest;
  }

  /** Takes out every match that is judged to be an identifier. */
  take(
    name: IdentifierClass,
    pattern: RegExp,
    judge: (match: string, groups: readonly (string | undefined)[]) => Judgement = () => 'block',
  ): void {
    this.rest = this.rest.replace(pattern, (match: string, ...more: unknown[]) => {
      // Behind the groups come the place of the match and the whole text.
      const groups = more.slice(
        0,
        more.findIndex((each) => typeof each === 'number'),
      ) as (string | undefined)[];
      const judgement = judge(match, groups);
      if (judgement === 'not-it') return match;
      this.add(name, judgement);
      return taken;
    });
  }

  add(name: IdentifierClass, strength: Strength): void {
    this.found.add(`${name}:${strength}`);
  }

  /** What was found; a class that blocks is not reported as a warning too. */
  hits(): Hit[] {
    return [...this.found]
      .map((each) => {
        const [name, strength] = each.split(':') as [IdentifierClass, Strength];
        return { class: name, strength };
      })
      .filter((hit) => hit.strength === 'block' || !this.found.has(`${hit.class}:block`));
  }
}
