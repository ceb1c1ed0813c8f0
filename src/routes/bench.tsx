import { useSuspenseQuery } from '@tanstack/react-query';
import { Page } from '#src/components/page.tsx';
import { benchPlansQuery } from '#src/features/bench/api/bench.ts';
import { BenchPlans } from '#src/features/bench/components/bench-plans.tsx';
import { queryClient } from '#src/lib/query-client.ts';

export const loader = () => queryClient.ensureQueryData(benchPlansQuery);

export function Component() {
  const { plans } = useSuspenseQuery(benchPlansQuery).data;
  return (
    <Page title="Bench" sub="Plans issued for cutting, those begun first.">
      <BenchPlans plans={plans} />
    </Page>
  );
}
