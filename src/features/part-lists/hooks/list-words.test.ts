import { describe, expect, it } from 'vitest';
import { columnLetter, fileSize, rowNumbers } from '#src/features/part-lists/hooks/list-words.ts';

describe('words about a file', () => {
  it('name columns as a spreadsheet does', () => {
    expect([0, 25, 26, 51, 52, 701, 702].map(columnLetter)).toEqual([
      'A',
      'Z',
      'AA',
      'AZ',
      'BA',
      'ZZ',
      'AAA',
    ]);
  });
  it('shorten long rows of numbers', () => {
    expect(rowNumbers([3, 8, 21])).toBe('3, 8, 21');
    expect(rowNumbers([3, 8, 21], 2)).toBe('3, 8 and 1 more');
  });
  it('say a size without false digits', () => {
    expect([812, 14_400, 1_023_000, 2_400_000, 20 * 1024 * 1024].map(fileSize)).toEqual([
      '812 bytes',
      '14 kB',
      '999 kB',
      '2.3 MB',
      '20 MB',
    ]);
  });
});
