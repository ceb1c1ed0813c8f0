import { idList, select } from '#server/services/select.ts';

/** Pieces of part lines standing in plans that are not withdrawn, drafts included; `where` narrows by `pp`. */
export const plannedSql = (where = '1'): string => `
  SELECT pp."partLineId" AS "partLineId", sum(pp."quantity" - pp."unplaced") AS "count"
  FROM "plan_pieces" pp JOIN "plan_groups" g ON g."id" = pp."groupId" JOIN "plans" p ON p."id" = g."planId"
  WHERE p."state" <> 'withdrawn' AND ${where} GROUP BY pp."partLineId"`;

/** Pieces of part lines on bars that are cut; `where` narrows by `c`. */
export const cutSql = (where = '1'): string => `
  SELECT c."partLineId" AS "partLineId", count(*) AS "count"
  FROM "plan_cuts" c JOIN "bars" b ON b."layoutId" = c."layoutId"
  WHERE b."state" = 'cut' AND ${where} GROUP BY c."partLineId"`;

type LineCount = { partLineId: number; count: number };
const byLine = (rows: readonly LineCount[]) =>
  new Map(rows.map(({ partLineId, count }) => [partLineId, count]));

/** How many pieces of each line are planned; lines of which none are, are absent. */
export async function countPlanned(partLineIds: readonly number[]): Promise<Map<number, number>> {
  return byLine(await select<LineCount>(plannedSql(`pp."partLineId" IN ${idList(partLineIds)}`)));
}

/** How many pieces of each line are cut; lines of which none are, are absent. */
export async function countCut(partLineIds: readonly number[]): Promise<Map<number, number>> {
  return byLine(await select<LineCount>(cutSql(`c."partLineId" IN ${idList(partLineIds)}`)));
}
