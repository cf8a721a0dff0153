/** Lets a person into a page that is for them, and otherwise says what to do. */
import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { Navigate, useLocation } from 'react-router-dom';
import { accountQuery, signInAddress } from '../lib/account.ts';
import { Answer } from '../ui/answer.tsx';
import { NoPermission } from '../ui/no-permission.tsx';
import { Page, Section } from '../ui/page.tsx';
import { LinkButton } from '../ui/button.tsx';
import { admit } from './audience.ts';
import type { Audience } from './pages.tsx';

export function Gate({ audience, children }: { readonly audience: Audience; readonly children: ReactNode }) {
  // A public page does not wait for the account.
  return audience === 'anyone' ? children : <Guarded audience={audience}>{children}</Guarded>;
}

function Guarded({ audience, children }: { readonly audience: Audience; readonly children: ReactNode }) {
  const query = useQuery(accountQuery());
  const { pathname, search } = useLocation();
  if (query.data === undefined) {
    return (
      <Page title="One moment">
        <Section>
          <Answer query={query} waiting="Looking up your account.">
            {() => null}
          </Answer>
        </Section>
      </Page>
    );
  }
  switch (admit(query.data, audience)) {
    case 'admitted':
      return children;
    case 'no-grant':
      return <Navigate to="/whom-to-ask" replace />;
    case 'sign-in-first':
      return (
        <Page
          title="Sign in first"
          lead={<p>This page is for people who work with the registry. After signing in you come back to just this address.</p>}
          actions={
            <LinkButton variant="primary" to={signInAddress(pathname + search)}>
              Go to signing in
            </LinkButton>
          }
        />
      );
    case 'not-for-this-role':
      return (
        <Page title="Not for your role">
          <Section>
            <NoPermission />
          </Section>
        </Page>
      );
  }
}
