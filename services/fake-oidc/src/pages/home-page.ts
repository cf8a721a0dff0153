import type { Person } from '../options.ts';
import { html } from './html.ts';
import { providerPage } from './provider-page.ts';

/** What the address of the provider shows to someone who comes without a sign-in under way. */
export function homePage(people: readonly Person[], registryOrigins: readonly string[]): string {
  const back = registryOrigins.map((origin) => html`<li><a href="${origin}/">${origin}</a></li>`);
  const listed = people.map(
    (person) =>
      html`<li>
        <p>
          ${person.name}<br /><span class="quiet">${person.label}<br />${person.email}</span>
        </p>
      </li>`,
  );
  return providerPage(
    'Local sign-in',
    html`<p>A sign-in begins at the registry, which sends you here to choose a person:</p>
      <ul class="sheet">
        ${back}
      </ul>
      <h2>People who can sign in</h2>
      <ul class="sheet">
        ${listed}
      </ul>
      <p><a href="/.well-known/openid-configuration">How a program finds this provider</a> (OpenID Connect Discovery)</p>`,
  );
}
