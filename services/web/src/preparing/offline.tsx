/** The edition opened from disk: asks for site and month itself, and says what it is. */
import { useState } from 'react';
import { formatMonth } from '../lib/format.ts';
import { Announcer } from '../ui/announcer.tsx';
import { Mark } from '../ui/mark.tsx';
import { Page, Section } from '../ui/page.tsx';
import { Arrival } from './arrival.tsx';
import { Preparing } from './preparing.tsx';
import { StartForm } from './start-form.tsx';
import type { Workroom } from './worker-client.ts';

export interface OfflineProps {
  readonly workroom: Workroom;
  readonly today: string;
}

const nothing: readonly string[] = [];

export function Offline({ workroom, today }: OfflineProps) {
  const [chosen, setChosen] = useState<{ readonly site: string; readonly month: string } | null>(null);
  return (
    <div className="mx-auto flex min-h-dvh max-w-[1200px] flex-col">
      <header className="flex items-center gap-3 px-4 py-4 md:px-8">
        <Mark size={36} />
        <span className="text-section leading-none font-bold tracking-tight">Cairnstep</span>
      </header>
      <main className="sheet flex-1 border-y border-hairline bg-sheet lg:border-x">
        <Page
          title={chosen === null ? 'Prepare a month' : `Prepare ${formatMonth(chosen.month)} of ${chosen.site}`}
          lead={<p>Record numbers become codes, dates become study days, and everything else that tells who somebody is stays behind.</p>}
          note={
            <p>
              This page works without a connection and sends nothing. It saves cleaned files, which you send on the month’s page of the
              registry.
            </p>
          }
        />
        {chosen === null ? (
          <Section title="Site and month">
            <StartForm onStart={(site, month) => setChosen({ site, month })} />
          </Section>
        ) : (
          <>
            <Arrival label="Next: the key of the site." />
            <Preparing
              workroom={workroom}
              task={{
                view: 'prepare',
                site: { code: chosen.site, name: chosen.site },
                month: chosen.month,
                knownParticipants: nothing,
                safeHeaders: nothing,
                theme: 'system',
              }}
              surroundings={null}
              today={today}
            />
          </>
        )}
      </main>
      <Announcer />
    </div>
  );
}
