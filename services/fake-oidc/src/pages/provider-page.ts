import { standInPage } from './stand-in-page.ts';
import type { Html } from './html.ts';

const notice =
  'This local page takes the place of your organisation’s sign-in. Its people are invented, it asks for no password, and it protects nothing.';

/** A page of the provider, with its label. */
export function providerPage(title: string, body: Html): string {
  return standInPage({ title, notice, body });
}
