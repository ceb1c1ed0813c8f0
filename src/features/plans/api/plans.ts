import { queryOptions, useQueryClient } from '@tanstack/react-query';
import { z } from 'zod';
import { JobList, PartLineList } from '#shared/schemas/jobs.ts';
import { PlanList, PlanningView, PlanView, type SavePlanInput } from '#shared/schemas/plans.ts';
import { StationList } from '#shared/schemas/yard.ts';
import { api } from '#src/lib/api.ts';

export const plansQuery = queryOptions({
  queryKey: ['plans'],
  queryFn: ({ signal }) => api.get('/plans', PlanList, { signal }),
});

export const planQuery = (planId: number) =>
  queryOptions({
    queryKey: ['plans', planId],
    queryFn: ({ signal }) => api.get(`/plans/${planId}`, PlanView, { signal }),
  });

/** Lines of every job that are not planned in full yet. */
export const openLinesQuery = queryOptions({
  queryKey: ['plans', 'open-lines'],
  queryFn: ({ signal }) => api.get('/part-lines?open=1', PartLineList, { signal }),
  staleTime: 0,
});

export const planJobsQuery = queryOptions({
  queryKey: ['plans', 'jobs'],
  queryFn: ({ signal }) => api.get('/jobs', JobList, { signal }),
});

export const planStationsQuery = queryOptions({
  queryKey: ['plans', 'stations'],
  queryFn: ({ signal }) => api.get('/stations', StationList, { signal }),
});

export const askPlanning = (partLineIds: readonly number[]): Promise<PlanningView> =>
  api.post('/planning', { partLineIds }, PlanningView);

/** Everything that hangs on plans is asked for again: rack, jobs, bench. */
export function usePlanWrites() {
  const client = useQueryClient();
  const settle = (planId: number, view?: PlanView) => {
    if (view) client.setQueryData(planQuery(planId).queryKey, view);
    return client.invalidateQueries({ predicate: ({ queryKey }) => queryKey[0] !== 'session' });
  };
  return {
    async save(input: SavePlanInput): Promise<PlanView> {
      const view = await api.post('/plans', input, PlanView);
      await settle(view.plan.id, view);
      return view;
    },
    async issue(planId: number, input: { stationId: number; version: number }): Promise<void> {
      await settle(planId, await api.post(`/plans/${planId}/issue`, input, PlanView));
    },
    async withdraw(planId: number, input: { reason: string; version: number }): Promise<void> {
      await settle(planId, await api.post(`/plans/${planId}/withdraw`, input, PlanView));
    },
    async remove(planId: number): Promise<void> {
      await api.delete(`/plans/${planId}`, undefined, z.undefined());
      client.removeQueries({ queryKey: planQuery(planId).queryKey });
      await client.invalidateQueries({ predicate: ({ queryKey }) => queryKey[0] !== 'session' });
    },
  };
}
