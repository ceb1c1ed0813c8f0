import { describe, expect, it } from 'vitest';
import { progressWords } from '#src/lib/progress-words.ts';

describe('how far pieces have come', () => {
  it.each([
    [{ pieces: 0, planned: 0, cut: 0 }, 'no pieces yet'],
    [{ pieces: 10, planned: 0, cut: 0 }, 'not planned'],
    [{ pieces: 10, planned: 4, cut: 0 }, 'planned in part'],
    [{ pieces: 10, planned: 10, cut: 0 }, 'all planned'],
    [{ pieces: 10, planned: 10, cut: 1 }, 'being cut'],
    [{ pieces: 10, planned: 4, cut: 4 }, 'being cut'],
    [{ pieces: 10, planned: 10, cut: 10 }, 'all cut'],
  ])('%o is %s', (pieces, words) => {
    expect(progressWords(pieces)).toBe(words);
  });
});
