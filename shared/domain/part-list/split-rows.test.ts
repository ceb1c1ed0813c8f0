import fc from 'fast-check';
import Papa from 'papaparse';
import { describe, expect, it } from 'vitest';
import { findSeparator } from '#shared/domain/part-list/find-separator.ts';
import { SEPARATORS, splitRows } from '#shared/domain/part-list/split-rows.ts';

describe('rows and the physical line they start on', () => {
  it('counts blank lines and quoted line ends', () => {
    const text = 'Mark,Note\r\nB-1,"first\r\nsecond, ""third"""\r\n\r\nB-2,plain\r\n';
    expect(splitRows(text, ',')).toEqual([
      { row: 1, cells: ['Mark', 'Note'] },
      { row: 2, cells: ['B-1', 'first\nsecond, "third"'] },
      { row: 4, cells: [''] },
      { row: 5, cells: ['B-2', 'plain'] },
    ]);
  });

  it('takes inch marks in unquoted cells as they are', () => {
    expect(splitRows(`B-1,12'-6 1/2",A36`, ',')[0]?.cells).toEqual(['B-1', `12'-6 1/2"`, 'A36']);
  });

  it('an inch mark nobody doubled does not swallow the rows below', () => {
    const text = `Mark,Length,Size\nB-1,"12'-6 1/2"",L3x3x1/4\nB-2,10'-0",L3x3x1/4\nB-3,"9'-0""",L2x2x1/4\n`;
    expect(splitRows(text, ',').map(({ row, cells }) => [row, ...cells])).toEqual([
      [1, 'Mark', 'Length', 'Size'],
      [2, 'B-1', `12'-6 1/2"`, 'L3x3x1/4'],
      [3, 'B-2', `10'-0"`, 'L3x3x1/4'],
      [4, 'B-3', `9'-0"`, 'L2x2x1/4'],
    ]);
  });

  it('a quote that is never closed stays on its own line', () => {
    const text = `Mark,Note,Size\nB-1,"see detail,L3x3x1/4\nB-2,"ok",L3x3x1/4\n`;
    expect(splitRows(text, ',').map(({ row, cells }) => [row, cells.length])).toEqual([
      [1, 3],
      [2, 3],
      [3, 3],
    ]);
  });

  it('headings may break inside a cell', () => {
    expect(splitRows('"Piece\nMark","Req\'d","Mat\'l\nSize"\nB-1,2,L3x3x1/4\nB-2,2,L3x3x1/4', ',')).toEqual([
      { row: 1, cells: ['Piece\nMark', "Req'd", "Mat'l\nSize"] },
      { row: 4, cells: ['B-1', '2', 'L3x3x1/4'] },
      { row: 5, cells: ['B-2', '2', 'L3x3x1/4'] },
    ]);
  });

  it('gives back what was written, with any cells and separator', () => {
    const cell = fc.stringMatching(/^[A-Za-z0-9 '"\-/.\n½×]{0,12}$/);
    fc.assert(
      fc.property(
        fc.array(fc.tuple(cell, cell, cell), { minLength: 1, maxLength: 6 }),
        fc.constantFrom(...SEPARATORS),
        (rows, separator) => {
          const text = Papa.unparse(rows, { delimiter: separator, quotes: true, newline: '\r\n' });
          let line = 1;
          const expected = rows.map((cells) => {
            const row = { row: line, cells };
            line += 1 + cells.join('').split('\n').length - 1;
            return row;
          });
          expect(splitRows(text, separator)).toEqual(expected);
        },
      ),
    );
  });
});

describe('the separator', () => {
  it.each([
    ['Mark,Qty,Section,Length\nB-1,2,L3x3x1/4,"1,250"', ','],
    ['Pos;Stück;Profil;Länge\n1;2;L 50x50x5;1250,5\n2;2;L 50x50x5;1250,5', ';'],
    ['Mark\tQty\tSize, material\tLength\nB-1\t2\tL3x3x1/4\t42', '\t'],
    ['B-1|2|L3x3x1/4|42\nB-2|2|L3x3x1/4|42', '|'],
    ['sep=;\nMark;Qty', ';'],
    ['1;2,5;3,5\n2;2,5;3,5', ';'],
    ['one column only', ','],
  ])('%j', (text, separator) => {
    expect(findSeparator(text)).toBe(separator);
  });
});
