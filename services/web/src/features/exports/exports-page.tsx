import type { DataExport } from '@cairnstep/contract';
import { useQuery } from '@tanstack/react-query';
import { useEffect, useRef } from 'react';
import { announce } from '../../ui/announcer.tsx';
import { Answer } from '../../ui/answer.tsx';
import { EmptyState } from '../../ui/empty-state.tsx';
import { Page, Section } from '../../ui/page.tsx';
import { TextLink } from '../../ui/text-link.tsx';
import { ExportEntry } from './export-entry.tsx';
import { exportsQuery } from './exports.queries.ts';

export default function ExportsPage() {
  const query = useQuery(exportsQuery());
  useFinished(query.data?.exports);
  return (
    <Page
      title="Exports"
      lead={<p>Rows of approved requests, each as one zip file with CSV files, a codebook and a list of checksums.</p>}
      note={
        <>
          <p>
            Re-identification of participants is forbidden. Keep the files where your request says, pass them to nobody, and destroy every
            copy when access ends.
          </p>
          <p>People have new codes in each export: two exports cannot be joined.</p>
        </>
      }
    >
      <Section
        note={
          <p>
            The SHA-256 checksum tells whether the file you have is the file that was built. Most systems show it with{' '}
            <code>sha256sum</code> or <code>Get-FileHash</code>.
          </p>
        }
      >
        <Answer query={query} waiting="Reading your exports.">
          {({ exports }) =>
            exports.length === 0 ? (
              <EmptyState action={<TextLink to="/requests">See your requests</TextLink>}>
                No export has been built yet. Open an approved request and build its export there.
              </EmptyState>
            ) : (
              <ul className="-my-6 divide-y divide-hairline">
                {exports.map((one) => (
                  <ExportEntry key={one.id} built={one} />
                ))}
              </ul>
            )
          }
        </Answer>
      </Section>
    </Page>
  );
}

/** Tells of a build that ended while the page was open. */
function useFinished(exports: readonly DataExport[] | undefined): void {
  const building = useRef<ReadonlySet<string>>(new Set());
  useEffect(() => {
    if (exports === undefined) return;
    for (const { id, number, status } of exports) {
      if (status === 'building' || !building.current.has(id)) continue;
      announce(status === 'ready' ? `Export ${number} is ready to download.` : `Building export ${number} failed.`);
    }
    building.current = new Set(exports.filter(({ status }) => status === 'building').map(({ id }) => id));
  }, [exports]);
}
