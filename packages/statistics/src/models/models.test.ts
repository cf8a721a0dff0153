import { describe, expect, it } from 'vitest';
import { agreement } from '../../reference/agreement.ts';
import { modelChecks } from '../../reference/models.checks.ts';

describe('models', () => {
  it.each(modelChecks.map((check) => [check.id, check] as const))('%s agrees with R', (_id, check) => {
    expect(agreement(check).disagreements).toEqual([]);
  });
});
