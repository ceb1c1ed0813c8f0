import { readFileSync } from 'node:fs';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formatLength, parseLength } from '#shared/domain/length.ts';
import { pieceMassMg } from '#shared/domain/mass.ts';
import { readPartList } from '#shared/domain/part-list/read-part-list.ts';
import type { PartListReading } from '#shared/domain/part-list/types.ts';
import { sectionByName } from '#shared/domain/section/section-by-name.ts';
import { NM_PER_FOOT, NM_PER_INCH, NM_PER_MM } from '#shared/domain/units.ts';

const fixture = (name: string) => readFileSync(new URL(`../../../fixtures/csv/${name}`, import.meta.url));
const inches = (count: number) => count * NM_PER_INCH;
const told = (reading: PartListReading) =>
  reading.problems.map(({ row, column, code }) => [row, column, code]);
const list = (...rows: string[]) => readPartList(rows.join('\n'), {});

describe('mixed-300.csv: a US list with ten bad rows', () => {
  const reading = readPartList(fixture('mixed-300.csv'), {});

  it('shows all ten bad rows at once, each with its row, column and words', () => {
    expect(told(reading)).toEqual([
      [17, 'mark', 'mark-missing'],
      [46, 'section', 'section-fraction'],
      [73, 'section', 'section-date'],
      [101, 'section', 'section-no-family'],
      [128, 'section', 'section-incomplete'],
      [160, 'quantity', 'quantity-zero'],
      [189, 'length', 'length-unreadable'],
      [214, 'quantity', 'quantity-not-whole'],
      [247, 'section', 'section-unknown'],
      [279, 'length', 'length-blank'],
    ]);
    for (const problem of reading.problems) expect(problem.message).toMatch(/\w.*[.]$/);
  });

  it('reads the other 290 rows into a dozen sections', () => {
    expect(reading.lines).toHaveLength(290);
    expect([...new Set(reading.lines.map(({ section }) => section))].sort()).toEqual([
      'C6x8.2',
      'FB 1/2x6',
      'FB 3/8x4',
      'HSS2x2x3/16',
      'HSS4x2x1/4',
      'L2x2x1/4',
      'L3x3x1/4',
      'L4x4x3/8',
      'PIPE 2 STD',
      'RB 3/4',
      'SQ 1/2',
      'W8x18',
    ]);
    expect(reading).toMatchObject({
      unit: 'in',
      unitFrom: 'cells',
      headingRow: 1,
      separator: ',',
      fatal: null,
    });
    expect(reading.columns.every(({ sure }) => sure)).toBe(true);
  });

  it('every length fits the stock the shop buys: 40 ft beams, 20 ft of the rest', () => {
    const tooLong = reading.lines.filter(
      ({ section, lengthNm }) => lengthNm > (section === 'W8x18' ? 40 : 20) * NM_PER_FOOT,
    );
    expect(tooLong).toEqual([]);
  });

  it('weighs each piece by its section and exact length', () => {
    for (const line of reading.lines) {
      const section = sectionByName(line.section);
      expect(section && pieceMassMg(section, line.lengthNm)).toBe(line.pieceMassMg);
    }
    expect(reading.lines[0]).toMatchObject({ row: 2, mark: 'PF01-1', section: 'C6x8.2', grade: 'A36' });
  });

  it('fixes and left-out rows leave no problem and lose no row', () => {
    const fixed = readPartList(fixture('mixed-300.csv'), {
      fixes: {
        17: { mark: 'ST02-10' },
        46: { section: 'FB 1-1/2x4' },
        73: { section: 'FB 3/8x4' },
        101: { section: 'L4x4x3/8' },
        128: { section: 'C6x8.2' },
        189: { length: `6'-2"` },
        214: { quantity: '2' },
        279: { length: '42' },
      },
      skips: [160, 247],
    });
    expect(fixed.problems).toEqual([]);
    expect(fixed.lines).toHaveLength(298);
    expect(fixed.ignored.filter(({ kind }) => kind === 'skipped').map(({ row }) => row)).toEqual([160, 247]);
    const line = fixed.lines.find(({ row }) => row === 73);
    expect(line).toMatchObject({ section: 'FB 3/8x4', sectionText: '8-Mar' });
    expect(fixed.rows).toEqual(reading.rows);
  });

  it('reads the same twice', () => {
    expect(readPartList(fixture('mixed-300.csv'), {})).toEqual(reading);
  });
});

describe('the other files of the shop', () => {
  it('metric-semicolon-1252.csv: decimal commas, accents, millimetres by the heading', () => {
    const reading = readPartList(fixture('metric-semicolon-1252.csv'), {});
    expect(reading).toMatchObject({
      encoding: 'windows-1252',
      separator: ';',
      unit: 'mm',
      unitFrom: 'heading',
      headingRow: 2,
    });
    expect(told(reading)).toEqual([[11, 'length', 'length-feet-inches']]);
    expect(reading.lines).toHaveLength(35);
    expect(reading.columns.map(({ heading }) => heading)).toContain('Stück');
    for (const line of reading.lines) {
      const written = line.lengthText.replace('.', '').replace(',', '.');
      expect(line.lengthNm).toBe(Math.round(Number(written) * NM_PER_MM));
    }
  });

  it('tabs-utf16.csv: UTF-16, tabs, primes and single-glyph fractions', () => {
    const reading = readPartList(fixture('tabs-utf16.csv'), {});
    expect(reading).toMatchObject({ encoding: 'utf-16le', separator: '\t', unit: 'in', headingRow: 1 });
    expect(told(reading)).toEqual([[13, 'quantity', 'quantity-unreadable']]);
    expect(reading.lines).toHaveLength(23);
    expect(reading.lines.some(({ lengthText }) => /[½¼¾⅜]/.test(lengthText))).toBe(true);
  });

  it('split-feet-inches.csv: titles, units row, shape and size, feet and inches, total', () => {
    const reading = readPartList(fixture('split-feet-inches.csv'), {});
    expect(reading.mapping).toMatchObject({ mark: 1, quantity: 2, section: 3, feet: 5, inches: 6 });
    expect(reading.headingRow).toBe(4);
    expect(told(reading)).toEqual([
      [14, 'inches', 'length-inches-over'],
      [19, 'inches', 'length-date'],
    ]);
    expect(reading.lines).toHaveLength(18);
    expect(reading.lines[0]).toMatchObject({
      row: 6,
      mark: 'M1',
      section: 'FB 3/8x4',
      sectionText: 'FB 3/8x4',
    });
    expect(reading.lines[0]?.lengthNm).toBe(inches(11 * 12 + 9.625));
    expect(reading.ignored.filter(({ kind }) => kind === 'total').map(({ row }) => row)).toEqual([27]);
    expect(reading.ignored.filter(({ kind }) => kind === 'blank').map(({ row }) => row)).toEqual([3, 16, 28]);
  });

  it('no-headings.csv: columns told by their cells, for a person to confirm', () => {
    const reading = readPartList(fixture('no-headings.csv'), {});
    expect(reading).toMatchObject({ headingRow: null, separator: '|', problems: [], fatal: null });
    expect(reading.mapping).toEqual({ mark: 0, quantity: 1, section: 2, length: 3, grade: 4 });
    expect(reading.columns.every(({ sure }) => !sure)).toBe(true);
    expect(reading.lines).toHaveLength(30);
  });

  it('renamed-archive.csv: a spreadsheet with another ending', () => {
    const reading = readPartList(fixture('renamed-archive.csv'), {});
    expect(reading.fatal).toMatchObject({ code: 'file-spreadsheet' });
    expect(reading.lines).toEqual([]);
  });
});

describe('rows', () => {
  const HEAD = 'Mark,Qty,Section,Length,Width,Grade';

  it('all problems of a row come together', () => {
    const reading = list(HEAD, 'B-1,2,L3x3x1/4,42,,A36', ',0,4x4x3/8,11/2,,A36');
    expect(told(reading)).toEqual([
      [3, 'mark', 'mark-missing'],
      [3, 'quantity', 'quantity-zero'],
      [3, 'section', 'section-no-family'],
      [3, 'length', 'length-lost-space'],
    ]);
    expect(reading.lines).toHaveLength(1);
  });

  it('totals, repeated headings, group titles and blank rows are named, not read', () => {
    const reading = list(
      HEAD,
      'ANGLES,,,,,',
      'B-1,2,L3x3x1/4,42,,',
      ',,,,,',
      HEAD,
      'B-2,2,L3x3x1/4,42,,',
      'Total,4,,,,',
      ',4,,,,',
      ',,,,,877.5',
      'Checked in the yard,,,,,',
    );
    expect(reading.lines.map(({ row }) => row)).toEqual([3, 6]);
    expect(reading.problems).toEqual([]);
    expect(reading.ignored).toEqual([
      { row: 1, kind: 'heading' },
      { row: 2, kind: 'heading' },
      { row: 4, kind: 'blank' },
      { row: 5, kind: 'heading' },
      { row: 7, kind: 'total' },
      { row: 8, kind: 'total' },
      { row: 9, kind: 'total' },
      { row: 10, kind: 'heading' },
    ]);
  });

  it('a row that may be a part is a problem, not a heading', () => {
    expect(told(list(HEAD, 'B-1,2,L3x3x1/4,42,,', 'B-2,,,,,'))).toEqual([
      [3, 'quantity', 'quantity-missing'],
      [3, 'section', 'section-blank'],
      [3, 'length', 'length-blank'],
    ]);
  });

  it('plate takes its width from the column or from its name, and its length from the name', () => {
    const reading = list(
      HEAD,
      'P-1,1,PL 1/4,20,14,A36',
      `P-2,1,"PL1/4x14x20'-0""",,,A36`,
      'P-3,1,PL 1/4,20,,A36',
      `P-4,1,"PL1/4x14x20'-0""",18'-0",,A36`,
      'P-5,1,PL1/4x14,20,12,A36',
      'B-1,1,L3x3x1/4,20,,A36',
    );
    expect(
      reading.lines.map(({ mark, widthNm, lengthNm, stockKey }) => [mark, widthNm, lengthNm, stockKey]),
    ).toEqual([
      ['P-1', inches(14), inches(20), 'PL1/4'],
      ['P-2', inches(14), inches(240), 'PL1/4'],
      ['B-1', undefined, inches(20), 'L3x3x1/4'],
    ]);
    expect(told(reading)).toEqual([
      [4, 'width', 'width-missing'],
      [5, 'length', 'length-differs'],
      [6, 'width', 'width-differs'],
    ]);
    expect(reading.problems[1]?.choices).toEqual([`20'-0"`, `18'-0"`]);
  });

  it('one mark for two pieces is a remark on the line', () => {
    const reading = list(HEAD, 'B-1,2,L3x3x1/4,42,,', 'B-1,2,L3x3x1/4,48,,', 'B-1,2,L3x3x1/4,42,,');
    expect(reading.problems).toEqual([]);
    expect(reading.lines.map(({ remarks }) => remarks)).toEqual([
      [],
      ['Mark B-1 stands on row 2 with another length'],
      [],
    ]);
  });

  it('keeps note, finish and date as written and tells a heat without taking it over', () => {
    const reading = list(
      'Mark,Qty,Section,Length,Note,Finish,Heat,Needed by',
      'B-1,2,L3x3x1/4,42,cope top,galvanize,H4471,2026-03-02',
    );
    expect(reading.lines[0]).toMatchObject({
      note: 'cope top',
      finish: 'galvanize',
      neededBy: '2026-03-02',
      remarks: ['The list names heat H4471'],
    });
  });

  it('takes off the wrapping that protects a cell from the spreadsheet', () => {
    const reading = list(HEAD, 'B-1,2,"=""L3x3x1/4""","=""3-6""",,');
    expect(reading.lines[0]).toMatchObject({ section: 'L3x3x1/4', lengthNm: inches(42) });
  });

  it('a mark a spreadsheet has changed is asked about', () => {
    expect(told(list(HEAD, '1.20E+05,2,L3x3x1/4,42,,'))).toEqual([[2, 'mark', 'mark-damaged']]);
  });

  it('every row is a line, a problem or ignored, whatever the cells', () => {
    const cell = fc.oneof(
      fc.constantFrom(
        '',
        'B-1',
        '12',
        '0',
        'L3x3x1/4',
        '8-Mar',
        `12'-6"`,
        'Total',
        'Mark',
        'PL 1/4',
        'x',
        '-',
      ),
      fc.stringMatching(/^[A-Za-z0-9 '"\-/.]{0,10}$/),
    );
    fc.assert(
      fc.property(
        fc.array(fc.array(cell, { minLength: 6, maxLength: 6 }), { minLength: 1, maxLength: 8 }),
        (rows) => {
          const text = [
            HEAD,
            ...rows.map((cells) => cells.map((each) => `"${each.replaceAll('"', '""')}"`).join(',')),
          ].join('\n');
          const reading = readPartList(text, {});
          const named = [...reading.lines, ...reading.problems, ...reading.ignored].map(({ row }) => row);
          expect([...new Set(named)].sort((one, other) => one - other)).toEqual(
            reading.rows.map(({ row }) => row),
          );
          const bad = new Set(reading.problems.map(({ row }) => row));
          expect(reading.lines.filter(({ row }) => bad.has(row))).toEqual([]);
        },
      ),
      { numRuns: 300 },
    );
  });
});

describe('columns', () => {
  it('a mapping by hand goes before the headings', () => {
    const text = 'A1,A2,A3,A4\nB-1,2,L3x3x1/4,42\nB-2,3,L3x3x1/4,48';
    const reading = readPartList(text, {
      mapping: { mark: 0, quantity: 1, section: 2, length: 3 },
      skips: [1],
    });
    expect(reading.lines.map(({ mark, quantity }) => [mark, quantity])).toEqual([
      ['B-1', 2],
      ['B-2', 3],
    ]);
    expect(reading.columns.every(({ sure }) => sure)).toBe(true);
  });

  it('columns nobody can tell are left to a person, with samples', () => {
    const reading = list('7,3,L3x3x1/4,44', '8,5,L3x3x1/4,51');
    expect(reading.fatal?.code).toBe('columns-unknown');
    expect(reading.fatal?.message).toMatch(/mark.*quantity.*length/);
    expect(reading.columns.map(({ field, samples }) => [field, samples])).toEqual([
      [null, ['7', '8']],
      [null, ['3', '5']],
      ['section', ['L3x3x1/4']],
      [null, ['44', '51']],
    ]);
    expect(reading.rows).toHaveLength(2);
    const mapped = readPartList('7,3,L3x3x1/4,44\n8,5,L3x3x1/4,51', {
      mapping: { mark: 0, quantity: 1, section: 2, length: 3 },
    });
    expect(mapped.lines.map(({ mark }) => mark)).toEqual(['7', '8']);
  });

  it.each([
    ['Mark,Qty,Material,Grade,Length\nB-1,2,L3x3x1/4,A36,42', 2, 3],
    ['Mark,Qty,Section,Material,Length\nB-1,2,L3x3x1/4,A36,42', 2, 3],
    ["Mark,Qty,Description,Size,Mat'l,Length\nB-1,2,brace,L3x3x1/4,A36,42", 3, 4],
  ])('what stands under a heading settles what it means: %s', (text, section, grade) => {
    expect(readPartList(text, {}).mapping).toMatchObject({ section, grade });
  });

  it('joins a shape and a size, and reads a size that needs no shape alone', () => {
    const joined = list('Mark,Qty,Shape,Size,Length', 'B-1,2,L,4x4x3/8,42', 'B-2,1,PIPE,2 STD,42');
    expect(joined.lines.map(({ section }) => section)).toEqual(['L4x4x3/8', 'PIPE 2 STD']);
    expect(joined.columns.map(({ field }) => field)).toEqual([
      'mark',
      'quantity',
      'section',
      'section',
      'length',
    ]);
    const alone = list('Mark,Qty,Shape,Size,Length', 'B-1,2,Angle,L4x4x3/8,42');
    expect(alone.lines[0]).toMatchObject({ section: 'L4x4x3/8', sectionText: 'L4x4x3/8' });
  });

  it('a doubtful heading is taken and marked for a look', () => {
    const reading = list('Mark,Qty,Section,Finished length of the part', 'B-1,2,L3x3x1/4,42');
    expect(reading.lines).toHaveLength(1);
    expect(reading.columns.map(({ sure }) => sure)).toEqual([true, true, true, false]);
  });

  it('total lengths and weights are never taken for the length', () => {
    const reading = list('Mark,Qty,Section,Total Length,Weight,Length', 'B-1,2,L3x3x1/4,84,34,42');
    expect(reading.lines[0]?.lengthNm).toBe(inches(42));
  });
});

describe('the unit of bare numbers', () => {
  it.each<[string, string, string, string[]]>([
    ['given', 'ft', 'ft', ['Mark,Qty,Section,Length (mm)', 'B-1,2,L3x3x1/4,42']],
    ['heading', 'mm', '', ['Mark,Qty,Section,Length (mm)', 'B-1,2,L3x3x1/4,42']],
    ['heading', 'mm', '', ['Mark,Qty,Section,Length', ',,,mm', 'B-1,2,L3x3x1/4,42']],
    ['heading', 'mm', '', ['All dimensions in mm', 'Mark,Qty,Section,Length', 'B-1,2,L3x3x1/4,42']],
    ['heading', 'ft', '', ['Mark,Qty,Section,Feet', 'B-1,2,L3x3x1/4,42']],
    ['cells', 'in', '', ['Mark,Qty,Section,Length', `B-1,2,SHS 40x40x3,12'-6"`, 'B-2,2,SHS 40x40x3,42']],
    ['cells', 'mm', '', ['Mark,Qty,Section,Length', 'B-1,2,L3x3x1/4,3.2 m', 'B-2,2,L3x3x1/4,3200']],
    ['cells', 'm', '', ['Mark,Qty,Section,Length', 'B-1,2,L3x3x1/4,3.2 m', 'B-2,2,L3x3x1/4,3.4']],
    ['sections', 'mm', '', ['Mark,Qty,Section,Length', 'B-1,2,SHS 40x40x3,1200']],
    ['sections', 'in', '', ['Mark,Qty,Section,Length', 'B-1,2,L3x3x1/4,42']],
    ['default', 'in', '', ['Mark,Qty,Section,Length', 'B-1,2,unknown,42']],
  ])('from %s: %s', (from, unit, given, rows) => {
    const reading = readPartList(rows.join('\n'), given === 'ft' ? { unit: 'ft' } : {});
    expect([reading.unitFrom, reading.unit]).toEqual([from, unit]);
  });

  it('feet and inches beside each other add up exactly', () => {
    const reading = list(
      'Mark,Qty,Section,Length (ft),Length (in)',
      'B-1,2,L3x3x1/4,12,6 1/2',
      'B-2,2,L3x3x1/4,,6 1/2',
      'B-3,2,L3x3x1/4,12,',
      'B-4,2,L3x3x1/4,12,0',
      `B-5,2,L3x3x1/4,12',6.5"`,
      'B-6,2,L3x3x1/4,,',
      'B-7,2,L3x3x1/4,12.5,6',
    );
    expect(reading.lines.map(({ lengthNm }) => lengthNm / NM_PER_INCH)).toEqual([
      150.5, 6.5, 144, 144, 150.5,
    ]);
    expect(told(reading)).toEqual([
      [7, 'feet', 'length-blank'],
      [8, 'feet', 'length-feet-not-whole'],
    ]);
    const fixed = readPartList('Mark,Qty,Section,Ft,In\nB-1,2,L3x3x1/4,,', {
      fixes: { 2: { length: `3'-6"` } },
    });
    expect(fixed.lines[0]?.lengthNm).toBe(inches(42));
  });

  it('a comma list in metres is read by its own custom, else asked', () => {
    const head = 'Pos;Anzahl;Profil;Länge (m)';
    const known = list(head, '1;2;SHS 40x40x3;3,823', '2;2;SHS 40x40x3;1,5');
    expect(known.lines.map(({ lengthNm }) => lengthNm / NM_PER_MM)).toEqual([3823, 1500]);
    const open = readPartList('Pos,Qty,Section,Length (m)\n1,2,SHS 40x40x3,"3,823"', {});
    expect(told(open)).toEqual([[2, 'length', 'length-thousands']]);
  });

  it('a fraction of an inch survives into the line', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 20 * 12 * 64 }), (ticks) => {
        const written = formatLength((ticks * NM_PER_INCH) / 64, { units: 'imperial', denominator: 64 });
        const reading = readPartList(`Mark\tQty\tSection\tLength\nB-1\t1\tRB 3/4\t${written}`, {});
        expect(reading.lines[0]?.lengthNm).toBe((ticks * NM_PER_INCH) / 64);
      }),
      { numRuns: 100 },
    );
  });
});

describe('files that are no part list', () => {
  it.each([
    ['file-empty', ''],
    ['no-rows', 'Mark,Qty,Section,Length\n'],
    ['no-rows', 'Mark,Qty,Section,Length\n,,,\n'],
    ['columns-unknown', 'Dear yard,\nplease cut the list we sent.\n'],
    ['columns-unknown', 'Mark,Section,Length\nB-1,L3x3x1/4,42'],
  ])('%s', (code, text) => {
    const reading = readPartList(text, {});
    expect(reading.fatal?.code).toBe(code);
    expect(reading.lines).toEqual([]);
  });

  it('a list of which every row was left out is no fault of the file', () => {
    expect(readPartList('Mark,Qty,Section,Length\nB-1,1,L3x3x1/4,42', { skips: [2] }).fatal).toBeNull();
  });
});

it('twenty thousand rows are read whole', () => {
  const rows = Array.from({ length: 20_000 }, (_none, index) => {
    const length = formatLength(inches(12 + (index % 200)), { units: 'imperial', denominator: 16 });
    return `B-${index},${1 + (index % 9)},L3x3x1/4,"${length.replaceAll('"', '""')}",A36`;
  });
  const reading = list('Mark,Qty,Section,Length,Grade', ...rows);
  expect(reading.lines).toHaveLength(20_000);
  expect(reading.lines.at(-1)).toMatchObject({ row: 20_001, mark: 'B-19999' });
  const last = parseLength(reading.lines.at(-1)?.lengthText ?? '', { unit: 'mm' });
  expect(last).toMatchObject({ ok: true, nm: inches(12 + (19_999 % 200)) });
});
