import type { AccessRequest, RequestForm } from '@cairnstep/contract';
import {
  createRequest,
  decideRequest,
  deleteDraft,
  getReach,
  getRequest,
  listRequests,
  saveRequest,
  submitRequest,
  withdrawRequest,
} from '@cairnstep/contract';
import { keepPreviousData, queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { QueryClient } from '@tanstack/react-query';
import { useEffect, useRef } from 'react';
import { call } from '../../lib/call.ts';

const listKey = ['requests'] as const;

export const requestsQuery = () =>
  queryOptions({
    queryKey: [...listKey, 'list'],
    queryFn: ({ signal }) => call(listRequests, {}, { signal }),
    staleTime: 0,
  });

export const requestQuery = (requestId: string) =>
  queryOptions({
    queryKey: [...listKey, 'one', requestId],
    queryFn: ({ signal }) => call(getRequest, { requestId }, { signal }),
    staleTime: 0,
  });

/** Reach belongs to one wording, so it is asked for again when the wording kept on the server is another. */
export const reachQuery = ({ id, versionHash }: Pick<AccessRequest, 'id' | 'versionHash'>) =>
  queryOptions({
    queryKey: [...listKey, 'reach', id, versionHash],
    queryFn: ({ signal }) => call(getReach, { requestId: id }, { signal }),
    placeholderData: keepPreviousData,
    staleTime: 5 * 60_000,
  });

function keep(cache: QueryClient, request: AccessRequest): void {
  cache.setQueryData(requestQuery(request.id).queryKey, request);
  void cache.invalidateQueries({ queryKey: requestsQuery().queryKey });
}

export function useCreateRequest() {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (form: RequestForm) => call(createRequest, { form }),
    onSuccess: (request) => keep(cache, request),
  });
}

export function useSaveRequest(requestId: string) {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (form: RequestForm) => call(saveRequest, { requestId, form }),
    onSuccess: (request) => keep(cache, request),
  });
}

export function useSubmitRequest(requestId: string) {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: () => call(submitRequest, { requestId }),
    onSuccess: (request) => keep(cache, request),
  });
}

export function useWithdrawRequest(requestId: string) {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: () => call(withdrawRequest, { requestId }),
    onSuccess: (request) => keep(cache, request),
  });
}

/** The draft is forgotten when the page that shows it is left: sooner, that page would ask for it again. */
export function useDeleteDraft(requestId: string) {
  const cache = useQueryClient();
  const isGone = useRef(false);
  useEffect(
    () => () => {
      if (isGone.current) cache.removeQueries({ queryKey: requestQuery(requestId).queryKey });
    },
    [cache, requestId],
  );
  return useMutation({
    mutationFn: () => call(deleteDraft, { requestId }),
    onSuccess: () => {
      isGone.current = true;
      void cache.invalidateQueries({ queryKey: requestsQuery().queryKey });
    },
  });
}

export interface Decision {
  readonly versionHash: string;
  readonly vote: 'approve' | 'decline';
  readonly reason: string;
}

export function useDecideRequest(requestId: string) {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (decision: Decision) => call(decideRequest, { requestId, ...decision, noConflict: true }),
    onSuccess: (request) => keep(cache, request),
  });
}
