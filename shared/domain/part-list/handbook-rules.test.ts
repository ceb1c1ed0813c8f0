/** The parsing rules of the trade handbook, part 1.3, as far as they touch the reading of a list. */
import { describe, expect, it } from 'vitest';
import { formatLength } from '#shared/domain/length.ts';
import { readPartList } from '#shared/domain/part-list/read-part-list.ts';
import { NM_PER_INCH, NM_PER_MM } from '#shared/domain/units.ts';

const inches = (count: number) => count * NM_PER_INCH;

/** One row of a tab-separated list, so that quotes and commas need no care. */
function readOne(cells: { section?: string; length?: string; grade?: string; unit?: 'in' | 'mm' }) {
  const { section = 'L3x3x1/4', length = '42', grade = 'A36', unit = 'in' } = cells;
  return readPartList(`Mark\tQty\tSection\tLength\tGrade\nB-1\t2\t${section}\t${length}\t${grade}`, { unit });
}

const lineOf = (cells: Parameters<typeof readOne>[0]) => readOne(cells).lines[0];
const codesOf = (cells: Parameters<typeof readOne>[0]) => readOne(cells).problems.map(({ code }) => code);

describe('parsing rules of the trade', () => {
  it.each([
    'L4X4X3/8',
    'L4×4×3/8',
    'L4*4*3/8',
    'L 4 by 4 by 3/8',
    'L4"x4"x3/8"',
    'L4″x4″x⅜″',
    "L4''x4''x3/8''",
  ])('rule 1: separators and inch marks of any make, %s', (section) => {
    expect(lineOf({ section })?.section).toBe('L4x4x3/8');
  });

  it.each([`3'-6"`, '3′-6″', `3'-6''`, '3ft 6in', '3’ 6”'])(
    'rule 1: foot and inch marks of any make, %s',
    (length) => {
      expect(lineOf({ length })?.lengthNm).toBe(inches(42));
    },
  );

  it.each(['1-1/2', '1 1/2', '1.5', '1½', '1 1⁄2'])('rule 2: %s is one value', (length) => {
    expect(lineOf({ length })?.lengthNm).toBe(inches(1.5));
  });

  it('rule 2: 11/2 is 5.5 or a lost space, in a length and in a size', () => {
    expect(codesOf({ length: '11/2' })).toEqual(['length-lost-space']);
    expect(codesOf({ section: 'FB 11/2x4' })).toEqual(['section-fraction']);
  });

  it('rule 3: with a quantity column 2-1/2x6 is a size, not two pieces', () => {
    expect(lineOf({ section: 'FB 2-1/2x6' })).toMatchObject({ section: 'FB 2-1/2x6', quantity: 2 });
  });

  it('rule 4: 3-6 is 3 ft 6 in on a US ticket and asked about on a metric list', () => {
    expect(lineOf({ length: '3-6' })?.lengthNm).toBe(inches(42));
    expect(codesOf({ length: '3-6', unit: 'mm' })).toEqual(['length-feet-inches']);
  });

  it('rule 4: a bare 42 takes its unit from one setting of the whole list', () => {
    expect(lineOf({ length: '42' })?.lengthNm).toBe(inches(42));
    expect(lineOf({ length: '42', unit: 'mm' })?.lengthNm).toBe(42 * NM_PER_MM);
  });

  it.each(['8-Mar', '3-Aug', '2-Jan', '45359', '3/8/2024'])(
    'rule 5: %s in a size cell is never repaired',
    (section) => {
      const { lines, problems } = readOne({ section });
      expect(lines).toEqual([]);
      expect(problems).toMatchObject([{ column: 'section', code: 'section-date', read: section }]);
    },
  );

  it.each(['8-Mar', '2-Jan', '3/8/2024'])('rule 5: %s in a length cell is never repaired', (length) => {
    expect(readOne({ length }).problems).toMatchObject([
      { column: 'length', code: 'length-date', choices: [] },
    ]);
  });

  it.each(['4x4x3/8', '2x2x1/4'])('rule 6: %s has no letter, the family is never guessed', (section) => {
    const [problem] = readOne({ section }).problems;
    expect(problem?.code).toBe('section-no-family');
    expect(problem?.choices).toContain(`L${section}`);
  });

  it.each(['C6', 'W8', 'PIPE 2'])('rule 7: %s is incomplete, several weights exist', (section) => {
    const [problem] = readOne({ section }).problems;
    expect(problem?.code).toBe('section-incomplete');
    expect(problem?.choices.length).toBeGreaterThan(1);
  });

  it('rule 8: the customer’s own text stands beside the canonical form', () => {
    expect(lineOf({ section: 'ANGLE 4x4x3/8', length: `3' 6"` })).toMatchObject({
      section: 'L4x4x3/8',
      sectionText: 'ANGLE 4x4x3/8',
      lengthText: `3' 6"`,
    });
  });

  it('rule 9: stock is matched by family, dimensions and grade; pipe and round tube of one size stay apart', () => {
    const pipe = lineOf({ section: 'PIPE 3 STD', grade: 'A53B' });
    const tube = lineOf({ section: 'HSS3.500x0.216', grade: 'A500B' });
    expect(pipe).toMatchObject({ stockKey: 'PIPE 3 STD', family: 'pipe', grade: 'A53B' });
    expect(tube).toMatchObject({ stockKey: 'HSS3.500x0.216', family: 'round-tube', grade: 'A500B' });
    expect(lineOf({ grade: 'ASTM A-36' })).toMatchObject({ grade: 'A36' });
  });

  it('rule 9: MS is kept as written and remarked on', () => {
    expect(lineOf({ grade: 'MS' })).toMatchObject({
      grade: 'MS',
      remarks: ['MS is not a grade for certified work'],
    });
  });

  it('rule 12: stock goes down, pieces go to the nearest', () => {
    const style = { units: 'imperial', denominator: 16 } as const;
    expect(formatLength(6000 * NM_PER_MM, { ...style, rounding: 'down' })).toBe(`19'-8 3/16"`);
    expect(formatLength(6000 * NM_PER_MM, style)).toBe(`19'-8 1/4"`);
  });
});
