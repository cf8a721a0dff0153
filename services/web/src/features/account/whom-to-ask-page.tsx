import { useQuery } from '@tanstack/react-query';
import { Navigate } from 'react-router-dom';
import { accountQuery, signInAddress } from '../../lib/account.ts';
import { Answer } from '../../ui/answer.tsx';
import { Button } from '../../ui/button.tsx';
import { Page, Section } from '../../ui/page.tsx';

/** For someone who is known and may do nothing yet. */
export default function WhomToAskPage() {
  const query = useQuery(accountQuery());
  const account = query.data;
  if (account?.signedIn === false) return <Navigate to={signInAddress('/start')} replace />;
  if (account !== undefined && account.grants.length > 0) return <Navigate to="/start" replace />;
  return (
    <Page title="Nobody has given this account a role yet">
      <Section>
        <Answer query={query} waiting="Looking up your account.">
          {({ name, contact }) => (
            <div className="grid max-w-2xl gap-4">
              <p>
                {name === null ? 'Signing in worked' : `Signing in worked, ${name}`}. The registry knows who you are, but not what your work
                here is, so it shows you nothing more.
              </p>
              <p>
                Ask <strong className="font-semibold">{contact}</strong> for a role, and say which clinic or team you work with. If you were
                invited, open the link in the invitation e-mail.
              </p>
              <p>A role counts from the moment it is given. You need not sign in again.</p>
              <div>
                <Button isPending={query.isFetching} onPress={() => void query.refetch()}>
                  Look again
                </Button>
              </div>
            </div>
          )}
        </Answer>
      </Section>
    </Page>
  );
}
