import { expect, it } from 'vitest';
import { wholeNumber } from '#src/lib/whole-number.ts';

it('sets thousands apart', () => {
  expect([0, 999, 1386, 246_289, 1_000_000].map(wholeNumber)).toEqual([
    '0',
    '999',
    '1\u2009386',
    '246\u2009289',
    '1\u2009000\u2009000',
  ]);
});
