import { billOf, massesOf } from '#shared/domain/bill-of-stock.ts';
import type { PlanView } from '#shared/schemas/plans.ts';
import { Figure, FigureRow } from '#src/components/figure-row.tsx';
import { BoundTape } from '#src/features/plans/components/bound-tape.tsx';
import { boundWords } from '#src/features/plans/hooks/bound-words.ts';
import { useFormats } from '#src/lib/formats.ts';

/** What the plan costs and where its steel goes, and how far from the best possible it can be at most. */
export function PlanFigures({ view }: { view: PlanView }) {
  const { money, mass } = useFormats();
  const { plan, groups } = view;
  const masses = massesOf(groups);
  const net = groups.reduce((sum, { result }) => sum + result.netCostMinor, 0);
  const bound = groups.reduce((sum, { result }) => sum + result.boundMinor, 0);
  const buy = billOf(groups)
    .filter(({ source }) => source === 'new')
    .reduce((sum, { costMinor }) => sum + costMinor, 0);
  const share = (part: number) => (masses.stock > 0 ? `${((100 * part) / masses.stock).toFixed(1)} %` : '–');
  return (
    <>
      <FigureRow>
        <Figure value={money(net)} label="net cost, drops credited" />
        <Figure value={money(buy)} label="to buy" note={mass(masses.bought)} />
        <Figure value={plan.newBars} label="bars to buy" />
        <Figure
          value={plan.dropsUsed}
          label="drops used"
          note={plan.dropsUsed > 0 ? mass(masses.fromRack) : undefined}
        />
        <Figure
          value={masses.yield === null ? '–' : `${(100 * masses.yield).toFixed(1)} %`}
          label="yield: becomes pieces"
          note={mass(masses.pieces)}
        />
        <Figure value={share(masses.drops)} label="kept as drops" note={mass(masses.drops)} />
        <Figure
          value={share(masses.scrap + masses.crops + masses.kerf)}
          label="scrap, crops and kerf"
          note={mass(masses.scrap + masses.crops + masses.kerf)}
        />
      </FigureRow>
      {net > 0 && (
        <>
          <h2 className="mt-7 mb-3">How good is it</h2>
          <BoundTape netMinor={net} boundMinor={bound} words={boundWords('bounded', net, bound)} />
        </>
      )}
    </>
  );
}
