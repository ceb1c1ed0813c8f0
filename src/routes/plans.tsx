import { useSuspenseQuery } from '@tanstack/react-query';
import { LinkButton } from '#src/components/button.tsx';
import { EmptyState } from '#src/components/empty-state.tsx';
import { Page } from '#src/components/page.tsx';
import { plansQuery } from '#src/features/plans/api/plans.ts';
import { PlanListTable } from '#src/features/plans/components/plan-list.tsx';
import { paths } from '#src/lib/paths.ts';
import { queryClient } from '#src/lib/query-client.ts';

export const loader = () => queryClient.ensureQueryData(plansQuery);

export function Component() {
  const { plans, can } = useSuspenseQuery(plansQuery).data;
  const mayPlan = can['plan:draft'] ?? false;
  return (
    <Page
      title="Plans"
      actions={
        mayPlan && (
          <LinkButton to={paths.newPlan()} variant="act">
            New cut plan
          </LinkButton>
        )
      }
    >
      {plans.length === 0 ? (
        <EmptyState
          title="No plan yet"
          actions={mayPlan && <LinkButton to={paths.newPlan()}>Make the first plan</LinkButton>}
        >
          A plan takes the open lines of one or several jobs and finds the cheapest bars and drops that make
          every piece.
        </EmptyState>
      ) : (
        <PlanListTable plans={plans} />
      )}
    </Page>
  );
}
