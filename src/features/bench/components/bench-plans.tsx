import { Link } from 'react-router-dom';
import type { PlanSummary } from '#shared/schemas/plans.ts';
import { EmptyState } from '#src/components/empty-state.tsx';
import { LinkButton } from '#src/components/button.tsx';
import { countOf, useFormats } from '#src/lib/formats.ts';
import { paths } from '#src/lib/paths.ts';

/** Plans issued to a station, those already begun first. */
export function BenchPlans({ plans }: { plans: readonly PlanSummary[] }) {
  const { time } = useFormats();
  const open = plans
    .filter((plan) => plan.state === 'issued' || plan.state === 'cutting')
    .sort(
      (a, b) =>
        Number(b.state === 'cutting') - Number(a.state === 'cutting') ||
        (a.issuedAt ?? '').localeCompare(b.issuedAt ?? ''),
    );
  if (open.length === 0)
    return (
      <EmptyState
        title="Nothing to cut"
        actions={<LinkButton to={paths.plans()}>Look at the plans</LinkButton>}
      >
        A plan comes here when a purchaser or manager issues it to a station.
      </EmptyState>
    );
  return (
    <ul className="m-0 grid list-none gap-4 p-0">
      {open.map((plan) => (
        <li key={plan.id}>
          <Link
            to={paths.benchPlan(plan.id)}
            className="block border-[1.5px] border-ink bg-chalk px-5 py-4 hover:bg-soap"
          >
            <span className="flex flex-wrap items-baseline justify-between gap-x-6 gap-y-1">
              <span className="font-head text-[1.625rem] leading-tight font-semibold">
                {plan.stationName ?? 'No station'} · plan {plan.number}
              </span>
              <span className="font-mono text-2xl font-bold">
                {plan.barsCut} of {plan.bars}
              </span>
            </span>
            <span className="mt-1 flex flex-wrap justify-between gap-x-6 text-lg">
              <span>{plan.name}</span>
              <span className="text-muted">bars cut</span>
            </span>
            <span aria-hidden className="mt-3 block h-3 border border-ink bg-paper">
              <span
                className="block h-full bg-layout"
                style={{ width: `${(plan.barsCut / Math.max(1, plan.bars)) * 100}%` }}
              />
            </span>
            <span className="mt-2 block text-muted">
              {plan.jobs.length > 0 && `Job ${plan.jobs.map((job) => job.number).join(', ')} · `}
              {countOf(plan.pieces, 'piece', 'pieces')} ·{' '}
              {plan.dropsUsed === 0
                ? 'no drops to pull'
                : `${countOf(plan.dropsUsed, 'drop', 'drops')} to pull`}
              {plan.issuedAt && ` · issued ${time(plan.issuedAt)}`}
            </span>
          </Link>
        </li>
      ))}
    </ul>
  );
}
