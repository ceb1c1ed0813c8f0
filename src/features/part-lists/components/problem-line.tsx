import { useState } from 'react';
import { TriangleAlert } from 'lucide-react';
import type { PartListProblem } from '#shared/domain/part-list/types.ts';
import { Button } from '#src/components/button.tsx';
import { CheckField } from '#src/components/check-field.tsx';
import { classNames } from '#src/components/class-names.ts';
import { controlLook } from '#src/components/field.tsx';
import { FIELD_WORDS, rowNumbers } from '#src/features/part-lists/hooks/list-words.ts';

type ProblemLineProps = {
  /** Id of the field, by which the next problem is found. */
  id: string;
  problem: PartListProblem;
  /** Rows with the very same problem, this one too. */
  sameRows: readonly number[];
  /** The text for this cell, in these rows. */
  onFix: (text: string, rows: readonly number[]) => void;
  onLeaveOut: (rows: readonly number[]) => void;
  /** Nothing was changed; on to the next problem. */
  onPass: () => void;
};

const LONGEST_CELL = 400;

/** One wrong cell: what was read, what is wrong, what to do, and the place to do it. */
export function ProblemLine({ id, problem, sameRows, onFix, onLeaveOut, onPass }: ProblemLineProps) {
  const { row, column, read, message, choices } = problem;
  const [text, setText] = useState(read);
  const [known, setKnown] = useState(read);
  const [everywhere, setEverywhere] = useState(false);
  if (read !== known) {
    setKnown(read);
    setText(read);
  }
  const many = sameRows.length > 1;
  const rows = many && everywhere ? sameRows : [row];
  const word = column ? FIELD_WORDS[column] : 'row';
  const onRow = rows.length > 1 ? `on ${rows.length} rows` : `on row ${row}`;

  return (
    <form
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        if (text.trim() === read.trim()) onPass();
        else onFix(text, rows);
      }}
    >
      <p className="flex gap-1.5">
        <TriangleAlert aria-hidden size={18} className="mt-0.5 shrink-0 text-oxide" />
        <span id={`${id}-message`}>{message}</span>
      </p>
      {column && (
        <div className="mt-2 flex flex-wrap items-end gap-2">
          <div className="flex min-w-0 gap-2 max-sm:w-full sm:w-88">
            <div className="min-w-0 flex-1">
              <label htmlFor={id} className="block font-head text-base leading-snug font-semibold text-muted">
                {word[0]?.toUpperCase()}
                {word.slice(1)}
                <span className="sr-only"> of row {row}</span>
              </label>
              <input
                id={id}
                type="text"
                autoComplete="off"
                autoCapitalize="off"
                spellCheck={false}
                maxLength={LONGEST_CELL}
                aria-describedby={`${id}-message`}
                aria-invalid
                value={text}
                onChange={(event) => setText(event.target.value)}
                onFocus={(event) => event.target.select()}
                className={classNames(controlLook('box', true, true), 'scroll-mt-44')}
              />
            </div>
            <Button type="submit" className="self-end" aria-label={`Use this ${word} ${onRow}`}>
              Use
            </Button>
          </div>
          {choices.length > 0 && <span className="self-end pb-2.5 text-muted max-lg:hidden">or</span>}
          {choices.map((choice) => (
            <Button
              key={choice}
              className="font-mono! text-base! font-medium!"
              aria-label={`Use ${choice} as ${word} ${onRow}`}
              onClick={() => onFix(choice, rows)}
            >
              {choice}
            </Button>
          ))}
        </div>
      )}
      {many && (
        <CheckField
          label={`The same on all ${sameRows.length} rows that read so: ${rowNumbers(sameRows, 8)}`}
          checked={everywhere}
          onChange={(event) => setEverywhere(event.target.checked)}
        />
      )}
      {many && everywhere && (
        <Button size="small" onClick={() => onLeaveOut(sameRows)}>
          Leave out these {sameRows.length} rows
        </Button>
      )}
    </form>
  );
}
