import { describe, expect, it } from 'vitest';
import type { PartLine } from '#shared/schemas/jobs.ts';
import { filterLines, readLineFilter } from '#src/features/part-lists/hooks/filter-lines.ts';

function line(
  mark: string,
  section: string,
  sectionText: string,
  counts: [number, number, number],
): PartLine {
  const [quantity, planned, cut] = counts;
  return { mark, section, sectionText, quantity, planned, cut } as PartLine;
}

const lines = [
  line('B-104', 'L3x3x1/4', 'L 3 x 3 x 1/4', [12, 0, 0]),
  line('B-107', 'L3x3x1/4', 'angle 3x3x1/4', [6, 6, 2]),
  line('H-2', 'FB 3/8x4', 'flat 4x3/8', [4, 4, 4]),
];
const marks = (section: string, mark: string, state: string) =>
  filterLines(
    lines,
    readLineFilter((key) => ({ section, mark, state })[key] ?? ''),
  ).map((each) => each.mark);

describe('finding lines', () => {
  it('takes the section in the shop’s or the customer’s spelling', () => {
    expect(marks('l3×3', '', '')).toEqual(['B-104', 'B-107']);
    expect(marks('flat', '', '')).toEqual(['H-2']);
    expect(marks('3 x 3 x 1/4', '', '')).toEqual(['B-104', 'B-107']);
  });
  it('takes part of a mark', () => {
    expect(marks('', 'b-1', '')).toEqual(['B-104', 'B-107']);
  });
  it('tells open, planned and cut apart, and takes no other word', () => {
    expect(marks('', '', 'open')).toEqual(['B-104']);
    expect(marks('', '', 'planned')).toEqual(['B-107']);
    expect(marks('', '', 'cut')).toEqual(['H-2']);
    expect(marks('', '', 'lost')).toHaveLength(3);
  });
});
