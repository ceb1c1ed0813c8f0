import { queryOptions, useQueryClient } from '@tanstack/react-query';
import { Job, JobList, JobView, type JobInput } from '#shared/schemas/jobs.ts';
import { api } from '#src/lib/api.ts';

export const jobsQuery = queryOptions({
  queryKey: ['jobs'],
  queryFn: ({ signal }) => api.get('/jobs', JobList, { signal }),
});

export const jobQuery = (jobId: number) =>
  queryOptions({
    queryKey: ['jobs', jobId],
    queryFn: ({ signal }) => api.get(`/jobs/${jobId}`, JobView, { signal }),
  });

export function useJobWrites() {
  const client = useQueryClient();
  const refresh = () => client.invalidateQueries({ queryKey: jobsQuery.queryKey });
  return {
    save: (jobId: number | null, input: JobInput) =>
      (jobId === null ? api.post('/jobs', input, Job) : api.put(`/jobs/${jobId}`, input, Job)).finally(
        refresh,
      ),
    reload: async (jobId: number) => (await client.fetchQuery({ ...jobQuery(jobId), staleTime: 0 })).job,
  };
}
