import { useSuspenseQueries } from '@tanstack/react-query';
import { PLATE_FAMILIES } from '#shared/domain/section/types.ts';
import { LinkButton } from '#src/components/button.tsx';
import { EmptyState } from '#src/components/empty-state.tsx';
import { Page } from '#src/components/page.tsx';
import { openLinesQuery, planJobsQuery, planStationsQuery } from '#src/features/plans/api/plans.ts';
import { NewPlan } from '#src/features/plans/components/new-plan.tsx';
import { paths } from '#src/lib/paths.ts';
import { queryClient } from '#src/lib/query-client.ts';
import { useSearch } from '#src/lib/use-search.ts';

export const loader = () =>
  Promise.all([
    queryClient.fetchQuery(openLinesQuery),
    queryClient.ensureQueryData(planJobsQuery),
    queryClient.ensureQueryData(planStationsQuery),
  ]);

export function Component() {
  const [get] = useSearch();
  const [{ data: open }, { data: jobs }, { data: yard }] = useSuspenseQueries({
    queries: [openLinesQuery, planJobsQuery, planStationsQuery],
  });
  const [partList, job] = [Number(get('partList')), Number(get('job'))];
  const wanted = new Set(get('lines').split(',').map(Number));
  const chosen = open.lines.filter(
    (line) =>
      !PLATE_FAMILIES.includes(line.family) &&
      (line.partListId === partList || line.jobId === job || wanted.has(line.id)),
  );
  // A list or job that was asked for comes first and alone in the choice; the others stay below it.
  const order = [...open.lines].sort((a, b) => Number(chosen.includes(b)) - Number(chosen.includes(a)));
  return (
    <Page
      title="New cut plan"
      back={{ to: paths.plans(), label: 'Plans' }}
      sub="Pick the lines, look at the stock, plan."
    >
      {open.lines.length === 0 ? (
        <EmptyState
          title="Nothing is open"
          actions={<LinkButton to={paths.jobs()}>Go to the jobs</LinkButton>}
        >
          Every line of every part list stands in a plan. Bring in a part list first.
        </EmptyState>
      ) : (
        <NewPlan
          lines={order}
          jobNames={new Map(jobs.jobs.map(({ id, name }) => [id, name]))}
          chosenAtFirst={new Set(chosen.map(({ id }) => id))}
          stations={yard.stations}
        />
      )}
    </Page>
  );
}
