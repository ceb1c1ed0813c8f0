import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { z } from 'zod';
import { Station, StationList, type StationInput } from '#shared/schemas/yard.ts';
import { api } from '#src/lib/api.ts';

export const stationsQuery = queryOptions({
  queryKey: ['stations'],
  queryFn: ({ signal }) => api.get('/stations', StationList, { signal }),
});

export function useStationWrites() {
  const client = useQueryClient();
  const refresh = () => client.invalidateQueries({ queryKey: stationsQuery.queryKey });
  return {
    save: (stationId: number | null, input: StationInput) =>
      (stationId === null
        ? api.post('/stations', input, Station)
        : api.put(`/stations/${stationId}`, input, Station)
      ).finally(refresh),
    reload: async (stationId: number) =>
      (await client.fetchQuery({ ...stationsQuery, staleTime: 0 })).stations.find(
        (station) => station.id === stationId,
      ) ?? null,
  };
}

export function useDeleteStation() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (stationId: number) => api.delete(`/stations/${stationId}`, undefined, z.unknown()),
    onSettled: () => client.invalidateQueries({ queryKey: stationsQuery.queryKey }),
  });
}
