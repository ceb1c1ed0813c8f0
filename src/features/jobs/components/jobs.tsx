import type { Job } from '#shared/schemas/jobs.ts';
import { Button } from '#src/components/button.tsx';
import { EmptyState } from '#src/components/empty-state.tsx';
import { SearchField } from '#src/components/search-field.tsx';
import { useSearch } from '#src/lib/use-search.ts';
import { JobTable } from '#src/features/jobs/components/job-table.tsx';
import { filterJobs } from '#src/features/jobs/hooks/filter-jobs.ts';

type JobsProps = { jobs: readonly Job[]; mayEdit: boolean; onMake: () => void };

export function Jobs({ jobs, mayEdit, onMake }: JobsProps) {
  const [get, set] = useSearch();
  const text = get('text');
  const shown = filterJobs(jobs, text);

  if (jobs.length === 0)
    return (
      <EmptyState
        title="No job yet"
        actions={mayEdit && <Button onClick={onMake}>Make the first job</Button>}
      >
        A job holds the part lists of one order. Make it, bring in a part list as CSV or pasted from a
        spreadsheet, then plan what to buy and how to cut it.
        {!mayEdit && ' Detailers and managers make jobs.'}
      </EmptyState>
    );
  return (
    <>
      <SearchField
        label="Find a job"
        className="mb-4 max-w-md"
        value={text}
        onSearch={(typed) => set({ text: typed })}
      />
      {shown.length === 0 ? (
        <EmptyState
          title="No job has these words"
          actions={<Button onClick={() => set({ text: null })}>Show all jobs</Button>}
        >
          {jobs.length === 1 ? '1 job is' : `${jobs.length} jobs are`} left out.
        </EmptyState>
      ) : (
        <JobTable jobs={shown} />
      )}
    </>
  );
}
