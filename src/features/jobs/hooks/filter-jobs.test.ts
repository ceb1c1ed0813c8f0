import { describe, expect, it } from 'vitest';
import type { Job } from '#shared/schemas/jobs.ts';
import { filterJobs } from '#src/features/jobs/hooks/filter-jobs.ts';

const job = (number: string, name: string, customer: string) => ({ number, name, customer }) as Job;
const jobs = [job('2407', 'Mezzanine stairs', 'Mill Street'), job('2411', 'Handrail', 'Mill Street')];

describe('finding a job', () => {
  it('looks in number, name and customer for every word', () => {
    expect(filterJobs(jobs, 'mill 24').map(({ number }) => number)).toEqual(['2407', '2411']);
    expect(filterJobs(jobs, 'mill rail').map(({ number }) => number)).toEqual(['2411']);
    expect(filterJobs(jobs, 'roof')).toEqual([]);
  });
  it('shows all when nothing is typed', () => {
    expect(filterJobs(jobs, '  ')).toHaveLength(2);
  });
});
