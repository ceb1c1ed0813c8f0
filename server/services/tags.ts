import { QueryTypes } from 'sequelize';
import { PlanRow } from '#server/models/index.ts';

/** Takes the next numbers of a counter inside the running write. A number taken is never given again. */
export async function takeNumbers(counter: 'plan' | 'tag', count: number): Promise<number[]> {
  if (count === 0) return [];
  const sequelize = PlanRow.sequelize;
  if (!sequelize) throw new Error('no database is open');
  const [row] = await sequelize.query<{ next: number }>(`UPDATE "counters" SET "next" = "next" + $1 WHERE "name" = $2 RETURNING "next"`, {
    bind: [count, counter],
    type: QueryTypes.SELECT,
  });
  if (!row) throw new Error(`there is no counter ${counter}`);
  return Array.from({ length: count }, (_, i) => row.next - count + i);
}

export const tagText = (tag: number): string => `D-${String(tag).padStart(4, '0')}`;
