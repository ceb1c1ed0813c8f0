import { Link } from 'react-router-dom';
import { PLAN_STATES, type PlanSummary } from '#shared/schemas/plans.ts';
import { SelectField } from '#src/components/select-field.tsx';
import { SearchField } from '#src/components/search-field.tsx';
import { Table, type Column } from '#src/components/table.tsx';
import { EmptyState } from '#src/components/empty-state.tsx';
import { Button } from '#src/components/button.tsx';
import { boundWords } from '#src/features/plans/hooks/bound-words.ts';
import { useFormats } from '#src/lib/formats.ts';
import { paths } from '#src/lib/paths.ts';
import { useSearch } from '#src/lib/use-search.ts';

const jobsOf = ({ jobs }: PlanSummary) => jobs.map(({ number }) => number).join(', ');

/** Plans with their state; the filters live in the address. */
export function PlanListTable({ plans }: { plans: readonly PlanSummary[] }) {
  const { money, ago } = useFormats();
  const [get, set] = useSearch();
  const [state, text] = [get('state'), get('text').toLowerCase()];
  const found = plans.filter(
    (plan) =>
      (state === '' ? plan.state !== 'withdrawn' : state === 'all' || plan.state === state) &&
      `${plan.number} ${plan.name} ${jobsOf(plan)}`.toLowerCase().includes(text),
  );
  const columns: Column<PlanSummary>[] = [
    {
      key: 'name',
      head: 'Plan',
      rowHead: true,
      fullLine: true,
      cell: (plan) => (
        <Link to={paths.plan(plan.id)} className="text-layout underline-offset-4 hover:underline">
          <span className="font-mono font-bold">{plan.number}</span> {plan.name}
        </Link>
      ),
    },
    { key: 'state', head: 'State', cell: ({ state: is }) => is },
    { key: 'jobs', head: 'Jobs', mono: true, cell: jobsOf },
    { key: 'station', head: 'Station', wideOnly: true, cell: ({ stationName }) => stationName ?? '–' },
    {
      key: 'bars',
      head: 'Bars cut',
      align: 'right',
      mono: true,
      cell: ({ bars, barsCut }) => `${barsCut} / ${bars}`,
    },
    {
      key: 'drops',
      head: 'Drops used',
      align: 'right',
      mono: true,
      wideOnly: true,
      cell: ({ dropsUsed }) => dropsUsed,
    },
    { key: 'net', head: 'Net cost', align: 'right', mono: true, cell: ({ netMinor }) => money(netMinor) },
    {
      key: 'bound',
      head: 'Against the bound',
      wideOnly: true,
      cell: ({ netMinor, boundMinor }) =>
        boundWords('bounded', netMinor, Math.max(boundMinor, netMinor - boundMinor <= 1 ? netMinor : 0)),
    },
    {
      key: 'made',
      head: 'Made',
      wideOnly: true,
      cell: ({ createdAt, createdBy }) => `${ago(createdAt)}, ${createdBy}`,
    },
  ];
  return (
    <>
      <div className="mb-4 flex flex-wrap items-end gap-4">
        <SearchField
          label="Number, name or job"
          value={get('text')}
          onSearch={(value) => set({ text: value })}
        />
        <SelectField
          label="State"
          className="w-48"
          value={state}
          onChange={(event) => set({ state: event.target.value })}
          choices={[
            { value: '', label: 'all but withdrawn' },
            { value: 'all', label: 'all' },
            ...PLAN_STATES.map((value) => ({ value, label: value })),
          ]}
        />
      </div>
      {found.length === 0 ? (
        <EmptyState
          title="No plan fits"
          actions={<Button onClick={() => set({ text: null, state: null })}>Show all</Button>}
        >
          No plan has this number, name, job and state.
        </EmptyState>
      ) : (
        <Table caption="Cut plans" columns={columns} rows={found} rowKey={({ id }) => id} />
      )}
    </>
  );
}
