import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { z } from 'zod';
import { Offer, OfferList, type OfferInput } from '#shared/schemas/yard.ts';
import { api } from '#src/lib/api.ts';

export const offersQuery = queryOptions({
  queryKey: ['offers'],
  queryFn: ({ signal }) => api.get('/offers', OfferList, { signal }),
});

export function useOfferWrites() {
  const client = useQueryClient();
  const refresh = () => client.invalidateQueries({ queryKey: offersQuery.queryKey });
  return {
    save: (offerId: number | null, input: OfferInput) =>
      (offerId === null
        ? api.post('/offers', input, Offer)
        : api.put(`/offers/${offerId}`, input, Offer)
      ).finally(refresh),
    reload: async (offerId: number) =>
      (await client.fetchQuery({ ...offersQuery, staleTime: 0 })).offers.find(
        (offer) => offer.id === offerId,
      ) ?? null,
  };
}

export function useDeleteOffer() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (offerId: number) => api.delete(`/offers/${offerId}`, undefined, z.unknown()),
    onSettled: () => client.invalidateQueries({ queryKey: offersQuery.queryKey }),
  });
}
