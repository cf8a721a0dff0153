import type { IdentifierClass, Strength } from './identifier-class.ts';

/** One kind of identifier met in a header or cell. */
export interface Hit {
  readonly class: IdentifierClass;
  readonly strength: Strength;
}
