import { Link } from 'react-router-dom';
import type { Drop } from '#shared/schemas/rack.ts';
import { DropTag } from '#src/components/drop-tag.tsx';
import { formatHeat, formatTag, useFormats } from '#src/lib/formats.ts';
import { paths } from '#src/lib/paths.ts';
import { STATE_WORDS } from '#src/features/rack/hooks/state-words.ts';

/** One drop as its tag: what a hand reads at the rack, the slot largest. */
function DropCard({ drop }: { drop: Drop }) {
  const { length, ago } = useFormats();
  return (
    <Link to={paths.drop(drop.id)} className="block min-w-0">
      <DropTag>
        <span className="flex flex-wrap items-baseline justify-between gap-x-4 font-mono">
          <span className="font-bold">{formatTag(drop.tag)}</span>
          {drop.state === 'racked' || drop.state === 'held' ? (
            <span className="text-lg font-bold">{drop.slot}</span>
          ) : (
            <span className="font-sans font-semibold">{STATE_WORDS[drop.state]}</span>
          )}
        </span>
        <span className="block font-mono text-[1.0625rem] font-medium">
          {drop.section} · {length(drop.lengthNm)}
        </span>
        <span className="block font-mono text-[0.8125rem] text-muted">
          {drop.grade || 'grade unknown'} · {formatHeat(drop.heat)} · {ago(drop.loggedAt)}
        </span>
        {drop.state === 'held' && drop.heldByPlan && (
          <span className="block text-[0.9375rem]">held for plan {drop.heldByPlan.number}</span>
        )}
      </DropTag>
    </Link>
  );
}

export function DropCards({ drops }: { drops: readonly Drop[] }) {
  return (
    <ul className="m-0 grid list-none gap-3 p-0 md:grid-cols-2">
      {drops.map((drop) => (
        <li key={drop.id} className="min-w-0">
          <DropCard drop={drop} />
        </li>
      ))}
    </ul>
  );
}
