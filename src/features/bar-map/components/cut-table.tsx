import type { PlanGroup } from '#shared/schemas/plans.ts';
import { useFormats } from '#src/lib/formats.ts';

/** The cuts of a layout in words and numbers, folded away until they are wanted. */
export function CutTable({ group, layoutIndex }: { group: PlanGroup; layoutIndex: number }) {
  const { length, setting, mass } = useFormats();
  const layout = group.result.layouts[layoutIndex];
  if (!layout) return null;
  const pieces = new Map(group.pieces.map((piece) => [piece.id, piece]));
  return (
    <details className="text-[0.9375rem]">
      <summary className="inline-block min-h-6 py-1 text-layout underline-offset-4 hover:underline">
        {layout.cuts.length} {layout.cuts.length === 1 ? 'cut' : 'cuts'} in numbers
      </summary>
      <div
        className="overflow-x-auto"
        tabIndex={0}
        role="region"
        aria-label={`Cuts of layout ${layoutIndex + 1}`}
      >
        <table className="mt-1 w-full max-w-3xl border-collapse">
          <thead>
            <tr className="border-b-2 border-ink text-left">
              <th className="py-1 pr-4">Cut</th>
              <th className="py-1 pr-4 text-right">Stop</th>
              <th className="py-1 pr-4 text-right">Tape</th>
              <th className="py-1 pr-4">Mark</th>
              <th className="py-1 pr-4">From</th>
              <th className="py-1 text-right">Piece</th>
            </tr>
          </thead>
          <tbody>
            {layout.cuts.map(({ pieceId, startNm, lengthNm }, i) => {
              const piece = pieces.get(pieceId);
              return (
                <tr key={i} className="border-b border-line font-mono">
                  <td className="py-1 pr-4">{i + 1}</td>
                  <td className="py-1 pr-4 text-right">{setting(lengthNm)}</td>
                  <td className="py-1 pr-4 text-right">{length(startNm + lengthNm)}</td>
                  <td className="py-1 pr-4 font-bold">{piece?.mark ?? pieceId}</td>
                  <td className="py-1 pr-4">{piece ? `job ${piece.jobNumber}, row ${piece.row}` : ''}</td>
                  <td className="py-1 text-right">{piece ? mass(piece.pieceMassMg) : ''}</td>
                </tr>
              );
            })}
          </tbody>
        </table>
      </div>
    </details>
  );
}
