import { select } from '#server/services/select.ts';

/** Takes the next numbers of a counter inside the running write. A number taken is never given again. */
export async function takeNumbers(counter: 'plan' | 'tag', count: number): Promise<number[]> {
  if (count === 0) return [];
  const [row] = await select<{ next: number }>(
    `UPDATE "counters" SET "next" = "next" + $1 WHERE "name" = $2 RETURNING "next"`,
    [count, counter],
  );
  if (!row) throw new Error(`there is no counter ${counter}`);
  return Array.from({ length: count }, (_, i) => row.next - count + i);
}

export const tagText = (tag: number): string => `D-${String(tag).padStart(4, '0')}`;
