/** Everyone with an account and every invitation. Administrators change, stewards look. */
import { useQuery } from '@tanstack/react-query';
import { hasRole, useAccount } from '../../lib/account.ts';
import { useAddressParam } from '../../lib/address-state.ts';
import { formatInstant } from '../../lib/format.ts';
import { roleWithin } from '../../lib/role-names.ts';
import { foldText, wordMatcher } from '../../lib/word-match.ts';
import { Answer } from '../../ui/answer.tsx';
import { Page, Section } from '../../ui/page.tsx';
import { Table } from '../../ui/table.tsx';
import type { Column } from '../../ui/table.tsx';
import { TextField } from '../../ui/text-field.tsx';
import { TextLink } from '../../ui/text-link.tsx';
import { Invitations } from './invitations.tsx';
import { InviteForm } from './invite-form.tsx';
import { peopleQuery } from './people.queries.ts';
import type { Person } from './people.queries.ts';

export default function PeoplePage() {
  const account = useAccount();
  const query = useQuery(peopleQuery());
  const isAdministrator = hasRole(account, 'administrator');
  return (
    <Page
      title="People"
      lead={<p>Who may do what in the registry, and who has been asked to join.</p>}
      note={
        <>
          <p>
            {isAdministrator
              ? 'A change counts from the person’s next request on. Accounts are never deleted, only disabled.'
              : 'You can look. Administrators invite people and give roles.'}
          </p>
          <p>
            Programs of clinics that submit by themselves: <TextLink to="/site-systems">site systems</TextLink>
          </p>
        </>
      }
    >
      <Section title="Accounts" id="accounts" wide>
        <Answer query={query} waiting="Reading the people.">
          {({ people }) => <Accounts people={people} />}
        </Answer>
      </Section>
      {isAdministrator && (
        <Section
          title="Invite someone"
          id="invite"
          note={
            <>
              <p>The e-mail holds a link for one use within seven days. Whoever signs in through it gets the role.</p>
              <p>To give another role to someone who has an account, open their name above.</p>
            </>
          }
        >
          <InviteForm />
        </Section>
      )}
      <Section title="Invitations" id="invitations" wide>
        <Answer query={query} waiting="Reading the invitations.">
          {({ invitations }) => <Invitations invitations={invitations} mayRevoke={isAdministrator} />}
        </Answer>
      </Section>
    </Page>
  );
}

function Accounts({ people }: { readonly people: readonly Person[] }) {
  const [words, setWords] = useAddressParam('search');
  const isFound = wordMatcher(words ?? '');
  const found = people.filter((person) => isFound(textOf(person)));
  return (
    <div className="grid gap-4">
      <TextField
        id="search"
        label="Search"
        hint="Beginnings of words of the name, e-mail, institution, role or site."
        value={words ?? ''}
        onChange={(value) => setWords(value)}
      />
      <Table
        id="people"
        caption={`${found.length} of ${people.length} accounts`}
        columns={columns}
        rows={found}
        rowKey={({ id }) => id}
        empty="Nobody fits these words. Empty the search to see everyone."
        fileName="people"
      />
    </div>
  );
}

const rolesOf = ({ grants }: Person): readonly string[] => grants.map(({ role, site }) => roleWithin(role, site));

const textOf = (person: Person): string =>
  foldText([person.name, person.email ?? '', person.institution ?? '', ...rolesOf(person)].join(' '));

const columns: readonly Column<Person>[] = [
  {
    key: 'name',
    header: 'Name',
    value: ({ name }) => name,
    cell: ({ id, name }) => <TextLink to={`/people/${id}`}>{name}</TextLink>,
    isRowHeader: true,
  },
  {
    key: 'roles',
    header: 'Roles',
    value: (person) => rolesOf(person).join('; '),
    cell: (person) => <Roles person={person} />,
  },
  { key: 'institution', header: 'Institution', value: ({ institution }) => institution },
  { key: 'email', header: 'E-mail', value: ({ email }) => email },
  {
    key: 'status',
    header: 'Account',
    value: ({ status }) => status,
    cell: ({ status }) => <span className={status === 'disabled' ? 'font-semibold text-oxide' : ''}>{status}</span>,
  },
  {
    key: 'seen',
    header: 'Last signed in',
    value: ({ lastSignInAt }) => lastSignInAt,
    cell: ({ lastSignInAt }) => (lastSignInAt === null ? <span className="text-quiet">never</span> : formatInstant(lastSignInAt)),
  },
];

function Roles({ person: { grants } }: { readonly person: Person }) {
  if (grants.length === 0) return <span className="text-quiet">no role</span>;
  return (
    <ul>
      {grants.map(({ id, role, site }) => (
        <li key={id}>{roleWithin(role, site)}</li>
      ))}
    </ul>
  );
}
