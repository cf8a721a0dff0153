import { acceptInvitation, getInvitation, Token } from '@cairnstep/contract';
import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { accountQuery } from '../../lib/account.ts';
import { call } from '../../lib/call.ts';

export const invitationQuery = (token: string) =>
  queryOptions({
    queryKey: ['invitation', token],
    queryFn: ({ signal }) => call(getInvitation, { token }, { signal }),
    enabled: isToken(token),
  });

/** A link cut short by a mail program is told apart without asking the server. */
export const isToken = (token: string): boolean => Token.safeParse(token).success;

export function useAcceptInvitation(token: string) {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: () => call(acceptInvitation, { token }),
    onSuccess: (account) => cache.setQueryData(accountQuery().queryKey, account),
  });
}
