/** What the administrator's pages ask and tell. A change answers with the person or invitation as it then is. */
import { endGrant, giveGrant, invitePerson, listPeople, revokeInvitation, setPersonStatus } from '@cairnstep/contract';
import type { CallOf, ResponseOf } from '@cairnstep/contract';
import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { call } from '../../lib/call.ts';

export type People = ResponseOf<typeof listPeople>;
export type Person = People['people'][number];
export type Invitation = People['invitations'][number];

export const peopleQuery = () =>
  queryOptions({
    queryKey: ['people'],
    queryFn: ({ signal }) => call(listPeople, {}, { signal }),
  });

function usePersonChange<Input>(change: (input: Input) => Promise<Person>) {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: change,
    onSuccess: (changed) =>
      cache.setQueryData(
        peopleQuery().queryKey,
        (before) => before && { ...before, people: before.people.map((person) => (person.id === changed.id ? changed : person)) },
      ),
  });
}

export const useGiveGrant = (personId: string) =>
  usePersonChange((grant: Omit<CallOf<typeof giveGrant>, 'personId'>) => call(giveGrant, { personId, ...grant }));

export const useEndGrant = (personId: string) => usePersonChange((grantId: string) => call(endGrant, { personId, grantId }));

export const useSetStatus = (personId: string) =>
  usePersonChange((status: Person['status']) => call(setPersonStatus, { personId, status }));

export function useInvite() {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (invitation: CallOf<typeof invitePerson>) => call(invitePerson, invitation),
    onSuccess: (added) =>
      cache.setQueryData(
        peopleQuery().queryKey,
        (before) => before && { ...before, invitations: [added, ...before.invitations.filter(({ id }) => id !== added.id)] },
      ),
  });
}

export function useRevokeInvitation() {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (invitationId: string) => call(revokeInvitation, { invitationId }),
    onSuccess: (revoked) =>
      cache.setQueryData(
        peopleQuery().queryKey,
        (before) => before && { ...before, invitations: before.invitations.map((one) => (one.id === revoked.id ? revoked : one)) },
      ),
  });
}
