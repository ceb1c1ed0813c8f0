// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen, within } from '@testing-library/react';
import { useEffect, useReducer } from 'react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { readPartList } from '#shared/domain/part-list/read-part-list.ts';
import { ProblemList } from '#src/features/part-lists/components/problem-list.tsx';
import {
  BLANK_DRAFT,
  uploadDetails,
  uploadDraft,
  type Source,
  type UploadDraft,
} from '#src/features/part-lists/hooks/upload-draft.ts';

afterEach(cleanup);

const LIST = [
  'Mark,Qty,Section,Length',
  `B-1,2,L3x3x1/4,"6'-0"""`,
  `B-2,4,4x4x3/8,"5'-1"""`,
  `,1,C6x8.2,"3'-2"""`,
  `B-4,2,4x4x3/8,see drawing`,
  `B-5,0,L3x3x1/4,"2'-0"""`,
].join('\n');

const source: Source = { kind: 'file', name: 'stairs.csv', bytes: new Blob([LIST]) };
const onSettled = vi.fn();
let draft: UploadDraft = BLANK_DRAFT;

/** The page's own loop, read in place instead of in a worker. */
function Mending() {
  const [now, dispatch] = useReducer(
    uploadDraft,
    uploadDraft(BLANK_DRAFT, { type: 'source-chosen', source }),
  );
  useEffect(() => {
    const reading = readPartList(LIST, now.choices);
    dispatch({ type: 'read', source, of: now.choices, reading });
  }, [now.choices]);
  useEffect(() => {
    draft = now;
  });
  return <ProblemList draft={now} dispatch={dispatch} onSettled={onSettled} />;
}

function open() {
  onSettled.mockClear();
  render(<Mending />);
}
const rows = () => screen.getAllByRole('listitem').map((item) => item.querySelector('h3')?.textContent ?? '');
const card = (row: number) => {
  const item = screen
    .getAllByRole('listitem')
    .find((each) => each.querySelector('h3')?.textContent?.startsWith(`Row ${row}`));
  if (!item) throw new Error(`row ${row} is not shown`);
  return within(item);
};
const field = (row: number, word: string) => screen.getByLabelText<HTMLInputElement>(`${word} of row ${row}`);
function enter(input: HTMLInputElement, text: string) {
  input.focus();
  fireEvent.change(input, { target: { value: text } });
  if (input.form) fireEvent.submit(input.form);
}

describe('rows that need a person', () => {
  it('stand there all at once, with row, mark, what was read and what to do', () => {
    open();
    expect(rows()).toEqual(['Row 3B-2', 'Row 4no mark', 'Row 5B-4', 'Row 6B-5']);
    expect(field(3, 'Section').value).toBe('4x4x3/8');
    expect(field(3, 'Section').getAttribute('aria-invalid')).toBe('true');
    expect(card(4).getByText('No mark is given. Type the mark that goes on the piece.')).toBeTruthy();
    expect(card(5).getAllByRole('textbox')).toHaveLength(2);
  });

  it('go good by Enter, and the next one has the focus', () => {
    open();
    enter(field(4, 'Mark'), 'B-3');
    expect(card(4).getAllByText('B-3')).toHaveLength(2);
    expect(draft.preview?.reading.lines.map(({ mark }) => mark)).toEqual(['B-1', 'B-3']);
    expect(document.activeElement).toBe(field(5, 'Section'));
  });

  it('keep the focus and say what is wrong now while they are still wrong', () => {
    open();
    enter(field(6, 'Quantity'), '2.5');
    expect(document.activeElement).toBe(field(6, 'Quantity'));
    expect(field(6, 'Quantity').value).toBe('2.5');
    expect(card(6).getByText(/pieces are counted whole/)).toBeTruthy();
  });

  it('are passed by Enter when nothing was typed', () => {
    open();
    enter(field(3, 'Section'), '4x4x3/8');
    expect(draft.choices).toEqual({});
    expect(document.activeElement).toBe(field(4, 'Mark'));
  });

  it('take one of the readings offered, on this row alone unless told otherwise', () => {
    open();
    fireEvent.click(card(3).getByRole('button', { name: 'Use L4x4x3/8 as section on row 3' }));
    expect(draft.choices.fixes).toEqual({ 3: { section: 'L4x4x3/8' } });
    expect(field(5, 'Section').value).toBe('4x4x3/8');
  });

  it('take the same answer on every row that reads the same', () => {
    open();
    fireEvent.click(card(3).getByRole('checkbox', { name: /The same on all 2 rows that read so: 3, 5/ }));
    fireEvent.click(card(3).getByRole('button', { name: 'Use L4x4x3/8 as section on 2 rows' }));
    expect(draft.choices.fixes).toEqual({ 3: { section: 'L4x4x3/8' }, 5: { section: 'L4x4x3/8' } });
    expect(card(5).getAllByRole('textbox')).toHaveLength(1);
  });

  it('can be left out and taken back in their place', () => {
    open();
    fireEvent.click(screen.getByRole('button', { name: 'Leave out row 5, mark B-4' }));
    expect(rows()).toEqual(['Row 3B-2', 'Row 4no mark', 'Row 5B-4', 'Row 6B-5']);
    expect(card(5).getByText('left out; it will not be on the list')).toBeTruthy();
    fireEvent.click(screen.getByRole('button', { name: 'Take back row 5, mark B-4' }));
    expect(card(5).getAllByRole('textbox')).toHaveLength(2);
    expect(draft.choices).toEqual({});
  });

  it('lead on to saving when the last one is settled', () => {
    open();
    enter(field(4, 'Mark'), 'B-3');
    enter(field(3, 'Section'), 'HSS4x4x3/8');
    fireEvent.click(screen.getByRole('button', { name: 'Leave out row 5, mark B-4' }));
    expect(onSettled).not.toHaveBeenCalled();
    enter(field(6, 'Quantity'), '3');
    expect(onSettled).toHaveBeenCalledTimes(1);
    expect(uploadDetails(draft)).toEqual({
      name: 'stairs',
      revision: '',
      choices: {
        fixes: { 3: { section: 'HSS4x4x3/8' }, 4: { mark: 'B-3' }, 6: { quantity: '3' } },
        skips: [5],
      },
    });
  });
});
