import type { SolveRequest } from '#shared/domain/solve.ts';
import type { SolveProgress } from '#workers/solver/api.ts';
import { BoundTape } from '#src/features/plans/components/bound-tape.tsx';
import { boundWords } from '#src/features/plans/hooks/bound-words.ts';
import { countOf, useFormats } from '#src/lib/formats.ts';

type SolveBoardProps = {
  groups: SolveRequest['groups'];
  progress: ReadonlyMap<string, SolveProgress>;
  outcomes?: ReadonlyMap<string, 'proven' | 'bounded' | 'unplaceable'>;
};

/** Groups side by side while they are solved: cost, bound and how near they are to each other. */
export function SolveBoard({ groups, progress, outcomes }: SolveBoardProps) {
  const { money } = useFormats();
  const told = groups.map(({ id }) => progress.get(id));
  const net = told.reduce((sum, entry) => sum + (entry?.netCostMinor ?? 0), 0);
  const bound = told.reduce(
    (sum, entry) => sum + Math.min(entry?.boundMinor ?? 0, entry?.netCostMinor ?? Infinity),
    0,
  );
  const all = told.every((entry) => entry?.netCostMinor !== undefined && entry.netCostMinor !== null);
  return (
    <>
      {all && net > 0 && (
        <BoundTape
          netMinor={net}
          boundMinor={Math.min(bound, net)}
          words={boundWords('bounded', net, Math.min(bound, net))}
        />
      )}
      <div className="mt-6 overflow-x-auto" tabIndex={0} role="region" aria-label="Groups being planned">
        <table className="w-full border-collapse">
          <thead>
            <tr className="border-b-2 border-ink text-left">
              <th className="py-1.5 pr-4">Section and grade</th>
              <th className="py-1.5 pr-4 text-right">Bars</th>
              <th className="py-1.5 pr-4 text-right">Net cost</th>
              <th className="py-1.5 pr-4">Against the bound</th>
              <th className="py-1.5 text-right">Time</th>
            </tr>
          </thead>
          <tbody>
            {groups.map(({ id }) => {
              const entry = progress.get(id);
              const outcome = outcomes?.get(id);
              const [section, grade] = id.split('|');
              return (
                <tr key={id} className="border-b border-line">
                  <th
                    scope="row"
                    className="py-1.5 pr-4 text-left font-mono text-base font-medium whitespace-nowrap"
                  >
                    {section} {grade}
                  </th>
                  <td className="py-1.5 pr-4 text-right font-mono">{entry?.bars ?? '–'}</td>
                  <td className="py-1.5 pr-4 text-right font-mono whitespace-nowrap">
                    {typeof entry?.netCostMinor !== 'number' ? '–' : money(entry.netCostMinor)}
                  </td>
                  <td className="py-1.5 pr-4">
                    {!entry
                      ? 'waiting for a free worker'
                      : outcome === 'unplaceable'
                        ? 'some pieces fit no stock'
                        : entry.netCostMinor === null
                          ? 'looking for a first plan'
                          : `${boundWords(outcome ?? 'bounded', entry.netCostMinor, Math.min(entry.boundMinor ?? 0, entry.netCostMinor))}${entry.phase === 'done' ? '' : ', still improving'}`}
                  </td>
                  <td className="py-1.5 text-right font-mono whitespace-nowrap">
                    {entry ? `${(entry.elapsedMs / 1000).toFixed(1)} s` : ''}
                  </td>
                </tr>
              );
            })}
          </tbody>
        </table>
      </div>
      <p className="sr-only" role="status">
        {countOf(told.filter((entry) => entry?.phase === 'done').length, 'group is', 'groups are')} planned.
      </p>
    </>
  );
}
