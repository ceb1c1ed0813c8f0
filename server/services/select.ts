import { QueryTypes } from 'sequelize';
import { PlanRow } from '#server/models/index.ts';

/** Rows of a hand-written query, for sums that rows of models would only slow down. Values ride in `bind` as $1, $2 … */
export async function select<T extends object>(sql: string, bind: readonly unknown[] = []): Promise<T[]> {
  const { sequelize } = PlanRow;
  if (!sequelize) throw new Error('no database is open');
  return sequelize.query<T>(sql, { bind: [...bind], type: QueryTypes.SELECT });
}

/** `(1,2,3)` for IN: row ids are whole numbers, so they may stand in the text of the query. */
export function idList(ids: Iterable<number>): string {
  const list = [...ids];
  for (const id of list) if (!Number.isSafeInteger(id)) throw new RangeError(`not a row id: ${id}`);
  return `(${list.join(',')})`;
}
