import { useEffect, useMemo, useRef, useState, type ReactNode } from 'react';
import { ChevronRight } from 'lucide-react';
import type { PartListReading } from '#shared/domain/part-list/types.ts';
import { Fault } from '#src/components/fault.tsx';
import { Figure, FigureRow } from '#src/components/figure-row.tsx';
import { Notice } from '#src/components/notice.tsx';
import { useFormats } from '#src/lib/formats.ts';
import { wholeNumber } from '#src/lib/whole-number.ts';
import { ColumnMap } from '#src/features/part-lists/components/column-map.tsx';
import { FileFacts } from '#src/features/part-lists/components/file-facts.tsx';
import { GoodLines } from '#src/features/part-lists/components/good-lines.tsx';
import { ListUnit } from '#src/features/part-lists/components/list-unit.tsx';
import { ProblemHead } from '#src/features/part-lists/components/problem-head.tsx';
import { ProblemList } from '#src/features/part-lists/components/problem-list.tsx';
import { RowTape } from '#src/features/part-lists/components/row-tape.tsx';
import { SaveList } from '#src/features/part-lists/components/save-list.tsx';
import { Section } from '#src/features/part-lists/components/section.tsx';
import { PROBLEM_ID, focusNextProblem } from '#src/features/part-lists/hooks/problem-focus.ts';
import { columnsInWords } from '#src/features/part-lists/hooks/list-words.ts';
import { listTotals } from '#src/features/part-lists/hooks/list-totals.ts';
import {
  isCurrent,
  openRows,
  type Source,
  type UploadDraft,
  type UploadEvent,
} from '#src/features/part-lists/hooks/upload-draft.ts';

type ListReviewProps = {
  draft: UploadDraft;
  source: Source;
  reading: PartListReading;
  dispatch: (event: UploadEvent) => void;
  retry: () => void;
  /** Button to take another file. */
  another: ReactNode;
  saving: boolean;
  saveError: unknown;
  onSave: () => void;
};

/** The list as it was read, all on one page: what was found, what needs a person, what is good, and saving it. */
export function ListReview({
  draft,
  source,
  reading,
  dispatch,
  retry,
  another,
  saving,
  saveError,
  onSave,
}: ListReviewProps) {
  const { mass } = useFormats();
  const saveButton = useRef<HTMLButtonElement>(null);
  const lastProblem = useRef<Element>(null);
  const unsure = reading.columns.some(({ sure, samples }) => !sure && samples.length > 0);
  const totals = useMemo(() => listTotals(reading.lines), [reading]);
  const open = openRows(reading);
  const good = reading.lines.length;
  const wholeFile = reading.problems.filter(({ row }) => row < 1);
  const current = isCurrent(draft);
  // Opened where a person must look, closed by nobody but the person.
  const [columnsOpen, setColumnsOpen] = useState(unsure || reading.fatal !== null);
  const [finished, setFinished] = useState(0);
  useEffect(() => {
    if (finished > 0) saveButton.current?.focus();
  }, [finished]);

  return (
    <div className="grid gap-9">
      <section>
        <div className="flex flex-wrap items-start justify-between gap-4">
          {reading.fatal ? (
            <h2>What was found</h2>
          ) : (
            <FigureRow>
              <Figure
                value={wholeNumber(good + open)}
                label={good + open === 1 ? 'row with a part' : 'rows with parts'}
              />
              <Figure value={wholeNumber(good)} label={good === 1 ? 'good line' : 'good lines'} />
              <Figure value={wholeNumber(totals.pieces)} label="pieces" />
              <Figure value={totals.sections} label={totals.sections === 1 ? 'section' : 'sections'} />
              <Figure value={mass(totals.massMg)} label="of steel" />
            </FigureRow>
          )}
          {another}
        </div>
        {reading.fatal ? (
          <div className="mt-4">
            <FileFacts source={source} reading={reading} />
          </div>
        ) : (
          <div className="mt-6 grid gap-6 xl:grid-cols-[minmax(0,30rem)_minmax(0,1fr)]">
            <ListUnit reading={reading} onUnit={(unit) => dispatch({ type: 'unit-chosen', unit })} />
            <FileFacts source={source} reading={reading} />
          </div>
        )}
      </section>
      {reading.fatal && (
        <Notice tone="fault" live title="The parts are not found yet">
          {reading.fatal.message}
        </Notice>
      )}
      {draft.fault && <Fault title="The list was not read again" message={draft.fault} onRetry={retry} />}
      <details
        open={columnsOpen}
        onToggle={(event) => setColumnsOpen(event.currentTarget.open)}
        className="group border-y border-line py-1"
      >
        <summary className="flex min-h-11 list-none items-center gap-2 [&::-webkit-details-marker]:hidden">
          <ChevronRight
            aria-hidden
            size={20}
            className="shrink-0 transition-transform group-open:rotate-90 motion-reduce:transition-none"
          />
          <h2>Columns</h2>
          <span className="ml-2 text-muted">{columnsInWords(reading.columns)}</span>
        </summary>
        <div className="pt-1 pb-4">
          <ColumnMap
            columns={reading.columns}
            complete={reading.fatal === null}
            onColumn={(index, field) => dispatch({ type: 'column-chosen', index, field })}
            onConfirm={() => dispatch({ type: 'columns-confirmed' })}
          />
        </div>
      </details>
      {!reading.fatal && (
        <>
          <section
            onFocus={({ target }) => {
              if (target.id.startsWith(PROBLEM_ID)) lastProblem.current = target;
            }}
          >
            <ProblemHead
              good={good}
              open={open}
              current={current}
              onNext={() => focusNextProblem(lastProblem.current)}
            />
            <div className="mt-1">
              <RowTape good={good} open={open} />
            </div>
            {wholeFile.map(({ code, message }) => (
              <Notice key={code} tone="fault" className="mt-4">
                {message}
              </Notice>
            ))}
            <ProblemList
              draft={draft}
              dispatch={dispatch}
              onSettled={() => setFinished((times) => times + 1)}
            />
          </section>
          <Section title="Save">
            <SaveList
              draft={draft}
              dispatch={dispatch}
              saving={saving}
              error={saveError}
              onSave={onSave}
              saveButton={saveButton}
            />
          </Section>
          {good > 0 && (
            <Section title="Good lines" sub="As they will stand on the list.">
              <GoodLines lines={reading.lines} />
            </Section>
          )}
        </>
      )}
    </div>
  );
}
