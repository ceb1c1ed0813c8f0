import { expect, it } from 'vitest';
import { rowTicks } from '#src/features/part-lists/hooks/row-tape.ts';

it('a tape of rows has few round numbers', () => {
  expect(rowTicks(1)).toEqual({ major: 1, minor: 1 });
  expect(rowTicks(37)).toEqual({ major: 5, minor: 1 });
  expect(rowTicks(300)).toEqual({ major: 50, minor: 5 });
  expect(rowTicks(20_000)).toEqual({ major: 5000, minor: 500 });
});
