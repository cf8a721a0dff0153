/** What the pages of a month ask and tell the registry. Every change answers with the submission as it then is. */
import {
  acknowledgeFindings,
  checkSubmission,
  closeMonth,
  commitSubmission,
  discardSubmission,
  getReceipt,
  getSubmission,
  listChanges,
  listFindings,
  listMonths,
  listSubmissions,
  mendCells,
  openSubmission,
  putSubmissionFile,
  putSubmissionWorkbook,
  removeSubmissionFile,
  removeSubmissionWorkbook,
} from '@cairnstep/contract';
import type { CallOf, Submission } from '@cairnstep/contract';
import type { TableKey } from '@cairnstep/dictionary';
import { keepPreviousData, queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { QueryClient } from '@tanstack/react-query';
import { call } from '../../lib/call.ts';

export type { TableKey };

const everything = ['submissions'];
const keyOf = (submissionId: string) => [...everything, 'one', submissionId];

export const monthsQuery = (siteId: string) =>
  queryOptions({
    queryKey: [...everything, 'months', siteId],
    queryFn: ({ signal }) => call(listMonths, { siteId }, { signal }),
    // A check that ends changes a month without an act of this browser.
    staleTime: 0,
  });

export const submissionsQuery = (siteId: string, page: number) =>
  queryOptions({
    queryKey: [...everything, 'list', siteId, page],
    queryFn: ({ signal }) => call(listSubmissions, { siteId, page }, { signal }),
    placeholderData: keepPreviousData,
  });

const whileChecking = 1_000;

/** Asked again and again while the files are being checked. */
export const submissionQuery = (submissionId: string) =>
  queryOptions({
    queryKey: keyOf(submissionId),
    queryFn: ({ signal }) => call(getSubmission, { submissionId }, { signal }),
    refetchInterval: ({ state }) => (state.data?.status === 'checking' ? whileChecking : false),
  });

export type FindingFilter = Omit<CallOf<typeof listFindings>, 'submissionId' | 'page'>;

/** Findings and changes belong to one check: a later one replaces them, so they are asked for whenever they are shown. */
export const findingsQuery = (submissionId: string, filter: FindingFilter, page: number) =>
  queryOptions({
    queryKey: [...keyOf(submissionId), 'findings', filter, page],
    queryFn: ({ signal }) => call(listFindings, { submissionId, ...filter, page }, { signal }),
    placeholderData: keepPreviousData,
    staleTime: 0,
  });

export const changesQuery = (submissionId: string, table: TableKey, kind: ChangeKind, page: number) =>
  queryOptions({
    queryKey: [...keyOf(submissionId), 'changes', table, kind, page],
    queryFn: ({ signal }) => call(listChanges, { submissionId, table, kind, page }, { signal }),
    staleTime: 0,
  });
export type ChangeKind = CallOf<typeof listChanges>['kind'];

export const receiptQuery = (submissionId: string) =>
  queryOptions({
    queryKey: [...everything, 'receipt', submissionId],
    queryFn: ({ signal }) => call(getReceipt, { submissionId }, { signal }),
    staleTime: Infinity,
  });

/** Keeps the submission as it now is; lists that tell of it are asked anew when they are next shown. */
function keep(cache: QueryClient, submission: Submission): void {
  cache.setQueryData(submissionQuery(submission.id).queryKey, submission);
  void cache.invalidateQueries({ queryKey: [...everything, 'months'] });
  void cache.invalidateQueries({ queryKey: [...everything, 'list'] });
}

function useChange<Input>(change: (input: Input) => Promise<Submission>) {
  const cache = useQueryClient();
  return useMutation({ mutationFn: change, onSuccess: (submission) => keep(cache, submission) });
}

export const useOpenSubmission = () => useChange((month: CallOf<typeof openSubmission>) => call(openSubmission, month));

export function useCloseMonth(siteId: string) {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (month: string) => call(closeMonth, { siteId, month }),
    onSuccess: (closed) =>
      cache.setQueryData(
        monthsQuery(siteId).queryKey,
        (before) => before && { ...before, months: before.months.map((one) => (one.month === closed.month ? closed : one)) },
      ),
  });
}

/** A CSV file is of one table, the workbook of several. */
export type FileKey = TableKey | 'workbook';

/** A file that the registry has. */
export type SentFile = Submission['files'][number];

export const useRemoveFile = (submissionId: string) =>
  useChange((file: FileKey) =>
    file === 'workbook' ? call(removeSubmissionWorkbook, { submissionId }) : call(removeSubmissionFile, { submissionId, table: file }),
  );

export const useCheck = (submissionId: string) => useChange((_: void) => call(checkSubmission, { submissionId }));

export const useAcknowledge = (submissionId: string) =>
  useChange(({ rule, reason }: { readonly rule: string; readonly reason: string }) =>
    call(acknowledgeFindings, { submissionId, rule, reason }),
  );

/** Far below what the registry takes in one request, however long the values. */
const mendsAtATime = 500;

/** Puts values in place of cells and has the files checked again. */
export function useMendAndCheck(submissionId: string) {
  const cache = useQueryClient();
  return useChange(async (mends: readonly CallOf<typeof mendCells>['mends'][number][]) => {
    let mended: Submission | null = null;
    for (let from = 0; from < mends.length; from += mendsAtATime)
      mended = await call(mendCells, { submissionId, mends: mends.slice(from, from + mendsAtATime) });
    try {
      return await call(checkSubmission, { submissionId });
    } catch (error) {
      if (mended !== null) keep(cache, mended);
      throw error;
    }
  });
}

export const useDiscard = (submissionId: string) => useChange((_: void) => call(discardSubmission, { submissionId }));

export interface FileToSend {
  readonly table: FileKey;
  readonly file: File;
  readonly signal: AbortSignal;
  readonly onSent: (part: number) => void;
}

export const useSendFile = (submissionId: string) =>
  useChange(({ table, file, signal, onSent }: FileToSend) =>
    table === 'workbook'
      ? call(putSubmissionWorkbook, { submissionId, fileName: file.name }, { file, signal, onSent })
      : call(putSubmissionFile, { submissionId, table, fileName: file.name }, { file, signal, onSent }),
  );

export function useCommit(submissionId: string) {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (previewDigest: string) => call(commitSubmission, { submissionId, previewDigest }),
    onSuccess: (receipt) => {
      cache.setQueryData(receiptQuery(submissionId).queryKey, receipt);
      void cache.invalidateQueries({ queryKey: everything, refetchType: 'none' });
    },
  });
}
