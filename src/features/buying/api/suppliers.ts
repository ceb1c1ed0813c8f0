import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { z } from 'zod';
import { Supplier, SupplierList, type SupplierInput } from '#shared/schemas/yard.ts';
import { api } from '#src/lib/api.ts';
import { offersQuery } from '#src/features/buying/api/offers.ts';

export const suppliersQuery = queryOptions({
  queryKey: ['suppliers'],
  queryFn: ({ signal }) => api.get('/suppliers', SupplierList, { signal }),
});

/** A supplier's name stands on its offers, so both lists are asked for again. */
function useRefresh() {
  const client = useQueryClient();
  return () =>
    Promise.all([
      client.invalidateQueries({ queryKey: suppliersQuery.queryKey }),
      client.invalidateQueries({ queryKey: offersQuery.queryKey }),
    ]);
}

export function useSupplierWrites() {
  const client = useQueryClient();
  const refresh = useRefresh();
  return {
    save: (supplierId: number | null, input: SupplierInput) =>
      (supplierId === null
        ? api.post('/suppliers', input, Supplier)
        : api.put(`/suppliers/${supplierId}`, input, Supplier)
      ).finally(refresh),
    reload: async (supplierId: number) =>
      (await client.fetchQuery({ ...suppliersQuery, staleTime: 0 })).suppliers.find(
        (supplier) => supplier.id === supplierId,
      ) ?? null,
  };
}

export function useDeleteSupplier() {
  const refresh = useRefresh();
  return useMutation({
    mutationFn: (supplierId: number) => api.delete(`/suppliers/${supplierId}`, undefined, z.unknown()),
    onSettled: refresh,
  });
}
