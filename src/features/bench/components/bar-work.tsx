import type { ReactNode } from 'react';
import { barMassMg } from '#shared/domain/mass.ts';
import { asNm } from '#shared/domain/units.ts';
import type { Bar, PlanGroup } from '#shared/schemas/plans.ts';
import type { Station } from '#shared/schemas/yard.ts';
import { faultWords } from '#src/lib/api-error.ts';
import { formatHeat, formatTag, useFormats } from '#src/lib/formats.ts';
import { useShop } from '#src/lib/session.ts';
import type { useCutBar } from '#src/features/bench/api/bench.ts';
import { Cautions } from '#src/features/bench/components/cautions.tsx';
import { CutList } from '#src/features/bench/components/cut-list.tsx';
import { CutStep } from '#src/features/bench/components/cut-step.tsx';
import { FinishStep } from '#src/features/bench/components/finish-step.tsx';
import { PullStep, heatIsAnswered } from '#src/features/bench/components/pull-step.tsx';
import type { BenchBar } from '#src/features/bench/hooks/bench-steps.ts';
import { useBarProgress } from '#src/features/bench/hooks/use-bar-progress.ts';

type BarWorkProps = {
  bar: Bar;
  group: PlanGroup;
  layout: BenchBar;
  station: Station | null;
  counts: ReadonlyMap<string, { cut: number; all: number }>;
  cutBar: ReturnType<typeof useCutBar>;
  /** The bar map of this bar; the cut at work by its position in the layout. */
  drawing: (bar: Bar, group: PlanGroup, activeCut: number | undefined) => ReactNode;
  onCut: (bar: Bar) => void;
};

/** One bar from the rack to the tag: bring it, cut it, say what is left. */
export function BarWork({ bar, group, layout, station, counts, cutBar, drawing, onCut }: BarWorkProps) {
  const { length, mass } = useFormats();
  const shop = useShop();
  const [progress, change, forget] = useBarProgress(bar.id);
  const { steps, stock } = layout;
  const massMg = barMassMg(group.mgPerM, asNm(stock.lengthNm));
  const step = steps[progress.step - 1];
  const finishing = progress.step > steps.length;
  const heat = stock.drop
    ? stock.drop.heat
    : progress.heatKnown === 'read'
      ? progress.heat.trim() || null
      : null;
  const error = cutBar.isError && cutBar.variables.barId === bar.id ? faultWords(cutBar.error) : null;

  const told = () =>
    cutBar.mutate(
      {
        barId: bar.id,
        input: {
          ...(stock.source === 'new' ? { heat } : {}),
          ...(layout.keeps ? { slot: progress.slot.trim() } : {}),
          ...(layout.keeps && progress.measuredNm !== null ? { measuredNm: progress.measuredNm } : {}),
          version: bar.version,
        },
      },
      {
        onSuccess: (answer) => {
          forget();
          onCut(answer.bar);
        },
      },
    );

  const ofMark = (id: string, cut: number) => {
    const count = counts.get(id);
    if (!count) return null;
    const before = steps.filter(
      (other) => other.kind === 'piece' && other.piece.id === id && other.cut < cut,
    ).length;
    return { number: count.cut + before + 1, all: count.all };
  };

  return (
    <div className="grid gap-6">
      <div>
        {progress.step > 0 && (
          <p className="mb-3 font-mono text-lg md:text-xl">
            {group.section} {group.grade} · {stock.drop ? `${formatTag(stock.drop.tag)} · ` : ''}
            {length(stock.lengthNm)} · {mass(massMg)}
            {` · ${formatHeat(heat)}`}
          </p>
        )}
        {progress.step === 0 && (
          <PullStep
            group={group}
            bar={layout}
            barMass={mass(massMg)}
            progress={progress}
            onChange={change}
            onPulled={() => change({ step: 1 })}
          />
        )}
        {step && (
          <CutStep
            step={step}
            position={progress.step}
            positions={steps.length}
            ofMark={step.kind === 'piece' ? ofMark(step.piece.id, step.cut) : null}
            longestStopNm={station?.longestStopNm ?? null}
            onDone={() => change({ step: progress.step + 1 })}
            onBack={() => change({ step: progress.step - 1 })}
            onWholeBar={() => change({ step: steps.length + 1 })}
          />
        )}
        {finishing && (
          <FinishStep
            bar={bar}
            layout={layout}
            heat={heat}
            progress={progress}
            onChange={change}
            onCut={told}
            onBack={() => change({ step: steps.length })}
            busy={cutBar.isPending}
            fault={error && `${error.title}. ${error.message}`}
          />
        )}
      </div>
      {drawing(bar, group, step?.kind === 'piece' ? step.cut : undefined)}
      <Cautions
        method={station?.method ?? null}
        heavy={massMg > shop.handlingMassMg ? `the bar weighs ${mass(massMg)}` : null}
      />
      <section>
        <h2 className="mb-2">Cuts of this bar</h2>
        <CutList
          steps={steps}
          active={progress.step - 1}
          onChoose={(index) => {
            if (heatIsAnswered(layout, progress)) change({ step: index + 1 });
          }}
        />
      </section>
    </div>
  );
}
