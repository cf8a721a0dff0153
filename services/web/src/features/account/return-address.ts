/** Where to come back to after signing in: only ever an address of this client. */

export function ownAddress(asked: string | null): string {
  if (asked === null || !asked.startsWith('/')) return '/start';
  // `//elsewhere.example` and `/\elsewhere.example` begin with a slash and lead away; the parser tells them apart.
  const here = 'https://here.example';
  const parsed = URL.parse(asked, here);
  return parsed?.origin === here && !parsed.pathname.startsWith('/api/') ? parsed.pathname + parsed.search + parsed.hash : '/start';
}

export function providerAddress(returnTo: string): string {
  return `/api/sign-in?${new URLSearchParams({ returnTo })}`;
}
