import { html } from './html.ts';
import { providerPage } from './provider-page.ts';

/** What the protocol calls the error, in its own words: whoever reads it here is building or testing. */
export function errorPage(error: string, description: string | undefined): string {
  return providerPage(
    'This sign-in cannot go on',
    html`<p>Nobody was signed in. Go back to the registry and start the sign-in again.</p>
      <dl>
        <dt>Error</dt>
        <dd>${error}</dd>
        ${
          description === undefined
            ? html``
            : html`<dt>What the provider says</dt>
                <dd>${description}</dd>`
        }
      </dl>`,
  );
}
