import { useSuspenseQueries } from '@tanstack/react-query';
import { useParams, type LoaderFunctionArgs } from 'react-router-dom';
import { Notice } from '#src/components/notice.tsx';
import { Page } from '#src/components/page.tsx';
import { BarMapList } from '#src/features/bar-map/components/bar-map-list.tsx';
import { planQuery, planStationsQuery } from '#src/features/plans/api/plans.ts';
import { BillOfStock } from '#src/features/plans/components/bill-of-stock.tsx';
import { GroupTable, groupAnchor } from '#src/features/plans/components/group-table.tsx';
import { PlanActions } from '#src/features/plans/components/plan-actions.tsx';
import { PlanFigures } from '#src/features/plans/components/plan-figures.tsx';
import { Unplaced } from '#src/features/plans/components/unplaced.tsx';
import { countOf, useFormats } from '#src/lib/formats.ts';
import { paths } from '#src/lib/paths.ts';
import { queryClient } from '#src/lib/query-client.ts';
import { readId } from '#src/lib/read-id.ts';

export const loader = ({ params }: LoaderFunctionArgs) =>
  Promise.all([
    queryClient.ensureQueryData(planQuery(readId(params.planId))),
    queryClient.ensureQueryData(planStationsQuery),
  ]);

export function Component() {
  const planId = readId(useParams().planId);
  const [{ data: view }, { data: yard }] = useSuspenseQueries({
    queries: [planQuery(planId), planStationsQuery],
  });
  const { ago, length } = useFormats();
  const { plan, groups, bars } = view;
  const sub = [
    plan.jobs.map(({ number }) => `job ${number}`).join(', '),
    countOf(plan.pieces, 'piece', 'pieces'),
    `${plan.state}${plan.stationName ? ` at ${plan.stationName}` : ''}`,
    plan.state === 'cutting'
      ? `${plan.barsCut} of ${plan.bars} bars cut`
      : `${ago(plan.createdAt)}, ${plan.createdBy}`,
  ];
  return (
    <Page
      title={`Plan ${plan.number} · ${plan.name}`}
      back={{ to: paths.plans(), label: 'Plans' }}
      sub={sub.join(' · ')}
      actions={<PlanActions view={view} stations={yard.stations} />}
    >
      <Unplaced groups={groups} />
      <PlanFigures view={view} />
      <h2 className="mt-8 mb-2">Sections</h2>
      <GroupTable groups={groups} />
      <BillOfStock groups={groups} />
      {groups.map((group) => (
        <section
          key={group.id}
          id={groupAnchor(group.id)}
          aria-label={`Bar maps of ${group.section} ${group.grade}`}
          className="mt-9 scroll-mt-4"
        >
          <h2 className="mb-1">
            <span className="font-mono text-[1.125rem]">
              {group.section} {group.grade}
            </span>
          </h2>
          <p className="mb-3 text-muted">
            {group.request.cutting.kerfNm === 0 ? 'no kerf' : `kerf ${length(group.request.cutting.kerfNm)}`},{' '}
            {length(group.request.cutting.headCropNm)} crop at the datum end, drops kept from{' '}
            {length(group.request.drops.keepFromNm)}
          </p>
          <BarMapList group={group} bars={bars} />
        </section>
      ))}
      <Notice tone="caution" className="mt-8">
        A planning aid. Masses are nominal. The maker’s plate on the machine governs, and so do the shop’s
        procedures and local law.
      </Notice>
    </Page>
  );
}
