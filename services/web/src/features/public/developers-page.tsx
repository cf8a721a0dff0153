import { useQuery } from '@tanstack/react-query';
import { Answer } from '../../ui/answer.tsx';
import { Page, Section } from '../../ui/page.tsx';
import { Table } from '../../ui/table.tsx';
import { openApiQuery } from './open-api.queries.ts';
import type { Operation } from './open-api.queries.ts';

export default function DevelopersPage() {
  const description = useQuery(openApiQuery());
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
          <li>The session of a signed-in person, except for the public figures. What the person may do is decided at every request.</li>
          <li>
            For changes, the header <code>X-Cairnstep-Request: 1</code>. Requests without it are refused.
          </li>
          <li>
            Refusals come as <code>application/problem+json</code> (RFC 9457). Branch on <code>type</code>, place messages by{' '}
            <code>errors[].pointer</code>, show <code>title</code> and <code>detail</code>.
          </li>
          <li>Instants are UTC in ISO 8601; calendar days are ISO dates; a missing number is null, never 0.</li>
        </ul>
      </Section>
      <Section title="Addresses" id="addresses">
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

const columns = [
  { key: 'summary', header: 'What it does', value: ({ summary }: Operation) => summary, isRowHeader: true },
  { key: 'method', header: 'Method', value: ({ method }: Operation) => method },
  {
    key: 'path',
    header: 'Address',
    value: ({ path }: Operation) => path,
    cell: ({ path }: Operation) => <code className="wrap-anywhere">{path}</code>,
  },
];
