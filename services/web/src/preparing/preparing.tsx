/** The sheet on which a month is prepared: key, files, columns, preview, sending. Parts appear as they can be worked on. */
import { useEffect, useMemo } from 'react';
import { formatMonth } from '../lib/format.ts';
import { ColumnsSection } from './columns-section.tsx';
import { FilesSection } from './files-section.tsx';
import { KeySection } from './key/key-section.tsx';
import type { Task } from './messages.ts';
import { isUnsaved, worthALook } from './month-state.ts';
import { OverviewSection } from './overview-section.tsx';
import { PreviewSection } from './preview-section.tsx';
import { ReplaceCodesSection } from './replace-codes-section.tsx';
import { SendSection } from './send-section.tsx';
import type { Surroundings } from './surroundings.ts';
import { useMonth } from './use-month.ts';
import type { Workroom } from './worker-client.ts';

export interface PreparingProps {
  readonly workroom: Workroom;
  readonly task: Omit<Task, 'kind'>;
  readonly surroundings: Surroundings | null;
  /** `2026-12-01`, by the browser's clock. */
  readonly today: string;
}

export function Preparing({
  workroom,
  task: { view, site, month: calendarMonth, knownParticipants, safeHeaders },
  surroundings,
  today,
}: PreparingProps) {
  const circumstances = useMemo(
    () => ({
      site: site.code,
      month: calendarMonth,
      knownParticipants: surroundings === null ? null : knownParticipants,
      safeHeaders,
      today,
    }),
    [site.code, calendarMonth, surroundings, knownParticipants, safeHeaders, today],
  );
  const month = useMonth(workroom, circumstances);
  const { picture, prepared, isStale } = month.state;
  useSending(month, surroundings);
  useUnsaved(isUnsaved(month.state), surroundings);
  const lastPart = surroundings === null ? 'Save' : 'Save and send';

  return (
    <>
      <KeySection month={month} site={site.code} held={knownParticipants.length} isWhole={view === 'key'} />
      {view === 'key' && picture?.key != null && <ReplaceCodesSection month={month} keyPicture={picture.key} surroundings={surroundings} />}
      {view === 'prepare' && calendarMonth !== null && (
        <>
          <FilesSection month={month} monthName={formatMonth(calendarMonth)} />
          {prepared !== null && (
            <>
              <OverviewSection
                prepared={prepared}
                monthName={formatMonth(calendarMonth)}
                lastPart={lastPart}
                toLookAt={worthALook(prepared, picture?.key ?? null).length}
              />
              <ColumnsSection month={month} prepared={prepared} />
              <PreviewSection
                prepared={prepared}
                isStale={isStale}
                monthName={formatMonth(calendarMonth)}
                knowsTheRegistry={surroundings !== null}
              />
              <SendSection
                title={lastPart}
                month={month}
                prepared={prepared}
                site={site.code}
                calendarMonth={calendarMonth}
                surroundings={surroundings}
              />
            </>
          )}
        </>
      )}
    </>
  );
}

/** What the page around says of the sending; once it is done, the registry knows of the replaced codes too. */
function useSending({ sendingIs, codesReplaced }: ReturnType<typeof useMonth>, surroundings: Surroundings | null): void {
  useEffect(
    () =>
      surroundings?.listen((message) => {
        if (message.kind !== 'sending') return;
        sendingIs(message);
        if (message.state === 'done') void codesReplaced();
      }),
    [sendingIs, codesReplaced, surroundings],
  );
}

/** Closing the page is asked about by whoever holds it: the page around, or the browser. */
function useUnsaved(isUnsavedNow: boolean, surroundings: Surroundings | null): void {
  useEffect(() => {
    if (surroundings !== null) {
      surroundings.tell({ kind: 'unsaved', isUnsaved: isUnsavedNow });
      return;
    }
    if (!isUnsavedNow) return;
    const ask = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener('beforeunload', ask);
    return () => window.removeEventListener('beforeunload', ask);
  }, [isUnsavedNow, surroundings]);
}
