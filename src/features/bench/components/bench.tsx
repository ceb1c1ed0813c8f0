import type { ReactNode } from 'react';
import type { Bar, PlanGroup, PlanView } from '#shared/schemas/plans.ts';
import type { Station } from '#shared/schemas/yard.ts';
import { LinkButton } from '#src/components/button.tsx';
import { Notice } from '#src/components/notice.tsx';
import { useToast } from '#src/components/toast.tsx';
import { countOf, formatTag } from '#src/lib/formats.ts';
import { paths } from '#src/lib/paths.ts';
import { useCutBar } from '#src/features/bench/api/bench.ts';
import { BarList } from '#src/features/bench/components/bar-list.tsx';
import { BarWork } from '#src/features/bench/components/bar-work.tsx';
import { benchBar } from '#src/features/bench/hooks/bench-steps.ts';
import { markCounts } from '#src/features/bench/hooks/mark-counts.ts';

type BenchProps = {
  view: PlanView;
  /** The bar at work; null when none waits any more. */
  bar: Bar | null;
  station: Station | null;
  mayCut: boolean;
  drawing: (bar: Bar, group: PlanGroup, activeCut: number | undefined) => ReactNode;
  onNextBar: () => void;
};

/** The next bar is read from the top; the button that was pressed is gone with the last one. */
function startOfPage(): void {
  const main = document.getElementById('main');
  main?.focus({ preventScroll: true });
  main?.scrollIntoView({ block: 'start' });
}

function cutWords(bar: Bar): string {
  const made = bar.madeDrop ? ` Drop ${formatTag(bar.madeDrop.tag)} is racked in ${bar.madeDrop.slot}.` : '';
  return `Bar ${bar.number} is cut.${made}`;
}

export function Bench({ view, bar, station, mayCut, drawing, onNextBar }: BenchProps) {
  const say = useToast();
  const cutBar = useCutBar(view.plan.id);
  const group = view.groups.find((candidate) => candidate.id === bar?.groupId);
  const layout = bar && group ? benchBar(group, bar.layout) : null;
  const made = view.bars.flatMap((other) => other.madeDrop ?? []);

  if (view.plan.state === 'draft' || view.plan.state === 'withdrawn')
    return (
      <Notice title={view.plan.state === 'draft' ? 'This plan is still a draft' : 'This plan is withdrawn'}>
        {view.plan.state === 'draft'
          ? 'It is cut once a purchaser or manager has issued it to a station.'
          : 'Nothing of it is cut any more. Take the next plan from the bench.'}
      </Notice>
    );

  return (
    <>
      {bar && group && layout && mayCut && (
        <BarWork
          key={bar.id}
          bar={bar}
          group={group}
          layout={layout}
          station={station}
          counts={markCounts(view)}
          cutBar={cutBar}
          drawing={drawing}
          onCut={(cut) => {
            say(cutWords(cut));
            startOfPage();
            onNextBar();
          }}
        />
      )}
      {bar && !mayCut && (
        <Notice title={`${view.plan.bars - view.plan.barsCut} of ${view.plan.bars} bars are still to cut`}>
          Operators and managers cut. You can look at every bar below and on the plan.
        </Notice>
      )}
      {!bar && (
        <Notice
          tone="good"
          title="Every bar of this plan is cut"
          actions={<LinkButton to={paths.bench()}>Next plan</LinkButton>}
        >
          {made.length === 0
            ? 'It made no drops worth keeping.'
            : `It made ${countOf(made.length, 'drop', 'drops')}: ${made
                .map((drop) => `${formatTag(drop.tag)} in ${drop.slot}`)
                .join(', ')}.`}
        </Notice>
      )}
      <BarList view={view} active={bar?.number ?? null} />
    </>
  );
}
