import { describe, expect, it } from 'vitest';
import { nobody, signedInAs, site } from '../testing/fake-api.ts';
import { admit, navigationFor, startFor } from './audience.ts';

const coordinator = signedInAs({ role: 'coordinator', site });

describe('who meets which page', () => {
  it('lets anyone see a public page', () => {
    expect(admit(nobody, 'anyone')).toBe('admitted');
    expect(admit(signedInAs(), 'anyone')).toBe('admitted');
  });

  it('asks a stranger to sign in first', () => {
    expect(admit(nobody, 'signed-in')).toBe('sign-in-first');
    expect(admit(nobody, ['coordinator'])).toBe('sign-in-first');
  });

  it('sends a person without a role to those who give one', () => {
    expect(admit(signedInAs(), 'signed-in')).toBe('no-grant');
  });

  it('opens a page to its roles only', () => {
    expect(admit(coordinator, ['coordinator', 'therapist'])).toBe('admitted');
    expect(admit(coordinator, ['steward'])).toBe('not-for-this-role');
  });

  it('shows in the navigation only what opens', () => {
    for (const account of [nobody, signedInAs(), coordinator, signedInAs({ role: 'steward', site: null })]) {
      for (const page of navigationFor(account)) expect(admit(account, page.audience)).toBe('admitted');
    }
    expect(navigationFor(undefined).every(({ audience }) => audience === 'anyone')).toBe(true);
  });

  it('leads those who look after people to the systems of sites as well', () => {
    const words = (role: 'steward' | 'administrator' | 'researcher') =>
      navigationFor(signedInAs({ role, site: null })).map(({ nav }) => nav);
    expect(words('steward')).toContain('Site systems');
    expect(words('administrator')).toContain('Site systems');
    expect(words('researcher')).not.toContain('Site systems');
  });

  it('begins nowhere but the first page for a stranger, and at whom to ask without a role', () => {
    expect(startFor(nobody)).toBe('/');
    expect(startFor(signedInAs())).toBe('/whom-to-ask');
  });
});
