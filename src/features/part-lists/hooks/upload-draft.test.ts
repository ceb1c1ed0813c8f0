import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { PART_FIELDS, type PartListChoices, type PartListReading } from '#shared/domain/part-list/types.ts';
import { LENGTH_UNITS } from '#shared/domain/units.ts';
import { PartListUpload } from '#shared/schemas/jobs.ts';
import { fixCells, leaveOut, takeBack, unfixRow } from '#src/features/part-lists/hooks/choices.ts';
import {
  BLANK_DRAFT,
  hasDecisions,
  nameFromFile,
  uploadDetails,
  uploadDraft,
  whatIsMissing,
  type Source,
  type UploadDraft,
  type UploadEvent,
} from '#src/features/part-lists/hooks/upload-draft.ts';

const source: Source = { kind: 'file', name: 'stairs B.csv', bytes: new Blob(['Mark,Qty\n']) };
const otherSource: Source = { kind: 'file', name: 'rail.csv', bytes: new Blob(['Mark\n']) };

/** A reading that is good unless told otherwise. */
function readingWith(changes: Partial<PartListReading> = {}): PartListReading {
  const line = { row: 2, mark: 'B-1' } as PartListReading['lines'][number];
  return {
    lines: [line],
    problems: [],
    mapping: { mark: 0, quantity: 1, section: 2, length: 3 },
    unit: 'in',
    unitFrom: 'heading',
    headingRow: 1,
    columns: [],
    ignored: [],
    rows: [],
    encoding: 'utf-8',
    separator: ',',
    fatal: null,
    ...changes,
  };
}

function problemAt(row: number) {
  return {
    row,
    column: 'length' as const,
    read: '',
    code: 'length-blank',
    message: 'No length.',
    choices: [],
  };
}

function play(events: readonly UploadEvent[], from: UploadDraft = BLANK_DRAFT): UploadDraft {
  return events.reduce(uploadDraft, from);
}

const chosen = play([{ type: 'source-chosen', source }]);
const read = (draft: UploadDraft, reading = readingWith()) =>
  uploadDraft(draft, { type: 'read', source, of: draft.choices, reading });

const field = fc.constantFrom(...PART_FIELDS);
const row = fc.integer({ min: 2, max: 6 });
const cell = fc.record({ row, field, text: fc.string({ maxLength: 6 }) });
const step: fc.Arbitrary<(choices: PartListChoices) => PartListChoices> = fc.oneof(
  cell.map((fix) => (choices: PartListChoices) => fixCells(choices, [fix])),
  row.map((at) => (choices: PartListChoices) => unfixRow(choices, at)),
  row.map((at) => (choices: PartListChoices) => leaveOut(choices, [at])),
  row.map((at) => (choices: PartListChoices) => takeBack(choices, at)),
);

describe('choices', () => {
  it('are the same whatever the order of fixes to different cells and rows left out', () => {
    const fixes = fc.uniqueArray(cell, { selector: (fix) => `${fix.row} ${fix.field}`, maxLength: 12 });
    const skips = fc.uniqueArray(row, { maxLength: 5 });
    const order = fc.tuple(fixes, skips).chain(([cells, rows]) => {
      const steps = [
        ...cells.map((fix) => (choices: PartListChoices) => fixCells(choices, [fix])),
        ...rows.map((at) => (choices: PartListChoices) => leaveOut(choices, [at])),
      ];
      return fc.tuple(
        fc.constant(steps),
        fc.shuffledSubarray(steps, { minLength: steps.length, maxLength: steps.length }),
      );
    });
    fc.assert(
      fc.property(order, ([one, other]) => {
        const run = (steps: typeof one) => steps.reduce<PartListChoices>((choices, act) => act(choices), {});
        expect(JSON.stringify(run(other))).toBe(JSON.stringify(run(one)));
      }),
    );
  });

  it('come back to what they were when a fix or a row left out is taken back', () => {
    fc.assert(
      fc.property(fc.array(step, { maxLength: 15 }), cell, (steps, fix) => {
        const before = steps.reduce<PartListChoices>((choices, act) => act(choices), {});
        const clean = unfixRow(takeBack(before, fix.row), fix.row);
        expect(unfixRow(fixCells(clean, [fix]), fix.row)).toEqual(clean);
        expect(takeBack(leaveOut(clean, [fix.row]), fix.row)).toEqual(clean);
      }),
    );
  });

  it('leaving a row out twice is leaving it out once, and its fixes wait for it', () => {
    const fixed = fixCells({}, [{ row: 4, field: 'length', text: '42"' }]);
    const out = leaveOut(leaveOut(fixed, [4]), [4, 2]);
    expect(out).toEqual({ fixes: { 4: { length: '42"' } }, skips: [2, 4] });
    expect(takeBack(takeBack(out, 4), 2)).toEqual(fixed);
  });
});

describe('columns', () => {
  it('move a field to its new column and keep what was read for the others', () => {
    const draft = uploadDraft(read(chosen), { type: 'column-chosen', index: 1, field: 'length' });
    expect(draft.choices.mapping).toEqual({ mark: 0, section: 2, length: 1 });
  });

  it('take a split length apart when one column holds the length', () => {
    const split = read(chosen, readingWith({ mapping: { mark: 0, feet: 2, inches: 3 } }));
    const draft = uploadDraft(split, { type: 'column-chosen', index: 4, field: 'length' });
    expect(draft.choices.mapping).toEqual({ mark: 0, length: 4 });
  });

  it('are free when the person says a column is not used', () => {
    const draft = uploadDraft(read(chosen), { type: 'column-chosen', index: 0, field: null });
    expect(draft.choices.mapping).toEqual({ quantity: 1, section: 2, length: 3 });
  });
});

describe('saving', () => {
  const anyEvent: fc.Arbitrary<UploadEvent> = fc.oneof(
    fc.array(cell, { minLength: 1, maxLength: 3 }).map((cells) => ({ type: 'cells-fixed' as const, cells })),
    row.map((at) => ({ type: 'row-unfixed' as const, row: at })),
    row.map((at) => ({ type: 'rows-left-out' as const, rows: [at] })),
    row.map((at) => ({ type: 'row-taken-back' as const, row: at })),
    fc.constantFrom(...LENGTH_UNITS, null).map((unit) => ({ type: 'unit-chosen' as const, unit })),
    fc
      .tuple(fc.nat({ max: 6 }), fc.option(field))
      .map(([index, chosenField]) => ({ type: 'column-chosen' as const, index, field: chosenField })),
    fc.constant({ type: 'columns-confirmed' as const }),
    fc.constantFrom('Stairs', '  ', '').map((name) => ({ type: 'name-typed' as const, name })),
  );

  it('sends exactly the choices the preview was read with, or nothing', () => {
    fc.assert(
      fc.property(
        fc.array(fc.tuple(anyEvent, fc.nat({ max: 3 }), fc.boolean()), { maxLength: 20 }),
        (steps) => {
          let draft = read(chosen);
          const seen: PartListChoices[] = [draft.choices];
          let shown = draft.choices;
          for (const [event, back, good] of steps) {
            draft = uploadDraft(draft, event);
            seen.push(draft.choices);
            // Answers of the worker may come late: about the newest choices or older ones.
            const of = seen[Math.max(0, seen.length - 1 - back)] ?? draft.choices;
            const reading = readingWith(good ? {} : { problems: [problemAt(3)] });
            draft = uploadDraft(draft, { type: 'read', source, of, reading });
            shown = of;
            const details = uploadDetails(draft);
            if (!details) continue;
            expect(details.choices).toEqual(shown);
            expect(details.choices).toEqual(draft.choices);
            expect(draft.preview?.reading.problems).toEqual([]);
            expect(PartListUpload.parse(JSON.parse(JSON.stringify(details)))).toEqual(details);
          }
        },
      ),
    );
  });

  it('waits for every row, for a current reading, for a line and for a name', () => {
    const open = read(chosen, readingWith({ problems: [problemAt(3), problemAt(3), problemAt(9)] }));
    expect(whatIsMissing(open)).toBe('2 rows still need you.');
    const fixing = uploadDraft(open, { type: 'rows-left-out', rows: [3, 9] });
    expect(whatIsMissing(fixing)).toBe('The list is being read again.');
    expect(whatIsMissing(read(fixing, readingWith({ lines: [] })))).toBe(
      'No line is left: every row is left out.',
    );
    const good = read(fixing);
    expect(whatIsMissing(good)).toBeNull();
    expect(whatIsMissing(uploadDraft(good, { type: 'name-typed', name: ' ' }))).toBe('Give the list a name.');
    expect(uploadDetails(good)).toEqual({ name: 'stairs B', revision: '', choices: { skips: [3, 9] } });
  });

  it('is refused for a file that cannot be read', () => {
    const fatal = { code: 'file-spreadsheet', message: 'This is a spreadsheet.' };
    expect(uploadDetails(read(chosen, readingWith({ fatal, lines: [] })))).toBeNull();
  });

  it('takes no answer about a file that was put away', () => {
    const draft = uploadDraft(chosen, { type: 'source-chosen', source: otherSource });
    const late = uploadDraft(draft, { type: 'read', source, of: {}, reading: readingWith() });
    expect(late).toBe(draft);
  });
});

describe('what would be lost', () => {
  it('is nothing for a file just read, everything that was typed or pasted otherwise', () => {
    expect(hasDecisions(chosen)).toBe(false);
    expect(hasDecisions(uploadDraft(chosen, { type: 'revision-typed', revision: 'B' }))).toBe(true);
    expect(hasDecisions(uploadDraft(chosen, { type: 'rows-left-out', rows: [4] }))).toBe(true);
    const pasted = play([{ type: 'source-chosen', source: { ...source, kind: 'paste' } }]);
    expect(hasDecisions(pasted)).toBe(true);
  });

  it('names a list after its file', () => {
    expect(nameFromFile('mezzanine stairs, rev 2.csv')).toBe('mezzanine stairs, rev 2');
    expect(nameFromFile('.csv')).toBe('.csv');
    expect(nameFromFile(`${'x'.repeat(120)}.txt`)).toHaveLength(80);
  });
});
