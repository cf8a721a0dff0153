/** Who meets which page. The server decides what each may have; this decides which page is shown instead. */
import type { Account } from '@cairnstep/contract';
import { hasRole } from '../lib/account.ts';
import { pages } from './pages.tsx';
import type { Audience, PageEntry } from './pages.tsx';

export type Admission = 'admitted' | 'sign-in-first' | 'no-grant' | 'not-for-this-role';

export function admit(account: Account, audience: Audience): Admission {
  if (audience === 'anyone') return 'admitted';
  if (!account.signedIn) return 'sign-in-first';
  if (account.grants.length === 0) return 'no-grant';
  return audience === 'signed-in' || hasRole(account, ...audience) ? 'admitted' : 'not-for-this-role';
}

/** Public pages until the account is known, then all that this person may open. */
export function navigationFor(account: Account | undefined): readonly (PageEntry & { readonly nav: string })[] {
  return pages.filter(
    (page): page is PageEntry & { readonly nav: string } =>
      page.nav !== undefined && (account === undefined ? page.audience === 'anyone' : admit(account, page.audience) === 'admitted'),
  );
}

/** The page a person begins their work on: the first that is for their role. */
export function startFor(account: Account): string {
  if (account.signedIn && account.grants.length === 0) return '/whom-to-ask';
  return navigationFor(account).find(({ audience }) => typeof audience !== 'string')?.path ?? '/';
}
