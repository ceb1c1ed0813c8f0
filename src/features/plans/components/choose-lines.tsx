import { useMemo } from 'react';
import { PLATE_FAMILIES } from '#shared/domain/section/types.ts';
import { groupBy } from '#shared/domain/group-by.ts';
import type { PartLine } from '#shared/schemas/jobs.ts';
import { Button } from '#src/components/button.tsx';
import { countOf } from '#src/lib/formats.ts';

type ChooseLinesProps = {
  lines: readonly PartLine[];
  jobNames: ReadonlyMap<number, string>;
  chosen: ReadonlySet<number>;
  onChange: (chosen: ReadonlySet<number>) => void;
  onNext: () => void;
  busy: boolean;
};

const openOf = (lines: readonly PartLine[]) =>
  lines.reduce((sum, { quantity, planned }) => sum + quantity - planned, 0);

/** Open lines by job, section and grade; a tick takes or leaves the whole group. */
export function ChooseLines({ lines, jobNames, chosen, onChange, onNext, busy }: ChooseLinesProps) {
  const jobs = useMemo(
    () =>
      [...groupBy(lines, ({ jobId }) => jobId)].map(([jobId, own]) => ({
        jobId,
        own,
        groups: [...groupBy(own, ({ stockKey, grade }) => `${stockKey}|${grade}`).values()],
      })),
    [lines],
  );
  const toggle = (members: readonly PartLine[], on: boolean) => {
    const next = new Set(chosen);
    for (const { id } of members) {
      if (on) next.add(id);
      else next.delete(id);
    }
    onChange(next);
  };
  const box = (label: string, members: readonly PartLine[], id: string) => {
    const ticked = members.filter(({ id: lineId }) => chosen.has(lineId)).length;
    return (
      <input
        type="checkbox"
        id={id}
        aria-label={label}
        className="size-5"
        checked={ticked === members.length}
        ref={(element) => {
          if (element) element.indeterminate = ticked > 0 && ticked < members.length;
        }}
        onChange={(event) => toggle(members, event.target.checked)}
      />
    );
  };
  const taken = lines.filter(({ id }) => chosen.has(id));
  return (
    <section aria-labelledby="choose">
      <h2 id="choose" className="mt-2 mb-3">
        What is to be cut
      </h2>
      {jobs.map(({ jobId, own, groups }) => (
        <fieldset key={jobId} className="mb-6 border-0 p-0">
          <legend className="flex w-full items-center gap-3 border-b-2 border-ink py-1.5 font-head text-lg font-semibold">
            {box(`All of job ${own[0]?.jobNumber ?? ''}`, own, `job-${jobId}`)}
            <label htmlFor={`job-${jobId}`}>
              Job {own[0]?.jobNumber} · {jobNames.get(jobId) ?? ''}
            </label>
          </legend>
          {groups.map((members) => {
            const [first] = members;
            if (!first) return null;
            const id = `group-${jobId}-${first.id}`;
            const plate = PLATE_FAMILIES.includes(first.family);
            return (
              <div
                key={id}
                className="grid grid-cols-[auto_minmax(0,1fr)_auto] items-center gap-x-3 border-b border-line py-2"
              >
                {plate ? (
                  <span className="w-5" />
                ) : (
                  box(`${first.section} ${first.grade} of job ${first.jobNumber}`, members, id)
                )}
                <label htmlFor={plate ? undefined : id} className="min-w-0">
                  <span className="font-mono font-bold">{first.section}</span>{' '}
                  <span className="font-mono">{first.grade || 'no grade'}</span>
                  {plate && <span className="ml-2 text-muted">plate is planned by area, not by bar</span>}
                </label>
                <span className="text-right font-mono text-[0.9375rem] whitespace-nowrap">
                  {countOf(members.length, 'line', 'lines')}, {countOf(openOf(members), 'piece', 'pieces')}
                </span>
              </div>
            );
          })}
        </fieldset>
      ))}
      <div className="-mx-1 md:sticky md:bottom-0 flex flex-wrap items-center gap-4 border-t-2 border-ink bg-paper px-1 py-3">
        <p role="status" className="font-mono">
          {countOf(taken.length, 'line', 'lines')}, {countOf(openOf(taken), 'piece', 'pieces')}
        </p>
        <Button
          variant="act"
          disabled={taken.length === 0}
          busy={busy}
          busyLabel="Looking for stock"
          onClick={onNext}
        >
          Look for stock
        </Button>
      </div>
    </section>
  );
}
