import type { Drop } from '#shared/schemas/rack.ts';
import { Button, LinkButton } from '#src/components/button.tsx';
import { DropTag } from '#src/components/drop-tag.tsx';
import { formatHeat, formatTag, useFormats } from '#src/lib/formats.ts';
import { paths } from '#src/lib/paths.ts';

/** The number just given, large: it goes on the steel before the drop goes on the rack. */
export function FreshTag({ drop, onAgain }: { drop: Drop; onAgain: () => void }) {
  const { length, mass } = useFormats();
  return (
    <section role="status" aria-label={`Drop ${formatTag(drop.tag)} is racked`}>
      <h2>Write this on the drop</h2>
      <DropTag className="mt-3">
        <span className="block font-mono text-[3.25rem] leading-none font-bold">{formatTag(drop.tag)}</span>
        <span className="mt-3 block font-mono text-lg font-medium">
          {drop.section} · {length(drop.lengthNm)}
        </span>
        <span className="block font-mono text-[0.9375rem]">
          {drop.grade || 'grade unknown'} · {formatHeat(drop.heat)} · {mass(drop.massMg)}
        </span>
        <span className="mt-2 block font-mono text-2xl font-bold">slot {drop.slot}</span>
      </DropTag>
      <div className="mt-5 grid gap-3 sm:grid-cols-2">
        <Button size="big" variant="act" onClick={onAgain}>
          Log another
        </Button>
        <LinkButton size="big" to={paths.drop(drop.id)}>
          Open this drop
        </LinkButton>
      </div>
    </section>
  );
}
