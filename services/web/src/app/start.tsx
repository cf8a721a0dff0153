/** Where signing in leads by default: on to the page this person's work begins with. */
import { useQuery } from '@tanstack/react-query';
import { Navigate } from 'react-router-dom';
import { accountQuery } from '../lib/account.ts';
import { Answer } from '../ui/answer.tsx';
import { Page, Section } from '../ui/page.tsx';
import { startFor } from './audience.ts';

export function Start() {
  const query = useQuery(accountQuery());
  if (query.data !== undefined) return <Navigate to={startFor(query.data)} replace />;
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
