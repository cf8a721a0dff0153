import { describe, expect, it } from 'vitest';
import { agreement } from '../../reference/agreement.ts';
import { correlationChecks } from '../../reference/correlations.checks.ts';
import { pairedCategoryChecks } from '../../reference/paired-categories.checks.ts';
import { proportionChecks } from '../../reference/proportions.checks.ts';
import { tableChecks } from '../../reference/tables.checks.ts';

describe('tables', () => {
  it.each([...proportionChecks, ...tableChecks, ...pairedCategoryChecks, ...correlationChecks].map((check) => [check.id, check] as const))(
    '%s agrees with R',
    (_id, check) => {
      const a = agreement(check);
      expect(a.disagreements).toEqual([]);
      expect(a.compared).toBeGreaterThan(0);
    },
  );
});
