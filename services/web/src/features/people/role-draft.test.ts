import { describe, expect, it } from 'vitest';
import { emptyRole, fieldIdsOf, problemsOfRole, roleOf } from './role-draft.ts';

const ids = fieldIdsOf('invite');
const today = '2026-12-01';
const messages = (draft: Parameters<typeof roleOf>[0]) => problemsOfRole(draft, ids, today).map(({ message }) => message);

describe('a role being given', () => {
  it('needs a role, and a site only where the role is one of a site', () => {
    expect(messages(emptyRole)).toEqual(['Choose a role']);
    expect(messages({ ...emptyRole, role: 'coordinator' })).toEqual(['Choose the site this person works at']);
    expect(messages({ ...emptyRole, role: 'coordinator', siteId: 'a' })).toEqual([]);
    expect(messages({ ...emptyRole, role: 'steward' })).toEqual([]);
  });

  it('is not given twice, but may be given at another site', () => {
    const site = { id: 'a', code: 'S01', name: 'North Harbour Clinic' };
    const given = (role: 'coordinator' | 'steward', siteId: string | null) =>
      problemsOfRole({ role, siteId, endsOn: '' }, ids, today, [
        { role: 'coordinator', site },
        { role: 'steward', site: null },
      ]);
    expect(given('coordinator', 'a')).toEqual([{ fieldId: 'invite-role', message: 'The person has this role already' }]);
    expect(given('steward', null)).toHaveLength(1);
    expect(given('coordinator', 'b')).toEqual([]);
  });

  it('may end on a day to come, written as ISO', () => {
    const ending = (endsOn: string) => messages({ ...emptyRole, role: 'researcher', endsOn });
    expect(ending('2027-06-30')).toEqual([]);
    expect(ending(' 2026-12-01 ')).toEqual([]);
    expect(ending('30.6.2027')).toEqual(['Write the last day as year, month and day, such as 2027-06-30']);
    expect(ending('2027-02-30')).toHaveLength(1);
    expect(ending('2026-11-30')).toEqual(['The last day lies in the past']);
  });

  it('leaves a site chosen before away when the role belongs to none', () => {
    expect(roleOf({ role: 'researcher', siteId: 'a', endsOn: '' })).toEqual({ role: 'researcher', siteId: null, endsOn: null });
    expect(roleOf({ role: 'therapist', siteId: 'a', endsOn: ' 2027-06-30' })).toEqual({
      role: 'therapist',
      siteId: 'a',
      endsOn: '2027-06-30',
    });
  });
});
