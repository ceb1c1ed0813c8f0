import { queryOptions, useQueryClient } from '@tanstack/react-query';
import { z } from 'zod';
import type { Family } from '#shared/domain/section/types.ts';
import { DropRuleList, type DropRuleInput } from '#shared/schemas/yard.ts';
import { api } from '#src/lib/api.ts';

export const dropRulesQuery = queryOptions({
  queryKey: ['drop-rules'],
  queryFn: ({ signal }) => api.get('/drop-rules', DropRuleList, { signal }),
});

export function useDropRuleWrites() {
  const client = useQueryClient();
  return {
    save: (input: DropRuleInput) =>
      api
        .put('/drop-rules', input, z.unknown())
        .finally(() => client.invalidateQueries({ queryKey: dropRulesQuery.queryKey })),
    reload: async (family: Family) =>
      (await client.fetchQuery({ ...dropRulesQuery, staleTime: 0 })).rules.find(
        (rule) => rule.family === family,
      ) ?? null,
  };
}
