/** One person: roles and account. Nobody changes their own. */
import { useQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import { hasRole, useAccount } from '../../lib/account.ts';
import { formatInstant } from '../../lib/format.ts';
import { Answer } from '../../ui/answer.tsx';
import { LinkButton } from '../../ui/button.tsx';
import { EmptyState } from '../../ui/empty-state.tsx';
import { Notice } from '../../ui/notice.tsx';
import { Page, Section } from '../../ui/page.tsx';
import { TextLink } from '../../ui/text-link.tsx';
import { AccountStatus } from './account-status.tsx';
import { GrantForm } from './grant-form.tsx';
import { Grants } from './grants.tsx';
import { isOneself } from './oneself.ts';
import { peopleQuery } from './people.queries.ts';
import type { Person } from './people.queries.ts';

export default function PersonPage() {
  const { personId } = useParams();
  const query = useQuery(peopleQuery());
  const person = query.data?.people.find(({ id }) => id === personId);
  if (person === undefined) {
    return (
      <Page title="Person">
        <Section>
          <Answer query={query} waiting="Reading the person’s roles.">
            {() => (
              <EmptyState action={<LinkButton to="/people">Go to the list of people</LinkButton>}>Nobody has this address.</EmptyState>
            )}
          </Answer>
        </Section>
      </Page>
    );
  }
  return <OnePerson key={person.id} person={person} />;
}

function OnePerson({ person }: { readonly person: Person }) {
  const account = useAccount();
  const own = isOneself(person, account);
  const mayChange = hasRole(account, 'administrator') && !own;
  return (
    <Page
      title={person.name}
      kicker={<TextLink to="/people">People</TextLink>}
      lead={<p>{person.institution ?? 'Without an institution'}</p>}
      note={
        <>
          {person.email !== null && <p>{person.email}</p>}
          <p>{person.lastSignInAt === null ? 'Has never signed in.' : `Last signed in on ${formatInstant(person.lastSignInAt)}.`}</p>
          <p>Name, e-mail and institution come from the organisation that signs the person in.</p>
        </>
      }
    >
      {own && (
        <Section>
          <Notice title="This is your own account.">
            <p>Nobody can change their own roles or account. Ask another administrator.</p>
          </Notice>
        </Section>
      )}
      <Section
        title="Roles"
        id="roles"
        note={<p>A role counts from its first day to its last. Ending it works from the person’s next request on.</p>}
      >
        <Grants person={person} mayChange={mayChange} />
      </Section>
      {mayChange && (
        <Section title="Give another role" id="give">
          <GrantForm person={person} />
        </Section>
      )}
      <Section
        title="Account"
        id="account"
        note={<p>A disabled account cannot sign in. What it did stays in the audit log under its name.</p>}
      >
        <AccountStatus person={person} mayChange={mayChange} />
      </Section>
    </Page>
  );
}
