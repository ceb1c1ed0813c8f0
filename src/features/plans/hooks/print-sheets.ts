/** Lays the bar maps of a plan out on sheets of paper; pure, in millimetres, so that every sheet can say which of how many it is. */
import { drawBar } from '#shared/domain/bar-map/draw-bar.ts';
import type { BarDrawing } from '#shared/domain/bar-map/draw-bar.ts';
import type { BarMap } from '#shared/domain/bar-map/shapes.ts';
import type { PlanGroup } from '#shared/schemas/plans.ts';

/** Left margin wide enough for a clipboard's holes, top for its clip. */
export const PAPER = {
  a4: { css: 'A4', width: 210, height: 297 },
  letter: { css: 'letter', width: 215.9, height: 279.4 },
} as const;
export const MARGIN = { left: 18, right: 11, top: 14, bottom: 11 } as const;
export const SHEET_HEAD = 15;
export const SHEET_FOOT = 15;

/** Cuts of one mark and length that follow each other: one stop setting, several tape readings. */
export type CutRun = {
  readonly first: number;
  readonly count: number;
  readonly pieceId: string;
  readonly lengthNm: number;
  readonly tapesNm: readonly number[];
};

export type BarBlock = {
  readonly group: PlanGroup;
  readonly layout: number;
  readonly map: BarMap;
  readonly runs: readonly CutRun[];
  readonly height: number;
};

const BLOCK_HEAD = 17;
const TABLE_HEAD = 6;
const RUN_LINE = 5.2;
const TAPES_A_LINE = 5;
const BLOCK_FOOT = 9;

export function cutRuns(cuts: PlanGroup['result']['layouts'][number]['cuts']): CutRun[] {
  const runs: (CutRun & { tapesNm: number[]; count: number })[] = [];
  cuts.forEach(({ pieceId, startNm, lengthNm }, i) => {
    const last = runs.at(-1);
    if (last?.pieceId === pieceId) {
      last.count++;
      last.tapesNm.push(startNm + lengthNm);
    } else runs.push({ first: i + 1, count: 1, pieceId, lengthNm, tapesNm: [startNm + lengthNm] });
  });
  return runs;
}

export const runLines = (run: CutRun): number => Math.ceil(run.count / TAPES_A_LINE);

/** Bars of one layout have tick boxes, eight a line. */
export const BOXES_A_LINE = 10;
export const boxLines = (repeat: number): number => Math.ceil(repeat / BOXES_A_LINE);

export function makeBlocks(
  groups: readonly PlanGroup[],
  width: number,
  draw: (group: PlanGroup, layout: number) => BarDrawing | null,
): BarBlock[] {
  return groups.flatMap((group) =>
    group.result.layouts.flatMap(({ cuts, repeat }, layout): BarBlock[] => {
      const drawing = draw(group, layout);
      if (!drawing) return [];
      const map = drawBar(drawing, width);
      const runs = cutRuns(cuts);
      const lines = runs.reduce((sum, run) => sum + runLines(run), 0);
      return [
        {
          group,
          layout,
          map,
          runs,
          height: BLOCK_HEAD + 6 * boxLines(repeat) + map.height + TABLE_HEAD + lines * RUN_LINE + BLOCK_FOOT,
        },
      ];
    }),
  );
}

/** Fills sheets in order; a block is never torn, and one too tall for any sheet has a sheet of its own. */
export function packSheets<T extends { readonly height: number }>(blocks: readonly T[], room: number): T[][] {
  const sheets: T[][] = [];
  let left = 0;
  for (const block of blocks) {
    if (sheets.length === 0 || block.height > left) {
      sheets.push([]);
      left = room;
    }
    sheets.at(-1)?.push(block);
    left -= block.height;
  }
  return sheets;
}
