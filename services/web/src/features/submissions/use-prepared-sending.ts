/** Sends what the preparing page hands over, table by table, and tells it how far that has come. */
import type { Submission } from '@cairnstep/contract';
import { useState } from 'react';
import { useStayOnPage } from '../../lib/use-stay-on-page.ts';
import type { PreparedTable, ReplacedCodes, Sending } from '../../preparing/messages.ts';
import { announce } from '../../ui/announcer.tsx';
import { faultOf } from './prepared-tables.ts';
import { useReplaceCodes } from './preparing.queries.ts';
import { useSendFile } from './submissions.queries.ts';
import { wordsOfFailure } from './words-of-failure.ts';

export interface PreparedSending {
  readonly sending: Sending | null;
  readonly isUnderWay: boolean;
  /** Codes that were replaced go first: files with the new ones would find nobody under them, and a change of codes ends a check. */
  readonly send: (tables: readonly PreparedTable[], replacedCodes: ReplacedCodes) => Promise<void>;
}

export function usePreparedSending(submission: Submission): PreparedSending {
  const [sending, setSending] = useState<Sending | null>(null);
  const { mutateAsync } = useSendFile(submission.id);
  const { mutateAsync: replace } = useReplaceCodes(submission.site.id);
  const isUnderWay = sending?.state === 'under-way';
  useStayOnPage(isUnderWay);

  async function send(tables: readonly PreparedTable[], replacedCodes: ReplacedCodes): Promise<void> {
    const tell = (state: Sending['state'], done: number, message: string | null = null) =>
      setSending({ kind: 'sending', state, done, of: tables.length, message });
    const fault = tables.map(faultOf).find((found) => found !== null);
    if (fault !== undefined)
      return tell('failed', 0, `${fault} Nothing was sent. Prepare the files again; if it stays so, tell the registry’s office.`);
    tell('under-way', 0);
    let arrived = 0;
    try {
      if (replacedCodes.length > 0) await replace(replacedCodes);
      for (const { table, csv } of tables) {
        const file = new File([csv], `${table}.csv`, { type: 'text/csv' });
        const before = arrived;
        await mutateAsync({ table, file, signal: neverStopped, onSent: (part) => tell('under-way', before + part) });
        arrived += 1;
      }
      tell('done', arrived);
      announce('Everything prepared has arrived.');
    } catch (error) {
      tell('failed', 0, `${wordsOfFailure(error)} ${arrived} of ${tables.length} tables arrived; sending again replaces them.`);
    }
  }

  return { sending, isUnderWay, send };
}

/** Half a month is no use: once begun it is sent whole, or fails. */
const neverStopped = new AbortController().signal;
