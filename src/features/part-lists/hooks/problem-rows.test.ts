import { describe, expect, it } from 'vitest';
import type { PartListProblem, PartListReading } from '#shared/domain/part-list/types.ts';
import {
  nextProblem,
  problemKey,
  problemRows,
  rowsBySameness,
} from '#src/features/part-lists/hooks/problem-rows.ts';

function problem(
  row: number,
  column: PartListProblem['column'],
  read: string,
  code = 'bad',
): PartListProblem {
  return { row, column, read, code, message: `Read ${read}.`, choices: [] };
}

const reading: PartListReading = {
  lines: [],
  problems: [
    problem(7, 'section', '4x4x3/8', 'section-no-family'),
    problem(3, 'mark', ''),
    problem(3, 'section', '4x4x3/8', 'section-no-family'),
    problem(9, 'section', '8-Mar', 'section-date'),
  ],
  mapping: { mark: 0, section: 1 },
  unit: 'in',
  unitFrom: 'default',
  headingRow: 1,
  columns: [],
  ignored: [],
  rows: [
    { row: 3, cells: ['', '4x4x3/8'] },
    { row: 5, cells: ['B-2 ', 'C6'] },
    { row: 7, cells: ['B-3', '4x4x3/8'] },
    { row: 9, cells: ['B-4', '8-Mar'] },
  ],
  encoding: 'utf-8',
  separator: ',',
  fatal: null,
};

describe('problem rows', () => {
  const rows = problemRows(reading, { fixes: { 5: { section: 'C6x8.2' } }, skips: [9] });

  it('stand in the order of the file, settled ones in their place', () => {
    expect(rows.map(({ row, state }) => `${row} ${state}`)).toEqual([
      '3 open',
      '5 fixed',
      '7 open',
      '9 left-out',
    ]);
  });

  it('say what stood in the file and what stands there now', () => {
    expect(rows[1]).toMatchObject({
      mark: 'B-2',
      problems: [],
      fixes: [{ field: 'section', was: 'C6', now: 'C6x8.2' }],
    });
  });

  it('hold every problem of a row together', () => {
    expect(rows[0]?.problems.map(({ column }) => column)).toEqual(['mark', 'section']);
    expect(rows[0]?.wrongCells).toEqual([0, 1]);
    expect(rows[1]?.wrongCells).toEqual([]);
  });

  it('need nobody where nothing is wrong', () => {
    expect(problemRows({ ...reading, problems: [] }, {})).toEqual([]);
  });
});

describe('the same on many rows', () => {
  const sameRows = rowsBySameness(reading.problems);

  it('is found by column, words and fault', () => {
    expect(sameRows(problem(7, 'section', '4x4x3/8', 'section-no-family'))).toEqual([7, 3]);
    expect(sameRows(problem(9, 'section', '8-Mar', 'section-date'))).toEqual([9]);
  });

  it('never joins marks', () => {
    const blank = [problem(3, 'mark', ''), problem(4, 'mark', '')];
    expect(rowsBySameness(blank)(problem(3, 'mark', ''))).toEqual([3]);
  });
});

describe('the next problem', () => {
  const rows = problemRows(reading, {});
  it('goes on in the same row, then down the file, then from the top', () => {
    expect(nextProblem(rows, null)).toBe(problemKey(3, 'mark'));
    expect(nextProblem(rows, { row: 3, key: problemKey(3, 'mark') })).toBe(problemKey(3, 'section'));
    expect(nextProblem(rows, { row: 5, key: problemKey(5, 'section') })).toBe(problemKey(7, 'section'));
    expect(nextProblem(rows, { row: 9, key: problemKey(9, 'length') })).toBe(problemKey(9, 'section'));
    expect(nextProblem(rows, { row: 12, key: problemKey(12, 'length') })).toBe(problemKey(3, 'mark'));
  });
  it('is none when all is settled', () => {
    expect(nextProblem([], { row: 9, key: problemKey(9, 'section') })).toBeNull();
  });
});
