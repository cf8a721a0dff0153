/** The systems that submit for their sites without a person. Administrators register and disable them, stewards look. */
import { useQuery } from '@tanstack/react-query';
import { hasRole, useAccount } from '../../lib/account.ts';
import { Answer } from '../../ui/answer.tsx';
import { Facts } from '../../ui/facts.tsx';
import { Page, Section } from '../../ui/page.tsx';
import { TextLink } from '../../ui/text-link.tsx';
import { AddSystemForm } from './add-system-form.tsx';
import { systemsQuery } from './site-systems.queries.ts';
import { SystemList } from './system-list.tsx';

export default function SiteSystemsPage() {
  const query = useQuery(systemsQuery());
  const isAdministrator = hasRole(useAccount(), 'administrator');
  return (
    <Page
      title="Site systems"
      kicker={<TextLink to="/people">People</TextLink>}
      lead={<p>A clinic’s own system can submit the clinic’s months by itself. It reaches that one site and nothing else.</p>}
      note={
        <p>
          How such a system asks: <TextLink to="/developers#site-system">Interface for programs</TextLink>
        </p>
      }
    >
      <Section title="Registered systems" id="systems" wide>
        <Answer query={query} waiting="Reading the systems.">
          {({ systems }) => <SystemList systems={systems} mayChange={isAdministrator} />}
        </Answer>
      </Section>
      {isAdministrator && (
        <Section
          title="Register a system"
          id="register"
          note={
            <>
              <p>
                First whoever runs the identity provider makes a client for the system there. Its secret goes to the clinic, never here.
              </p>
              <p>A client id belongs to one site for good. A system is disabled, never deleted: what it submitted stays under its name.</p>
            </>
          }
        >
          <AddSystemForm />
        </Section>
      )}
      <Section title="What its tokens must say" id="tokens" note={<p>Set up once at the identity provider, for each client.</p>}>
        <Answer query={query} waiting="Reading what tokens must say.">
          {({ tokens: { issuer, audience, scope } }) => (
            <Facts
              facts={[
                { term: 'Issuer', value: <code>{issuer}</code> },
                { term: 'Audience', value: <code>{audience}</code> },
                { term: 'Scope', value: <code>{scope}</code> },
                {
                  term: 'Kind',
                  value: 'JWT access tokens (RFC 9068) of the client credentials grant; subject and client_id are the client id',
                },
                { term: 'Lifetime', value: 'at most one day' },
              ]}
            />
          )}
        </Answer>
      </Section>
    </Page>
  );
}
