import { keepPreviousData, queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { DropList, DropView, type DropPatch, type LogDropInput } from '#shared/schemas/rack.ts';
import { api } from '#src/lib/api.ts';
import { withSearch } from '#src/lib/paths.ts';
import type { RackFilter } from '#src/features/rack/hooks/read-filter.ts';

/** Asked for no state, the server gives what lies on the rack: free and held. */
export const dropsQuery = ({ state, ...filter }: RackFilter) =>
  queryOptions({
    queryKey: ['drops', state, filter],
    queryFn: ({ signal }) =>
      api.get(withSearch('/drops', { ...filter, state: state === 'here' ? null : state }), DropList, {
        signal,
      }),
    placeholderData: keepPreviousData,
  });

/** All that lies on the rack, for the sections and slots last used. */
export const onRackQuery = dropsQuery({ state: 'here', section: '', minLengthNm: null, text: '' });

export const dropQuery = (dropId: number) =>
  queryOptions({
    queryKey: ['drop', dropId],
    queryFn: ({ signal }) => api.get(`/drops/${dropId}`, DropView, { signal }),
  });

export function useLogDrop() {
  const client = useQueryClient();
  return async (input: LogDropInput) => {
    const view = await api.post('/drops', input, DropView);
    client.setQueryData(dropQuery(view.drop.id).queryKey, view);
    await client.invalidateQueries({ queryKey: ['drops'] });
    return view.drop;
  };
}

export function useChangeDrop(dropId: number) {
  const client = useQueryClient();
  const { queryKey } = dropQuery(dropId);
  return useMutation({
    mutationFn: (patch: DropPatch) => api.patch(`/drops/${dropId}`, patch, DropView),
    onSuccess: (view) => client.setQueryData(queryKey, view),
    onError: () => client.invalidateQueries({ queryKey }),
    onSettled: () => client.invalidateQueries({ queryKey: ['drops'] }),
  });
}
