/** Who is signed in, as every part of the client asks it. The server decides; this only hides what it would refuse. */
import type { Account, Role } from '@cairnstep/contract';
import { queryOptions, useQuery } from '@tanstack/react-query';

export const accountQuery = () =>
  queryOptions({
    queryKey: ['account'],
    queryFn: async ({ signal }) => (await import('./account-requests.ts')).askForAccount(signal),
    staleTime: 60_000,
  });

export const signOut = async (): Promise<string> => (await import('./account-requests.ts')).endSession();

/** The account, or `undefined` while it is being asked for. */
export function useAccount(): Account | undefined {
  return useQuery(accountQuery()).data;
}

export function hasRole(account: Account | undefined, ...wanted: readonly Role[]): boolean {
  return account?.grants.some(({ role }) => wanted.includes(role)) ?? false;
}

/** The sites a person works at, each once, in the order of their codes. */
export function sitesOf(account: Account): NonNullable<Account['grants'][number]['site']>[] {
  const sites = new Map(account.grants.flatMap(({ site }) => (site === null ? [] : [[site.id, site] as const])));
  return [...sites.values()].sort((a, b) => a.code.localeCompare(b.code));
}

/** Where to sign in and then come back to. */
export function signInAddress(returnTo: string): string {
  return `/sign-in?${new URLSearchParams({ returnTo })}`;
}
