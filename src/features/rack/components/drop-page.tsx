import { Link } from 'react-router-dom';
import type { DropView } from '#shared/schemas/rack.ts';
import { DropTag } from '#src/components/drop-tag.tsx';
import { Facts } from '#src/components/facts.tsx';
import { LengthTape } from '#src/components/length-tape.tsx';
import { formatTag, useFormats } from '#src/lib/formats.ts';
import { paths } from '#src/lib/paths.ts';
import { STATE_WORDS } from '#src/features/rack/hooks/state-words.ts';

type DropPageProps = {
  view: DropView;
  /** The shop's rule for this kind of section, when it has one. */
  keepFromNm: number | null;
};

const LINK = 'text-layout underline underline-offset-4';

export function DropPage({ view: { drop, events, children }, keepFromNm }: DropPageProps) {
  const { length, mass, time, ago, units } = useFormats();
  const size =
    drop.widthNm === null ? length(drop.lengthNm) : `${length(drop.widthNm)} × ${length(drop.lengthNm)}`;
  const marked = keepFromNm !== null && keepFromNm <= drop.lengthNm;
  return (
    <div className="grid gap-8">
      <div className="max-w-4xl">
        <DropTag>
          <span className="block font-mono text-2xl font-bold">
            {drop.section} · {size}
          </span>
          <span className="block font-mono">
            {drop.grade || 'grade unknown'} · {drop.heat === null ? 'heat unknown' : `heat ${drop.heat}`} ·{' '}
            {mass(drop.massMg)}
          </span>
        </DropTag>
        <LengthTape
          className="mt-2"
          label={`${size} long${marked ? `; the shop keeps drops from ${length(keepFromNm)}` : ''}`}
          lengthNm={drop.lengthNm}
          units={units}
          marks={
            marked
              ? [{ key: 'keep', at: keepFromNm, kind: 'keep', label: `keep from ${length(keepFromNm)}` }]
              : []
          }
        />
      </div>
      <Facts
        className="max-w-4xl"
        facts={[
          { label: 'Slot', value: <span className="text-xl font-bold">{drop.slot}</span>, mono: true },
          {
            label: 'State',
            value: drop.heldByPlan ? (
              <Link to={paths.plan(drop.heldByPlan.id)} className={LINK}>
                held for plan {drop.heldByPlan.number}, {drop.heldByPlan.name}
              </Link>
            ) : (
              STATE_WORDS[drop.state]
            ),
          },
          { label: 'Heat', value: drop.heat ?? 'unknown', mono: true },
          { label: 'Racked', value: `${ago(drop.loggedAt)}, by ${drop.loggedBy}` },
          {
            label: 'Cut from',
            value: drop.from ? (
              <>
                <Link to={paths.plan(drop.from.planId)} className={LINK}>
                  plan {drop.from.planNumber}
                </Link>
                {drop.from.parentTag !== null && (
                  <>
                    , drop <span className="font-mono">{formatTag(drop.from.parentTag)}</span>
                  </>
                )}
              </>
            ) : (
              'not known, logged by hand'
            ),
          },
          {
            label: 'Made from it',
            value:
              children.length === 0
                ? 'nothing'
                : children.map((child, i) => (
                    <span key={child.id}>
                      {i > 0 && ', '}
                      <Link to={paths.drop(child.id)} className={`font-mono ${LINK}`}>
                        {formatTag(child.tag)}
                      </Link>
                    </span>
                  )),
          },
          ...(drop.note ? [{ label: 'Note', value: drop.note }] : []),
        ]}
      />
      <section className="max-w-4xl">
        <h2>History</h2>
        <ol className="m-0 mt-2 list-none border-t-2 border-ink p-0">
          {events.map((event, i) => (
            <li
              key={`${event.at} ${i}`}
              className="grid gap-x-6 border-b border-line py-2.5 sm:grid-cols-[13rem_1fr]"
            >
              <span className="text-muted">
                {time(event.at)}
                <span className="block">{event.who}</span>
              </span>
              <span>
                {event.what}
                {event.why && <span className="block text-muted">{event.why}</span>}
              </span>
            </li>
          ))}
        </ol>
      </section>
    </div>
  );
}
