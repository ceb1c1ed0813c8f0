import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { defaultEdits, planRequest, type PlanEdits } from '#shared/domain/plan-request.ts';
import { findMoneyMakers } from '#shared/domain/money-makers.ts';
import type { PartLine } from '#shared/schemas/jobs.ts';
import type { PlanningView } from '#shared/schemas/plans.ts';
import type { Station } from '#shared/schemas/yard.ts';
import { Button } from '#src/components/button.tsx';
import { Fault } from '#src/components/fault.tsx';
import { Notice } from '#src/components/notice.tsx';
import { SelectField } from '#src/components/select-field.tsx';
import { TextField } from '#src/components/text-field.tsx';
import { askPlanning, usePlanWrites } from '#src/features/plans/api/plans.ts';
import { ChooseLines } from '#src/features/plans/components/choose-lines.tsx';
import { GroupCard } from '#src/features/plans/components/group-card.tsx';
import { SolveBoard } from '#src/features/plans/components/solve-board.tsx';
import { useSolve } from '#src/features/plans/hooks/use-solve.ts';
import { ApiError, faultWords } from '#src/lib/api-error.ts';
import { countOf } from '#src/lib/formats.ts';
import { paths } from '#src/lib/paths.ts';

type NewPlanProps = {
  lines: readonly PartLine[];
  jobNames: ReadonlyMap<number, string>;
  chosenAtFirst: ReadonlySet<number>;
  stations: readonly Station[];
};

const LIMITS = [
  { value: '5000', label: '5 seconds a section' },
  { value: '20000', label: '20 seconds a section' },
  { value: '60000', label: '1 minute a section' },
];

function planName(lines: readonly PartLine[], jobNames: ReadonlyMap<number, string>): string {
  const jobs = [...new Set(lines.map(({ jobId }) => jobId))];
  return (
    jobs
      .map((id) => jobNames.get(id) ?? '')
      .filter(Boolean)
      .join(', ')
      .slice(0, 80) || 'Cut plan'
  );
}

/** Three steps on one page: what is to be cut, from which stock, and how well. A step back loses nothing. */
export function NewPlan({ lines, jobNames, chosenAtFirst, stations }: NewPlanProps) {
  const navigate = useNavigate();
  const writes = usePlanWrites();
  const [chosen, setChosen] = useState(chosenAtFirst);
  const [view, setView] = useState<PlanningView | null>(null);
  const [edits, setEdits] = useState<PlanEdits>({});
  const [stationIds, setStationIds] = useState<Readonly<Record<string, number | null>>>({});
  const [limit, setLimit] = useState('5000');
  const [name, setName] = useState('');
  const [fault, setFault] = useState<unknown>(null);
  const [busy, setBusy] = useState(false);
  const { run, start, cancel, reset } = useSolve();

  async function lookForStock() {
    setBusy(true);
    setFault(null);
    try {
      const answer = await askPlanning([...chosen]);
      setView(answer);
      // What was ticked before stays as it was; new groups come with everything ticked.
      setEdits((before) => ({
        ...defaultEdits(answer),
        ...Object.fromEntries(
          Object.entries(before).filter(([id]) => answer.groups.some((group) => group.id === id)),
        ),
      }));
      setStationIds((before) =>
        Object.fromEntries(answer.groups.map(({ id, stationId }) => [id, before[id] ?? stationId])),
      );
      setName(
        (before) =>
          before ||
          planName(
            lines.filter(({ id }) => chosen.has(id)),
            jobNames,
          ),
      );
      reset();
    } catch (error) {
      setFault(error);
    } finally {
      setBusy(false);
    }
  }

  async function save() {
    if (run.state !== 'done') return;
    setBusy(true);
    setFault(null);
    try {
      const used = [...new Set(run.request.groups.map(({ id }) => stationIds[id] ?? null))];
      const saved = await writes.save({
        name: name.trim() || 'Cut plan',
        stationId: used.length === 1 ? (used[0] ?? null) : null,
        request: run.request,
        result: run.result,
      });
      await navigate(paths.plan(saved.plan.id));
    } catch (error) {
      setFault(error);
      setBusy(false);
    }
  }

  const issues = fault instanceof ApiError ? fault.issues : [];
  const faultNotice = fault !== null && (
    <div className="my-4">
      <Fault {...faultWords(fault)} />
      {issues.length > 0 && (
        <ul className="mt-2 list-disc pl-6">
          {issues.slice(0, 12).map(({ path, message }, i) => (
            <li key={i}>
              <span className="font-mono text-sm text-muted">{path}</span> {message}
            </li>
          ))}
        </ul>
      )}
    </div>
  );

  if (!view)
    return (
      <>
        {faultNotice}
        <ChooseLines
          lines={lines}
          jobNames={jobNames}
          chosen={chosen}
          onChange={setChosen}
          onNext={() => void lookForStock()}
          busy={busy}
        />
      </>
    );

  const request = planRequest(view, edits, { seed: 1, timeLimitMs: Number(limit) });
  const makers = findMoneyMakers(request);
  if (run.state === 'running' || run.state === 'done') {
    const outcomes =
      run.state === 'done' ? new Map(run.result.groups.map(({ id, outcome }) => [id, outcome])) : undefined;
    const unplaced =
      run.state === 'done'
        ? run.result.groups
            .flatMap((group) => group.unplaced)
            .reduce((sum, { quantity }) => sum + quantity, 0)
        : 0;
    return (
      <section aria-labelledby="solving">
        <h2 id="solving" className="mt-2 mb-4">
          {run.state === 'running' ? `Planning, ${run.done} of ${run.of} done` : 'How good is it'}
        </h2>
        <SolveBoard
          groups={run.state === 'done' ? run.request.groups : request.groups}
          progress={run.progress}
          {...(outcomes ? { outcomes } : {})}
        />
        {unplaced > 0 && (
          <Notice
            tone="fault"
            className="mt-4"
            title={`${countOf(unplaced, 'piece is', 'pieces are')} not placed`}
          >
            They are longer than any stock ticked, or the stock runs out. Go back and add a longer length, or
            save the plan without them: they stay open.
          </Notice>
        )}
        {faultNotice}
        {run.state === 'running' ? (
          <Button className="mt-6" onClick={cancel}>
            Cancel
          </Button>
        ) : (
          <div className="mt-6 flex flex-wrap items-end gap-4">
            <TextField
              label="Name of the plan"
              className="w-full max-w-md"
              maxLength={80}
              value={name}
              onChange={(event) => setName(event.target.value)}
            />
            <Button variant="act" busy={busy} busyLabel="Checking and saving" onClick={() => void save()}>
              Save as draft
            </Button>
            <Button onClick={reset}>Back to the stock</Button>
          </div>
        )}
      </section>
    );
  }

  return (
    <section aria-labelledby="stock">
      <h2 id="stock" className="mt-2 mb-3">
        From which stock
      </h2>
      {run.state === 'failed' && (
        <Notice tone="fault" live className="mb-4" title="The planning stopped">
          {run.message}. Nothing is lost; try again.
        </Notice>
      )}
      {faultNotice}
      {view.left.length > 0 && (
        <Notice className="mb-4" title={`${countOf(view.left.length, 'line is', 'lines are')} left out`}>
          {[...new Set(view.left.map(({ reason }) => reason))].join(' ')} Marks:{' '}
          <span className="font-mono">
            {view.left
              .slice(0, 12)
              .map(({ mark }) => mark)
              .join(', ')}
          </span>
        </Notice>
      )}
      {view.groups.map((group) => {
        const own = edits[group.id];
        return own ? (
          <GroupCard
            key={group.id}
            group={group}
            edits={own}
            stations={stations}
            stationId={stationIds[group.id] ?? null}
            onChange={(next, stationId) => {
              setEdits({ ...edits, [group.id]: next });
              if (stationId !== undefined) setStationIds({ ...stationIds, [group.id]: stationId });
            }}
          />
        ) : null;
      })}
      {makers.length > 0 && (
        <Notice tone="fault" className="mb-4" title="A credit is above its cost">
          {makers.map(({ message }) => message).join('. ')}.
        </Notice>
      )}
      <div className="-mx-1 md:sticky md:bottom-0 flex flex-wrap items-end gap-4 border-t-2 border-ink bg-paper px-1 py-3">
        <SelectField
          label="Look for at most"
          className="w-56"
          choices={LIMITS}
          value={limit}
          onChange={(event) => setLimit(event.target.value)}
        />
        <Button
          variant="act"
          disabled={request.groups.length === 0 || makers.length > 0}
          onClick={() => void start(request)}
        >
          Plan the cuts
        </Button>
        <Button onClick={() => setView(null)}>Back to the lines</Button>
      </div>
    </section>
  );
}
