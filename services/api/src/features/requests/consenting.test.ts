import { emptyRequestForm } from '@cairnstep/contract';
import type { RequestForm } from '@cairnstep/contract';
import { exampleRow, tableOf } from '@cairnstep/dictionary';
import { describe, expect, it } from 'vitest';
import { verdictOn } from './consenting.ts';

const today = '2026-12-01';
const form: RequestForm = {
  ...emptyRequestForm({ outcome: 'tmwt_ss', inDevice: false, cells: [] }),
  purpose: 'condition_research',
  ethicsExpiresOn: '2028-12-31',
  organisationType: 'not_for_profit',
  country: 'NL',
  commercialInterest: 'no',
  months: 12,
  agreesToPublish: 'yes',
  agreesToCollaborate: 'yes',
  agreesToReturn: 'yes',
};
/** As the database gives a row: what is not known is null. */
const example = exampleRow('consents');
const row = Object.fromEntries(tableOf('consents').variables.map(({ key }) => [key, example[key] ?? null]));
const verdict = (more: Record<string, string | number | null> = {}, asked = form) => verdictOn({ ...row, ...more }, asked, today);

describe('a stored consent', () => {
  it('permits the use that it names', () => {
    expect(verdict()).toMatchObject({ verdict: 'permitted', reasons: [] });
    expect(verdict({ duo_gs: 'yes', duo_gs_area: 'eea' })).toMatchObject({ verdict: 'permitted' });
    expect(verdict({ duo_gs: 'yes', duo_gs_area: 'north_america' })).toMatchObject({ verdict: 'not_permitted' });
  });

  it("is left to a person where it allows use in the clinic's own country, which the registry does not hold", () => {
    expect(verdict({ duo_gs: 'yes', duo_gs_area: 'own_country' })).toMatchObject({
      verdict: 'manual_review',
      reasons: ['area_value_missing'],
    });
  });

  it('is left to a person where it ends on a study day, whose date the registry does not know', () => {
    expect(verdict({ valid_until_day: 3_650 })).toMatchObject({ verdict: 'manual_review', reasons: ['consent_end_uncertain'] });
  });

  it('permits nothing when there is none or it cannot be read', () => {
    const none = verdictOn(undefined, form, today);
    expect(none.verdict).not.toBe('permitted');
    expect(verdict({ duo_npu: 'perhaps' })).toEqual(none);
  });
});
