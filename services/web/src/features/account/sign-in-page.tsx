import { useSearchParams } from 'react-router-dom';
import { useAccount } from '../../lib/account.ts';
import { AddressButton, LinkButton } from '../../ui/button.tsx';
import { Page, Section } from '../../ui/page.tsx';
import { ownAddress, providerAddress } from './return-address.ts';

/** Says what signing in does, then leaves for the organisation's own service. When it does not work, the API shows a page of its own that needs no script. */
export default function SignInPage() {
  const [search] = useSearchParams();
  const account = useAccount();
  const returnTo = ownAddress(search.get('returnTo'));
  if (account?.signedIn === true) {
    return (
      <Page
        title="You are signed in"
        lead={<p>{account.name === null ? 'You can go on.' : `You are signed in as ${account.name}.`}</p>}
        actions={
          <LinkButton variant="primary" to={returnTo}>
            Go on
          </LinkButton>
        }
      />
    );
  }
  return (
    <Page
      title="Sign in"
      lead={<p>You sign in with your organisation’s own account. The registry never sees your password.</p>}
      note={<p>The sign-in service says who you are. What you may do here was decided by the registry’s administrators.</p>}
      actions={
        <AddressButton variant="primary" href={providerAddress(returnTo)}>
          Sign in with your organisation
        </AddressButton>
      }
    >
      <Section title="First time here?" id="first-time">
        <p className="max-w-2xl">
          Roles are given by invitation. Open the link in the invitation e-mail first; it brings you through signing in and gives you your
          role.
        </p>
      </Section>
    </Page>
  );
}
