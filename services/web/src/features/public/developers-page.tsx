import { useQuery } from '@tanstack/react-query';
import { useAccount } from '../../lib/account.ts';
import { saveFile } from '../../lib/save-file.ts';
import { Answer } from '../../ui/answer.tsx';
import { Button } from '../../ui/button.tsx';
import { Notice } from '../../ui/notice.tsx';
import { Page, Section } from '../../ui/page.tsx';
import { Table } from '../../ui/table.tsx';
import { TextLink } from '../../ui/text-link.tsx';
import { openApiQuery } from './open-api.queries.ts';
import type { Operation } from './open-api.queries.ts';
import { submitMonthScript } from './submit-month.ts';

export default function DevelopersPage() {
  const description = useQuery(openApiQuery());
  const isDemonstration = useAccount()?.demonstration === true;
  return (
    <Page
      title="Interface for programs"
      lead={<p>Everything these pages do, a program can do through the same addresses, with the same permissions.</p>}
      note={
        <p>
          The full description, with every field, is an OpenAPI document: <a href="/api/openapi.json">/api/openapi.json</a>
        </p>
      }
    >
      <Section title="What every request needs" id="rules">
        <ul className="grid max-w-2xl list-disc gap-2 pl-5">
          <li>
            The session of a signed-in person or the access token of a site’s system, except for the public figures. What either may do is
            decided at every request.
          </li>
          <li>
            For changes by a person’s session, the header <code>X-Cairnstep-Request: 1</code>. Requests without it are refused. Requests
            with an access token need none.
          </li>
          <li>
            Refusals come as <code>application/problem+json</code> (RFC 9457). Branch on <code>type</code>, place messages by{' '}
            <code>errors[].pointer</code>, show <code>title</code> and <code>detail</code>.
          </li>
          <li>Instants are UTC in ISO 8601; calendar days are ISO dates; a missing number is null, never 0.</li>
        </ul>
      </Section>
      <Section
        title="A clinic’s own system"
        id="site-system"
        note={
          <>
            <p>
              OAuth 2.0 client credentials (RFC 6749, section 4.4), bearer tokens (RFC 6750), JWT access tokens (RFC 9068). Discovery of the
              provider’s addresses: OpenID Connect.
            </p>
            <p>The example below is the file that the registry’s own tests run.</p>
            <p>
              It sends just the files of its folder, and commits only what somebody has looked at: it stops at errors, at a rule that warns
              without a reason of its own, and at rows that would be removed.
            </p>
          </>
        }
      >
        <div className="grid grid-cols-1 gap-4">
          <p className="max-w-2xl">
            A training record system can submit the months of its clinic without a person. It gets a client id and a secret from the
            organisation that runs the sign-in, and an administrator of the registry binds the client id to the one site it may submit for.
            It reaches that site’s submissions and nothing else: no other site, no participants’ pages, no figures, no people.
          </p>
          <ul className="grid max-w-2xl list-disc gap-2 pl-5">
            <li>
              Token: grant <code>client_credentials</code>, scope <code>submissions</code>, audience this registry’s address followed by{' '}
              <code>/api</code>. It counts for at most one day; ask for a fresh one when it is refused with 401.
            </li>
            <li>
              Send it as <code>Authorization: Bearer …</code>, without cookies. A request with both is refused.
            </li>
            <li>
              Files leave the clinic de-identified, as from the preparing page. The registry screens them again and refuses what identifies.
            </li>
            <li>
              The same rules as for people: a preview, a reason for each rule that warns, a commit bound to the preview, a receipt. A month
              without anything:{' '}
              <code className="wrap-anywhere">POST /api/sites/&#123;siteId&#125;/months/&#123;month&#125;/nothing-to-report</code>.
            </li>
          </ul>
          {isDemonstration && (
            <Notice title="In this demonstration">
              <p>
                One such system is registered, for the first site; administrators and stewards find its client id under{' '}
                <TextLink to="/site-systems">site systems</TextLink>. Its secret was drawn at the first start: <code>siteSystemSecret</code>{' '}
                in <code>secrets.json</code> of the data folder.
              </p>
            </Notice>
          )}
          <h3 className="font-semibold">A whole month with curl</h3>
          <pre
            tabIndex={0}
            aria-label="Script that submits a month"
            className="overflow-x-auto border border-hairline bg-paper p-4 font-mono text-small whitespace-pre"
          >
            {submitMonthScript}
          </pre>
          <div>
            <Button onPress={() => saveFile('submit-month.sh', submitMonthScript, 'application/x-sh')}>Download the script</Button>
          </div>
        </div>
      </Section>
      <Section title="Addresses" id="addresses" wide>
        <Answer query={description} waiting="Reading the description of the interface.">
          {({ operations }) => (
            <Table
              id="operations"
              caption="What can be asked, and where"
              columns={columns}
              rows={operations}
              rowKey={({ method, path }) => `${method} ${path}`}
              empty="The description lists no address. Load the page again in a minute."
              fileName="cairnstep-addresses"
            />
          )}
        </Answer>
      </Section>
    </Page>
  );
}

const callerWords: Readonly<Record<Operation['callers'], string>> = {
  anyone: 'anyone',
  people: 'people',
  'people and systems': 'people, sites’ systems',
};

const columns = [
  { key: 'summary', header: 'What it does', value: ({ summary }: Operation) => summary, isRowHeader: true },
  {
    key: 'callers',
    header: 'Who asks',
    value: ({ callers }: Operation) => callerWords[callers],
  },
  { key: 'method', header: 'Method', value: ({ method }: Operation) => method },
  {
    key: 'path',
    header: 'Address',
    value: ({ path }: Operation) => path,
    cell: ({ path }: Operation) => <code className="wrap-anywhere">{path}</code>,
  },
];
