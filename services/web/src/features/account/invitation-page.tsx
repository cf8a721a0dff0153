import type { getInvitation, ResponseOf } from '@cairnstep/contract';
import { useQuery } from '@tanstack/react-query';
import { useNavigate, useParams } from 'react-router-dom';
import { accountQuery } from '../../lib/account.ts';
import { formatInstant } from '../../lib/format.ts';
import { roleWithin } from '../../lib/role-names.ts';
import { announce } from '../../ui/announcer.tsx';
import { Answer } from '../../ui/answer.tsx';
import { AddressButton, Button } from '../../ui/button.tsx';
import { ErrorNotice } from '../../ui/error-notice.tsx';
import { Notice } from '../../ui/notice.tsx';
import { Page, Section } from '../../ui/page.tsx';
import { invitationQuery, isToken, useAcceptInvitation } from './account.queries.ts';
import { providerAddress } from './return-address.ts';

/** Where an invitation e-mail leads: what is offered, then signing in, then taking it. */
export default function InvitationPage() {
  const { token = '' } = useParams();
  const invitation = useQuery(invitationQuery(token));
  return (
    <Page
      title="Invitation"
      lead={<p>Someone who runs the registry asked you to work with it.</p>}
      note={<p>The invitation binds the role to the account you sign in with. It can be used once.</p>}
    >
      <Section>
        {isToken(token) ? (
          <Answer query={invitation} waiting="Looking up the invitation.">
            {(offered) => <Offer token={token} offered={offered} />}
          </Answer>
        ) : (
          <Notice kind="error" title="This link is not complete.">
            <p>
              Nothing was changed. Mail programs sometimes break long links: copy the whole address from the e-mail into the address bar.
            </p>
          </Notice>
        )}
      </Section>
    </Page>
  );
}

function Offer({ token, offered }: { readonly token: string; readonly offered: ResponseOf<typeof getInvitation> }) {
  const account = useQuery(accountQuery());
  const accept = useAcceptInvitation(token);
  const navigate = useNavigate();
  const role = roleWithin(offered.role, offered.site);
  return (
    <div className="grid max-w-2xl gap-4">
      <p>
        You are invited as <strong className="font-semibold">{role}</strong>. The invitation can be used until{' '}
        {formatInstant(offered.expiresAt)}.
      </p>
      <Answer query={account} waiting="Looking up your account.">
        {({ signedIn, name }) =>
          signedIn ? (
            <>
              <p>{name === null ? 'You are signed in.' : `You are signed in as ${name}.`} If that is not you, sign out first.</p>
              {accept.isError && <ErrorNotice error={accept.error} />}
              <div>
                <Button
                  variant="primary"
                  isPending={accept.isPending}
                  onPress={() =>
                    accept.mutate(undefined, {
                      onSuccess: () => {
                        announce(`You now work here as ${role}.`);
                        void navigate('/start');
                      },
                    })
                  }
                >
                  Take this role
                </Button>
              </div>
            </>
          ) : (
            <>
              <p>Sign in with your organisation’s account first. You come back to this page.</p>
              <div>
                <AddressButton variant="primary" href={providerAddress(`/invitation/${token}`)}>
                  Sign in with your organisation
                </AddressButton>
              </div>
            </>
          )
        }
      </Answer>
    </div>
  );
}
