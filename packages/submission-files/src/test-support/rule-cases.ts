import { describe, expect, it } from 'vitest';
import type { RegistryContext } from '@cairnstep/submission-files';
import type { MonthRows } from './a-month.ts';
import { checkMonth, placesOf } from './findings-of.ts';
import type { Place } from './findings-of.ts';

interface Situation {
  /** What the rows show, as the rest of a sentence. */
  readonly when: string;
  readonly rows: MonthRows;
  readonly registry?: RegistryContext;
}

export interface RuleCases {
  readonly rule: string;
  /** Where the rule comes from. */
  readonly source: string;
  readonly breaks: readonly (Situation & { readonly at: readonly Place[] })[];
  readonly holds: readonly Situation[];
}

/** Each rule with months that break it, and where, and months that do not. */
export function testRules(cases: readonly RuleCases[]): void {
  for (const { rule, source, breaks, holds } of cases) {
    describe(`${rule} (${source})`, () => {
      it.each(breaks)('finds $when', async ({ rows, registry, at }) => {
        expect(placesOf(await checkMonth(rows, registry), rule)).toEqual(at);
      });
      it.each(holds)('passes $when', async ({ rows, registry }) => {
        expect(placesOf(await checkMonth(rows, registry), rule)).toEqual([]);
      });
    });
  }
}
