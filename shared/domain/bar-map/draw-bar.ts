/**
 * The bar map: two long edges with the section at the datum end, pieces with mark and length, nicks or kerfs with running numbers, and what is left as a
 * tag or crossed out. Geometry only; every length of the bar is to scale.
 */
import { hatchStrip } from '#shared/domain/bar-map/hatch.ts';
import { drawTape, type TapeUnits } from '#shared/domain/bar-map/draw-tape.ts';
import { textWidth, type BarMap, type PieceField, type Shape } from '#shared/domain/bar-map/shapes.ts';
import { stagger } from '#shared/domain/bar-map/stagger.ts';
import type { Outline } from '#shared/domain/section/outline.ts';

export type BarDrawing = {
  readonly stockNm: number;
  readonly headCropNm: number;
  readonly tailCropNm: number;
  readonly kerfNm: number;
  readonly cuts: readonly {
    readonly pieceId: string;
    readonly mark: string;
    readonly startNm: number;
    readonly lengthNm: number;
  }[];
  readonly leftoverNm: number;
  readonly keeps: boolean;
  readonly repeat: number;
  /** Words inside the tag of the drop it makes, most important first. */
  readonly dropWords: readonly string[];
  /** Left and right above the bar. */
  readonly title: string;
  readonly facts: string;
  readonly outline: Outline | null;
  readonly units: TapeUnits;
  readonly length: (nm: number) => string;
  readonly tape: (nm: number) => string;
};

export const GUTTER = 30;
const RIGHT = 2;
const HEADER = 6;
const BAR = 13;
const STRIP = 2.6;
const MARK = 3.6;
const LENGTH = 2.7;
const NUMBER = 2.9;
const ROW = 3.9;
const CALLOUT = 2.6;
const EDGE = 0.55;
/** A kerf is drawn true to scale but never thinner than two hairlines apart. */
const LEAST_KERF = 0.35;

type Frame = {
  readonly x0: number;
  readonly scale: number;
  readonly top: number;
  readonly bottom: number;
  readonly right: number;
};

const line = (
  x1: number,
  y1: number,
  x2: number,
  y2: number,
  weight: number,
  tone: 'ink' | 'cut' | 'faint' = 'ink',
): Shape => ({ kind: 'line', x1, y1, x2, y2, weight, tone });

function drawOutline(outline: Outline, right: number, bottom: number): Shape[] {
  const room = { width: 10, height: BAR };
  const scale = Math.min(room.width / outline.width, room.height / outline.height);
  const x = right - outline.width * scale;
  const y = bottom - (BAR + outline.height * scale) / 2;
  return outline.shapes.map((shape): Shape =>
    shape.kind === 'circle'
      ? {
          kind: 'circle',
          cx: x + shape.cx * scale,
          cy: y + shape.cy * scale,
          r: shape.r * scale,
          fill: shape.hole ? 'chalk' : 'ink',
          weight: 0,
        }
      : {
          kind: 'polygon',
          points: shape.points.map(([px, py]) => [x + px * scale, y + py * scale] as const),
          fill: shape.hole ? 'chalk' : 'ink',
          weight: 0,
        },
  );
}

/** Marks and lengths inside pieces that are wide enough; runs of narrow like pieces share one callout above the bar. */
function labelPieces(
  drawing: BarDrawing,
  fields: readonly PieceField[],
): { inside: Shape[]; callouts: { at: number; text: string }[] } {
  const inside: Shape[] = [];
  const callouts: { at: number; text: string }[] = [];
  for (let i = 0; i < drawing.cuts.length; i++) {
    const cut = drawing.cuts[i];
    const field = fields[i];
    if (!cut || !field) continue;
    const middle = field.x + field.width / 2;
    const length = drawing.length(cut.lengthNm);
    const room = field.width - 1.2;
    if (textWidth(cut.mark, MARK) <= room && textWidth(length, LENGTH) <= room) {
      inside.push({
        kind: 'text',
        x: middle,
        y: field.y + 5.2,
        text: cut.mark,
        size: MARK,
        align: 'center',
        font: 'mono',
        bold: true,
        tone: 'ink',
        piece: i,
      });
      inside.push({
        kind: 'text',
        x: middle,
        y: field.y + 9.1,
        text: length,
        size: LENGTH,
        align: 'center',
        font: 'mono',
        bold: false,
        tone: 'ink',
        piece: i,
      });
      continue;
    }
    let last = i;
    while (drawing.cuts[last + 1]?.pieceId === cut.pieceId) last++;
    const end = fields[last] ?? field;
    const count = last - i + 1;
    callouts.push({
      at: (field.x + end.x + end.width) / 2,
      text: `${count > 1 ? `${count}× ` : ''}${cut.mark} ${length}`,
    });
    i = last;
  }
  return { inside, callouts };
}

function drawCut(frame: Frame, startNm: number, kerfNm: number): Shape[] {
  const x = frame.x0 + startNm * frame.scale;
  if (kerfNm === 0) {
    const nick = (y: number, toward: number): Shape[] => [
      line(x - 1, y - toward * 1.6, x, y, 0.4, 'cut'),
      line(x + 1, y - toward * 1.6, x, y, 0.4, 'cut'),
    ];
    return [
      ...nick(frame.top, 1),
      ...nick(frame.bottom, -1),
      line(x, frame.top, x, frame.bottom, 0.4, 'cut'),
    ];
  }
  const wide = Math.max(LEAST_KERF, kerfNm * frame.scale);
  return [
    line(x, frame.top - 1.2, x, frame.bottom + 1.2, 0.25, 'cut'),
    line(x + wide, frame.top - 1.2, x + wide, frame.bottom + 1.2, 0.25, 'cut'),
  ];
}

function drawLeftover(drawing: BarDrawing, frame: Frame, fromNm: number): Shape[] {
  const x1 = frame.x0 + fromNm * frame.scale;
  const x2 = frame.x0 + (drawing.stockNm - drawing.tailCropNm) * frame.scale;
  const { top, bottom } = frame;
  if (x2 - x1 < 0.05) return [];
  if (!drawing.keeps) {
    const box: Shape = {
      kind: 'polygon',
      points: [
        [x1, top],
        [x2, top],
        [x2, bottom],
        [x1, bottom],
      ],
      fill: 'none',
      weight: 0.3,
    };
    return [box, line(x1, top, x2, bottom, 0.3), line(x1, bottom, x2, top, 0.3)];
  }
  const point = Math.min(4.5, (x2 - x1) / 3);
  const middle = (top + bottom) / 2;
  const tag: Shape = {
    kind: 'polygon',
    points: [
      [x1, top],
      [x2 - point, top],
      [x2, middle],
      [x2 - point, bottom],
      [x1, bottom],
    ],
    fill: 'chalk',
    weight: 0.4,
  };
  const shapes: Shape[] = [tag];
  if (x2 - x1 > 7)
    shapes.push({ kind: 'circle', cx: x2 - point - 1.2, cy: middle, r: 1, fill: 'none', weight: 0.35 });
  const room = x2 - x1 - point - 4;
  const words = drawing.dropWords.filter((word) => textWidth(word, LENGTH) <= room);
  words.forEach((text, i) =>
    shapes.push({
      kind: 'text',
      x: x1 + 1.6,
      y: middle + 1 + (i - (words.length - 1) / 2) * 3.6,
      text,
      size: LENGTH,
      align: 'left',
      font: 'mono',
      bold: i === 0,
      tone: 'ink',
    }),
  );
  return shapes;
}

/** Draws one layout at a width in millimetres (at least 80). */
export function drawBar(drawing: BarDrawing, width: number): BarMap {
  const x0 = GUTTER;
  const right = Math.max(80, width) - RIGHT;
  const scale = (right - x0) / drawing.stockNm;
  const kinds = [...new Set(drawing.cuts.map(({ pieceId }) => pieceId))];

  // Callouts decide how far down the bar hangs, so they are placed before anything is drawn.
  const flat = drawing.cuts.map(({ startNm, lengthNm }): PieceField => ({
    x: x0 + startNm * scale,
    y: 0,
    width: lengthNm * scale,
    height: BAR,
  }));
  const { callouts } = labelPieces(drawing, flat);
  const above = stagger(
    callouts.map(({ at, text }) => ({ at, width: textWidth(text, CALLOUT) })),
    x0,
    right,
    1.5,
  );
  const calloutRows = Math.max(-1, ...above.map(({ row }) => row)) + 1;
  const top = HEADER + (calloutRows > 0 ? calloutRows * ROW + 2 : 0);
  const bottom = top + BAR;
  const frame: Frame = { x0, scale, top, bottom, right };
  const fields = flat.map((field) => ({ ...field, y: top }));
  const { inside } = labelPieces(drawing, fields);

  const shapes: Shape[] = [];
  if (drawing.repeat > 0)
    shapes.push({
      kind: 'text',
      x: 0.5,
      y: top + BAR * 0.78,
      text: `×\u2009${drawing.repeat}`,
      size: 9,
      align: 'left',
      font: 'head',
      bold: true,
      tone: 'ink',
    });
  if (drawing.outline) shapes.push(...drawOutline(drawing.outline, x0 - 3, bottom));
  const roomForTitle = right - x0 - textWidth(drawing.facts, 2.9) - 4;
  if (textWidth(drawing.title, 3.6, 'head') <= roomForTitle)
    shapes.push({
      kind: 'text',
      x: x0,
      y: 4,
      text: drawing.title,
      size: 3.6,
      align: 'left',
      font: 'head',
      bold: true,
      tone: 'ink',
    });
  shapes.push({
    kind: 'text',
    x: right,
    y: 4,
    text: drawing.facts,
    size: 2.9,
    align: 'right',
    font: 'mono',
    bold: false,
    tone: 'ink',
  });

  callouts.forEach(({ at, text }, i) => {
    const place = above[i];
    if (!place) return;
    const y = top - 3 - place.row * ROW;
    shapes.push({
      kind: 'text',
      x: place.left,
      y,
      text,
      size: CALLOUT,
      align: 'left',
      font: 'mono',
      bold: true,
      tone: 'ink',
    });
    shapes.push(line(at, y + 0.7, at, top + 2.5, 0.2, 'faint'));
  });

  fields.forEach(({ x, width: w }, i) =>
    shapes.push(...hatchStrip(kinds.indexOf(drawing.cuts[i]?.pieceId ?? ''), x, bottom - STRIP, w, STRIP)),
  );
  const crop = (fromNm: number, toNm: number) => {
    if (toNm <= fromNm) return;
    const [a, b] = [x0 + fromNm * scale, x0 + toNm * scale];
    // A crop of a quarter inch on forty feet is thinner than a hairline; it is drawn as one.
    const to = Math.max(b, a + 0.4);
    shapes.push({
      kind: 'polygon',
      points: [
        [a, top],
        [to, top],
        [to, bottom],
        [a, bottom],
      ],
      fill: 'ink',
      weight: 0,
    });
  };
  crop(0, drawing.headCropNm);
  crop(drawing.stockNm - drawing.tailCropNm, drawing.stockNm);
  shapes.push(...drawLeftover(drawing, frame, drawing.stockNm - drawing.tailCropNm - drawing.leftoverNm));
  const edgeEnd =
    x0 +
    (drawing.keeps ? drawing.stockNm - drawing.tailCropNm - drawing.leftoverNm : drawing.stockNm) * scale;
  shapes.push(
    line(x0, top, edgeEnd, top, EDGE),
    line(x0, bottom, edgeEnd, bottom, EDGE),
    line(x0, top, x0, bottom, EDGE),
  );
  if (!drawing.keeps) shapes.push(line(edgeEnd, top, edgeEnd, bottom, EDGE));
  shapes.push({
    kind: 'polygon',
    points: [
      [x0, bottom + 0.6],
      [x0 - 1.8, bottom + 3.6],
      [x0 + 1.8, bottom + 3.6],
    ],
    fill: 'ink',
    weight: 0,
  });
  // A bar used up by its last piece needs no cut there.
  const cuts = drawing.cuts.filter(
    ({ startNm, lengthNm }) =>
      startNm + lengthNm < drawing.stockNm - drawing.tailCropNm || drawing.tailCropNm > 0,
  );
  for (const { startNm, lengthNm } of cuts)
    shapes.push(...drawCut(frame, startNm + lengthNm, drawing.kerfNm));
  shapes.push(...inside);

  const tapeTop = bottom + 4.4;
  const { shapes: tape, bottom: tapeBottom } = drawTape(
    frame.x0,
    right,
    tapeTop,
    drawing.stockNm,
    drawing.units,
  );
  shapes.push(...tape);
  const numbers = cuts.map(({ startNm, lengthNm }) => ({
    at: x0 + (startNm + lengthNm) * scale,
    text: drawing.tape(startNm + lengthNm),
  }));
  const below = stagger(
    numbers.map(({ at, text }) => ({ at, width: textWidth(text, NUMBER) })),
    x0,
    right,
    1.2,
  );
  let foot = tapeBottom;
  numbers.forEach(({ at, text }, i) => {
    const place = below[i];
    if (!place) return;
    const y = tapeBottom + ROW + place.row * ROW;
    foot = Math.max(foot, y);
    shapes.push(line(at, bottom + 1.6, at, y - NUMBER * 0.8, 0.2, 'cut'));
    shapes.push({
      kind: 'text',
      x: place.left,
      y,
      text,
      size: NUMBER,
      align: 'left',
      font: 'mono',
      bold: true,
      tone: 'ink',
    });
  });
  return { width: right + RIGHT, height: foot + 2, shapes, pieces: fields };
}
