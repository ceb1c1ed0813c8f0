import { useSuspenseQuery } from '@tanstack/react-query';
import { useMemo, useState } from 'react';
import { Navigate, useParams, type LoaderFunctionArgs } from 'react-router-dom';
import { Button, LinkButton } from '#src/components/button.tsx';
import { BarMapSvg } from '#src/features/bar-map/components/bar-map-svg.tsx';
import { barDrawing } from '#src/features/bar-map/hooks/bar-drawing.ts';
import { planQuery } from '#src/features/plans/api/plans.ts';
import { PrintSheets } from '#src/features/plans/components/print-sheets.tsx';
import {
  makeBlocks,
  MARGIN,
  packSheets,
  PAPER,
  SHEET_FOOT,
  SHEET_HEAD,
} from '#src/features/plans/hooks/print-sheets.ts';
import { useFormats } from '#src/lib/formats.ts';
import { paths } from '#src/lib/paths.ts';
import { queryClient } from '#src/lib/query-client.ts';
import { readId } from '#src/lib/read-id.ts';
import { useSession, useShop } from '#src/lib/session.ts';

export const loader = ({ params }: LoaderFunctionArgs) =>
  queryClient.ensureQueryData(planQuery(readId(params.planId)));

/** Paper, as it will come out: no rail, sheets of the shop's size one below the other. */
export function Component() {
  const { person, shop } = useSession();
  return person && shop ? <PlanPaper /> : <Navigate to={paths.signIn()} replace />;
}

function PlanPaper() {
  const planId = readId(useParams().planId);
  const view = useSuspenseQuery(planQuery(planId)).data;
  const shop = useShop();
  const formats = useFormats();
  const [printedAt] = useState(() => formats.time(new Date().toISOString()));
  const sheets = useMemo(() => {
    const paper = PAPER[shop.paper];
    const blocks = makeBlocks(view.groups, paper.width - MARGIN.left - MARGIN.right, (group, layout) =>
      barDrawing(group, layout, formats, { bars: view.bars }),
    );
    return packSheets(blocks, paper.height - MARGIN.top - MARGIN.bottom - SHEET_HEAD - SHEET_FOOT);
  }, [view, shop.paper, formats]);
  return (
    <main className="min-h-dvh bg-soap print:bg-white">
      <title>{`Plan ${view.plan.number} bar maps · Barwright`}</title>
      <div className="sticky top-0 z-10 flex flex-wrap items-center gap-3 border-b border-line bg-paper px-5 py-3 print:hidden">
        <h1 className="mr-auto text-[1.5rem]">
          Plan {view.plan.number}, {sheets.length + 1} sheets of {shop.paper === 'a4' ? 'A4' : 'Letter'}
        </h1>
        <LinkButton to={paths.plan(planId)}>Back to the plan</LinkButton>
        <Button variant="act" onClick={() => window.print()}>
          Print
        </Button>
      </div>
      <div className="overflow-x-auto pt-6 print:overflow-visible print:pt-0">
        <PrintSheets
          view={view}
          shop={shop}
          formats={formats}
          printedAt={printedAt}
          sheets={sheets}
          drawingOf={(block) => (
            <BarMapSvg
              map={block.map}
              label={`Bar map of ${block.group.section}, layout ${block.layout + 1}`}
            />
          )}
        />
      </div>
    </main>
  );
}
