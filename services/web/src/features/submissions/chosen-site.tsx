/** Which site's months are shown: a person's own one, or the one of several that the address names (`?site=S02`). */
import type { Account, Site } from '@cairnstep/contract';
import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { accountQuery, hasRole, sitesOf } from '../../lib/account.ts';
import { useAddressChange, useAddressParam } from '../../lib/address-state.ts';
import { sitesQuery } from '../../lib/sites.ts';
import { Answer } from '../../ui/answer.tsx';
import { EmptyState } from '../../ui/empty-state.tsx';
import { Section } from '../../ui/page.tsx';
import { RadioGroup } from '../../ui/radio-group.tsx';
import { Select } from '../../ui/select.tsx';

const asRadioButtons = 5;

/** Coordinators and therapists see their own sites, stewards all. */
export function ForChosenSite({ children }: { readonly children: (site: Site, account: Account) => ReactNode }) {
  const account = useQuery(accountQuery());
  const everywhere = hasRole(account.data, 'steward');
  const all = useQuery({ ...sitesQuery(), enabled: everywhere });
  if (account.data === undefined || (everywhere && all.data === undefined)) {
    return (
      <Section>
        <Answer query={account} waiting="Looking up your account.">
          {() => (
            <Answer query={all} waiting="Looking up the sites.">
              {() => null}
            </Answer>
          )}
        </Answer>
      </Section>
    );
  }
  const known = account.data;
  return <ChosenOf sites={all.data?.sites ?? sitesOf(known)}>{(site) => children(site, known)}</ChosenOf>;
}

function ChosenOf({ sites, children }: { readonly sites: readonly Site[]; readonly children: (site: Site) => ReactNode }) {
  const [code] = useAddressParam('site');
  const change = useAddressChange();
  const chosen = sites.find((site) => site.code === code) ?? sites[0];
  if (chosen === undefined) {
    return (
      <Section>
        <EmptyState>No site has been entered yet. An administrator brings sites into the registry.</EmptyState>
      </Section>
    );
  }
  const choice = {
    id: 'site',
    label: 'Site',
    value: chosen.code,
    options: sites.map((site) => ({ value: site.code, label: `${site.name} (${site.code})` })),
    onChange: (site: string) => change({ site, page: null }),
  };
  return (
    <>
      {sites.length > 1 && <Section>{sites.length > asRadioButtons ? <Select {...choice} /> : <RadioGroup {...choice} inline />}</Section>}
      {children(chosen)}
    </>
  );
}

/** Whether this person may submit for the site; the server decides again at each act. */
export const maySubmit = (account: Account | undefined, site: Site): boolean =>
  account?.grants.some((grant) => grant.role === 'coordinator' && grant.site?.id === site.id) ?? false;
