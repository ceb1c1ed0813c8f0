import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import {
  InvitedPerson,
  PeopleList,
  Person,
  type InviteInput,
  type PersonPatch,
} from '#shared/schemas/people.ts';
import { api } from '#src/lib/api.ts';

export const peopleQuery = queryOptions({
  queryKey: ['people'],
  queryFn: ({ signal }) => api.get('/people', PeopleList, { signal }),
});

export function useInvite() {
  const client = useQueryClient();
  return (input: InviteInput) =>
    api
      .post('/people', input, InvitedPerson)
      .finally(() => client.invalidateQueries({ queryKey: peopleQuery.queryKey }));
}

export function useChangePerson(personId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (patch: PersonPatch) => api.patch(`/people/${encodeURIComponent(personId)}`, patch, Person),
    onSettled: () =>
      Promise.all([
        client.invalidateQueries({ queryKey: peopleQuery.queryKey }),
        client.invalidateQueries({ queryKey: ['session'] }),
      ]),
  });
}

/** Makes a fresh one-time link; the one before stops working. */
export function useRenewLink() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (personId: string) =>
      api.post(`/people/${encodeURIComponent(personId)}/link`, {}, InvitedPerson),
    onSettled: () => client.invalidateQueries({ queryKey: peopleQuery.queryKey }),
  });
}
