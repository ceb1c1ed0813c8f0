import type { Context } from 'konva/lib/Context';
import type { BarMap, Fill, Shape, Tone } from '#shared/domain/bar-map/shapes.ts';

const INK = '#1d242b';
const TONES: Readonly<Record<Tone, string>> = { ink: INK, cut: '#9f3d2b', faint: '#566069' };
const FILLS: Readonly<Record<Exclude<Fill, 'none'>, string>> = {
  ink: INK,
  chalk: '#fffdf6',
  soap: '#e6e8e3',
};
const FONTS = { mono: '"JetBrains Mono", monospace', head: '"Barlow Condensed", sans-serif' } as const;
const LAYOUT_BLUE = '#173a5e';

function paintShape(context: Context, shape: Shape, filled: number | null): void {
  switch (shape.kind) {
    case 'line':
      context.beginPath();
      context.moveTo(shape.x1, shape.y1);
      context.lineTo(shape.x2, shape.y2);
      context.setAttr('strokeStyle', TONES[shape.tone]);
      context.setAttr('lineWidth', shape.weight);
      context.stroke();
      return;
    case 'polygon':
    case 'circle':
      context.beginPath();
      if (shape.kind === 'circle') context.arc(shape.cx, shape.cy, shape.r, 0, 2 * Math.PI, false);
      else {
        shape.points.forEach(([x, y], i) => (i === 0 ? context.moveTo(x, y) : context.lineTo(x, y)));
        context.closePath();
      }
      if (shape.fill !== 'none') {
        context.setAttr('fillStyle', FILLS[shape.fill]);
        context.fill();
      }
      if (shape.weight > 0) {
        context.setAttr('strokeStyle', INK);
        context.setAttr('lineWidth', shape.weight);
        context.stroke();
      }
      return;
    case 'text':
      context.setAttr(
        'font',
        `${shape.bold ? (shape.font === 'head' ? 600 : 700) : 400} ${shape.size}px ${FONTS[shape.font]}`,
      );
      context.setAttr('textAlign', shape.align);
      context.setAttr(
        'fillStyle',
        shape.piece !== undefined && shape.piece === filled ? '#fffdf6' : TONES[shape.tone],
      );
      context.fillText(shape.text, shape.x, shape.y);
  }
}

/** Paints a bar map in millimetres; the piece pointed at or next to cut is filled with layout blue. */
export function paintBarMap(context: Context, map: BarMap, filled: number | null): void {
  const field = filled === null ? undefined : map.pieces[filled];
  if (field) {
    context.setAttr('fillStyle', LAYOUT_BLUE);
    context.fillRect(field.x, field.y, field.width, field.height);
  }
  for (const shape of map.shapes) paintShape(context, shape, filled);
}
