import type { Person } from '../options.ts';
import { html } from './html.ts';
import { providerPage } from './provider-page.ts';

export interface SignInPage {
  readonly people: readonly Person[];
  /** Where the choice is posted: `<interaction>/sign-in`, and `<interaction>/cancel` to go back without one. */
  readonly interaction: string;
  /** The person already signed in, when the registry asks for a fresh sign-in. */
  readonly signedInAs: Person | undefined;
}

/** One button a person: choosing is signing in. */
export function signInPage({ people, interaction, signedInAs }: SignInPage): string {
  const again =
    signedInAs === undefined
      ? html``
      : html`<p>You are signed in as <strong>${signedInAs.name}</strong>. The registry asks you to sign in again before it goes on.</p>`;
  const choices = people.map(
    (person) =>
      html`<li>
        <button class="choice" name="subject" value="${person.subject}">
          <strong>${person.name}</strong><span>${person.label}</span><span class="quiet">${person.email}</span>
        </button>
      </li>`,
  );
  return providerPage(
    'Choose who signs in',
    html`${again}
      <p>One click signs in as that person, without a password.</p>
      <form method="post" action="${interaction}/sign-in">
        <ul class="sheet">
          ${choices}
        </ul>
      </form>
      <form method="post" action="${interaction}/cancel"><button class="plain">Go back without signing in</button></form>`,
  );
}
