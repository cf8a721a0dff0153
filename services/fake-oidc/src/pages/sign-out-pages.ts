import { Html, html } from './html.ts';
import { providerPage } from './provider-page.ts';

/** The provider's form carries its own secret; these buttons belong to it by its id. */
const formId = 'op.logoutForm';

/** Asks whether the sign-in here should end too. `form` is the provider's own hidden form. */
export function signOutPage(form: string): string {
  return providerPage(
    'Sign out here too?',
    html`${new Html(form)}
      <p>The registry has ended your sign-in there. Signing out here as well means the next sign-in asks who you are.</p>
      <p class="row">
        <button class="act" type="submit" form="${formId}" name="logout" value="yes">Sign out</button>
        <button class="plain" type="submit" form="${formId}">Stay signed in here</button>
      </p>`,
  );
}

/** For somebody who is not signed in here: nothing to ask, only to go back. */
export function nothingToSignOutPage(action: string, secret: string): string {
  return providerPage(
    'You are not signed in here',
    html`<form method="post" action="${action}">
      <input type="hidden" name="xsrf" value="${secret}" /><input type="hidden" name="logout" value="yes" />
      <p><button class="act">Go on</button></p>
    </form>`,
  );
}

export function signedOutPage(): string {
  return providerPage('Signed out', html`<p>Your sign-in here has ended. You can close this page.</p>`);
}
