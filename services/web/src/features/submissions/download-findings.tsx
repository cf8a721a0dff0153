/** All findings as one CSV file, to be worked off beside the files. */
import type { Submission } from '@cairnstep/contract';
import { useQueryClient } from '@tanstack/react-query';
import type { QueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { toCsv } from '../../lib/csv.ts';
import { formatCount, formatNumber } from '../../lib/format.ts';
import { saveFile } from '../../lib/save-file.ts';
import { announce } from '../../ui/announcer.tsx';
import { Button } from '../../ui/button.tsx';
import { ErrorNotice } from '../../ui/error-notice.tsx';
import { placeColumns } from './finding-places.tsx';
import type { Place } from './finding-places.tsx';
import { findingsQuery } from './submissions.queries.ts';

/** A wrong unit in a whole column gives as many findings as rows; nobody mends more than this one by one. */
const mostFindings = 5_000;

export function DownloadFindings({ submission, name }: { readonly submission: Submission; readonly name: string }) {
  const cache = useQueryClient();
  const [fetched, setFetched] = useState<number | null>(null);
  const [failure, setFailure] = useState<unknown>(null);
  const total = submission.findings.reduce((sum, { count }) => sum + count, 0);

  async function download(): Promise<void> {
    setFailure(null);
    setFetched(0);
    try {
      const places = await everyPlace(cache, submission.id, setFetched);
      saveFile(`${name}.csv`, asCsv(places), 'text/csv;charset=utf-8');
      announce(`Saved ${formatCount(places.length, 'finding')}.`);
    } catch (error) {
      setFailure(error);
    } finally {
      setFetched(null);
    }
  }

  return (
    <div className="grid justify-items-start gap-2">
      <Button isPending={fetched !== null} onPress={() => void download()}>
        Download the findings as CSV
      </Button>
      {fetched !== null && fetched > 0 && <p className="numbers text-small text-quiet">{formatNumber(fetched)} fetched</p>}
      {total > mostFindings && (
        <p className="text-small text-quiet">
          The first {formatNumber(mostFindings)} of {formatCount(total, 'finding')}.
        </p>
      )}
      {failure !== null && <ErrorNotice error={failure} />}
    </div>
  );
}

async function everyPlace(cache: QueryClient, submissionId: string, onFetched: (count: number) => void): Promise<readonly Place[]> {
  const places: Place[] = [];
  for (let page = 1; places.length < mostFindings; page += 1) {
    const { items, total } = await cache.fetchQuery(findingsQuery(submissionId, {}, page));
    places.push(...items);
    onFetched(places.length);
    if (items.length === 0 || places.length >= total) break;
  }
  return places;
}

function asCsv(places: readonly Place[]): string {
  const columns = [...placeColumns, { header: 'Kind', value: ({ severity }: Place) => severity }];
  return toCsv([columns.map(({ header }) => header), ...places.map((place) => columns.map(({ value }) => value(place)))]);
}
