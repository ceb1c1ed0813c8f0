import { useSuspenseQueries } from '@tanstack/react-query';
import { useParams, type LoaderFunctionArgs } from 'react-router-dom';
import { LinkButton } from '#src/components/button.tsx';
import { Page } from '#src/components/page.tsx';
import { BarMapFigure } from '#src/features/bar-map/components/bar-map-figure.tsx';
import { benchPlanQuery } from '#src/features/bench/api/bench.ts';
import { Bench } from '#src/features/bench/components/bench.tsx';
import { stationsQuery } from '#src/features/shop/api/stations.ts';
import { paths } from '#src/lib/paths.ts';
import { queryClient } from '#src/lib/query-client.ts';
import { readId } from '#src/lib/read-id.ts';
import { useMay } from '#src/lib/session.ts';
import { useSearch } from '#src/lib/use-search.ts';

export const loader = ({ params }: LoaderFunctionArgs) =>
  Promise.all([
    queryClient.ensureQueryData(benchPlanQuery(readId(params.planId))),
    queryClient.ensureQueryData(stationsQuery),
  ]);

export function Component() {
  const planId = readId(useParams().planId);
  const [{ data: view }, { data: yard }] = useSuspenseQueries({
    queries: [benchPlanQuery(planId), stationsQuery],
  });
  const mayCut = useMay('bar:cut');
  const [get, set] = useSearch();
  const { plan, bars } = view;
  const waiting = bars.filter((bar) => bar.state === 'waiting').sort((a, b) => a.number - b.number);
  const bar = waiting.find(({ number }) => String(number) === get('bar')) ?? waiting[0] ?? null;
  const station = yard.stations.find(({ id }) => id === plan.stationId) ?? null;
  const place = plan.stationName ?? 'Bench';
  return (
    <Page
      title={bar ? `${place} · bar ${bar.number} of ${bars.length}` : `${place} · plan ${plan.number}`}
      sub={
        <span className="text-lg">
          Plan {plan.number}, {plan.name}
        </span>
      }
      back={{ to: paths.bench(), label: 'Bench' }}
      actions={<LinkButton to={paths.planPrint(planId)}>Print bar maps</LinkButton>}
    >
      <Bench
        view={view}
        bar={bar}
        station={station}
        mayCut={mayCut}
        drawing={(drawn, group, activeCut) => (
          <BarMapFigure
            group={group}
            layoutIndex={drawn.layout}
            bar={drawn}
            {...(activeCut === undefined ? {} : { activeCut })}
          />
        )}
        onNextBar={() => set({ bar: null })}
      />
    </Page>
  );
}
