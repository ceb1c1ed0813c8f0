const STEPS = [1, 2, 5] as const;
const MOST_NUMBERS = 8;
const TICKS_BETWEEN = 10;

/** Ticks of a tape that counts rows: numbered at 1, 2 or 5 times a power of ten, at most eight numbers. */
export function rowTicks(rows: number): { minor: number; major: number } {
  for (let power = 1; ; power *= 10)
    for (const step of STEPS) {
      const major = step * power;
      if (rows / major <= MOST_NUMBERS) return { major, minor: Math.max(1, major / TICKS_BETWEEN) };
    }
}
