/** Where to come back to after signing in: only ever an address of this client. */

const here = 'https://here.example';

export function ownAddress(asked: string | null): string {
  if (asked === null || !asked.startsWith('/') || !URL.canParse(asked, here)) return '/start';
  // `//elsewhere.example` and `/\elsewhere.example` begin with a slash and lead away; the parser tells them apart.
  const { origin, pathname, search, hash } = new URL(asked, here);
  return origin === here && !pathname.startsWith('/api/') ? pathname + search + hash : '/start';
}

export function providerAddress(returnTo: string): string {
  return `/api/sign-in?${new URLSearchParams({ returnTo })}`;
}
