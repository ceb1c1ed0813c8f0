import type { PlanGroup } from '#shared/schemas/plans.ts';
import { Notice } from '#src/components/notice.tsx';
import { countOf, useFormats } from '#src/lib/formats.ts';

/** Pieces the plan does not make, said loudly: nobody should find out at the bench. */
export function Unplaced({ groups }: { groups: readonly PlanGroup[] }) {
  const { length } = useFormats();
  const missing = groups.flatMap((group) =>
    group.result.unplaced.map((entry) => ({
      ...entry,
      group,
      piece: group.pieces.find(({ id }) => id === entry.pieceId),
    })),
  );
  if (missing.length === 0) return null;
  const pieces = missing.reduce((sum, { quantity }) => sum + quantity, 0);
  return (
    <Notice
      tone="fault"
      className="mb-6"
      title={`${countOf(pieces, 'piece is', 'pieces are')} not in this plan`}
    >
      <ul className="list-disc pl-5">
        {missing.map(({ pieceId, quantity, reason, group, piece }) => (
          <li key={`${group.id}${pieceId}`}>
            <span className="font-mono">
              {quantity} × {piece?.mark} {group.section} {length(piece?.lengthNm ?? 0)}
            </span>
            : {reason}
          </li>
        ))}
      </ul>
    </Notice>
  );
}
