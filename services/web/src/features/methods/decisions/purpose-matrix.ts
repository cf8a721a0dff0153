/** Which purpose each kind of permission allows, asked of the matching itself, so that the page cannot say otherwise. */
import { decideUse, purposes } from '@cairnstep/consent';
import type { PermissionCode, Purpose, Verdict } from '@cairnstep/consent';

/** The registry holds people with one condition: a consent for a condition names it, and so does every request. */
const condition = 'spinal_cord_injury';

/** Any day: the consent asked about does not end. */
const anyDay = '2026-01-01';

/** From the widest to the narrowest, ancestry beside them. */
export const permissionCodes: readonly PermissionCode[] = ['NRES', 'GRU', 'HMB', 'DS', 'POA'];

export function verdictOn(purpose: Purpose, permission: PermissionCode): Verdict {
  const { verdict } = decideUse(
    { status: 'active', permissions: [{ code: permission, ...(permission === 'DS' && { conditions: [condition] }) }], modifiers: [] },
    {
      purpose,
      conditions: purpose === 'biomedical_research' ? [] : [condition],
      genetics: 'none',
      organisations: ['not_for_profit'],
      hasCommercialPurpose: false,
      countries: [],
      decisionDate: anyDay,
      months: 12,
    },
  );
  return verdict;
}

export const purposeKeys = Object.keys(purposes) as readonly Purpose[];
