import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { CutBarAnswer, PlanList, PlanView, type CutBarInput } from '#shared/schemas/plans.ts';
import { api } from '#src/lib/api.ts';

export const benchPlansQuery = queryOptions({
  queryKey: ['bench', 'plans'],
  queryFn: ({ signal }) => api.get('/plans', PlanList, { signal }),
});

export const benchPlanQuery = (planId: number) =>
  queryOptions({
    queryKey: ['bench', 'plan', planId],
    queryFn: ({ signal }) => api.get(`/plans/${planId}`, PlanView, { signal }),
  });

export type CutBar = { barId: number; input: CutBarInput };

/**
 * Tells the shop that a bar is cut. The answer goes straight into this page, so that the next bar is there at once;
 * what else hangs on it (rack, plans, jobs) is asked for again.
 */
export function useCutBar(planId: number) {
  const client = useQueryClient();
  const { queryKey } = benchPlanQuery(planId);
  return useMutation({
    mutationFn: ({ barId, input }: CutBar) => api.post(`/bars/${barId}/cut`, input, CutBarAnswer),
    onSuccess: ({ bar, plan }) => {
      client.setQueryData(
        queryKey,
        (view) =>
          view && { ...view, plan, bars: view.bars.map((other) => (other.id === bar.id ? bar : other)) },
      );
    },
    onError: () => client.invalidateQueries({ queryKey }),
    onSettled: () =>
      client.invalidateQueries({
        predicate: (query) => query.queryKey[0] !== 'session' && query.queryKey[2] !== planId,
      }),
  });
}
