import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { drawBar, GUTTER, type BarDrawing } from '#shared/domain/bar-map/draw-bar.ts';
import { textWidth, type Shape } from '#shared/domain/bar-map/shapes.ts';
import { formatLength } from '#shared/domain/length.ts';
import { sectionOutline } from '#shared/domain/section/outline.ts';
import { sectionByName } from '#shared/domain/section/section-by-name.ts';

const angle = sectionByName('L3x3x1/4');
const inch = 25_400_000;

const drawing = fc
  .record({
    pieces: fc.array(
      fc.record({ kind: fc.integer({ min: 0, max: 7 }), sixteenths: fc.integer({ min: 8, max: 800 }) }),
      { minLength: 1, maxLength: 24 },
    ),
    kerf: fc.constantFrom(0, inch / 8),
    crop: fc.constantFrom(0, inch / 4),
    left: fc.integer({ min: 0, max: 1600 }),
    keeps: fc.boolean(),
    repeat: fc.integer({ min: 1, max: 120 }),
  })
  .map(({ pieces, kerf, crop, left, keeps, repeat }): BarDrawing => {
    let startNm = crop;
    const lengths = new Map<number, number>();
    const cuts = pieces.map(({ kind, sixteenths }) => {
      const lengthNm = lengths.get(kind) ?? (sixteenths * inch) / 16;
      lengths.set(kind, lengthNm);
      const cut = { pieceId: `p${kind}`, mark: `B-10${kind}`, startNm, lengthNm };
      startNm += lengthNm + kerf;
      return cut;
    });
    const length = (nm: number) => formatLength(nm, { units: 'imperial', denominator: 16 });
    return {
      stockNm: startNm + (left * inch) / 16,
      headCropNm: crop,
      tailCropNm: 0,
      kerfNm: kerf,
      cuts,
      leftoverNm: (left * inch) / 16,
      keeps,
      repeat,
      dropWords: ['D-0413', `3'-9 1/4" B-3-2`],
      title: 'L3x3x1/4 A36',
      facts: `20'-0"   98 lb`,
      outline: angle ? sectionOutline(angle) : null,
      units: 'imperial',
      length,
      tape: length,
    };
  });

function box(shape: Shape): { left: number; right: number; top: number; bottom: number } {
  switch (shape.kind) {
    case 'line':
      return {
        left: Math.min(shape.x1, shape.x2),
        right: Math.max(shape.x1, shape.x2),
        top: Math.min(shape.y1, shape.y2),
        bottom: Math.max(shape.y1, shape.y2),
      };
    case 'polygon': {
      const xs = shape.points.map(([x]) => x);
      const ys = shape.points.map(([, y]) => y);
      return { left: Math.min(...xs), right: Math.max(...xs), top: Math.min(...ys), bottom: Math.max(...ys) };
    }
    case 'circle':
      return {
        left: shape.cx - shape.r,
        right: shape.cx + shape.r,
        top: shape.cy - shape.r,
        bottom: shape.cy + shape.r,
      };
    case 'text': {
      const width = textWidth(shape.text, shape.size, shape.font);
      const left =
        shape.align === 'left' ? shape.x : shape.align === 'right' ? shape.x - width : shape.x - width / 2;
      return { left, right: left + width, top: shape.y - shape.size * 0.75, bottom: shape.y };
    }
  }
}

describe('bar map', () => {
  it('stays inside its frame', () => {
    fc.assert(
      fc.property(drawing, fc.integer({ min: 150, max: 400 }), (bar, width) => {
        const map = drawBar(bar, width);
        for (const shape of map.shapes) {
          const { left, right, top, bottom } = box(shape);
          expect(left).toBeGreaterThanOrEqual(-0.01);
          expect(right).toBeLessThanOrEqual(map.width + 0.01);
          expect(top).toBeGreaterThanOrEqual(-0.01);
          expect(bottom).toBeLessThanOrEqual(map.height + 0.01);
        }
      }),
    );
  });
  it('no word stands on another', () => {
    fc.assert(
      fc.property(drawing, fc.integer({ min: 150, max: 400 }), (bar, width) => {
        // Faint words are the tape's own numbers; they keep their distance by construction.
        const words = drawBar(bar, width)
          .shapes.filter((shape) => shape.kind === 'text' && shape.tone !== 'faint' && shape.size < 9)
          .map(box);
        words.forEach((a, i) =>
          words.slice(i + 1).forEach((b) => {
            const apart =
              a.right <= b.left + 0.01 ||
              b.right <= a.left + 0.01 ||
              a.bottom <= b.top + 0.01 ||
              b.bottom <= a.top + 0.01;
            expect(apart).toBe(true);
          }),
        );
      }),
    );
  });
  it('pieces are to scale and in their order', () => {
    fc.assert(
      fc.property(drawing, (bar) => {
        const map = drawBar(bar, 190);
        const scale = (map.width - 2 - GUTTER) / bar.stockNm;
        map.pieces.forEach((field, i) => {
          expect(field.width).toBeCloseTo((bar.cuts[i]?.lengthNm ?? 0) * scale, 6);
          expect(field.x).toBeCloseTo(GUTTER + (bar.cuts[i]?.startNm ?? 0) * scale, 6);
        });
      }),
    );
  });
  it('prints the tape reading of every cut and of none that is not made', () => {
    const base = {
      outline: null,
      repeat: 1,
      dropWords: [],
      title: '',
      facts: '',
      units: 'metric' as const,
      headCropNm: 0,
      tailCropNm: 0,
      kerfNm: 0,
      keeps: false,
    };
    const words = (bar: BarDrawing) =>
      drawBar(bar, 190).shapes.flatMap((shape) =>
        shape.kind === 'text' && shape.tone === 'ink' && shape.piece === undefined ? [shape.text] : [],
      );
    const mm = (nm: number) => `${nm / 1e6}`;
    const cuts = [0, 1, 2].map((i) => ({ pieceId: 'p', mark: 'A', startNm: i * 2e9, lengthNm: 2e9 }));
    const full = words({ ...base, stockNm: 6e9, leftoverNm: 0, cuts, length: mm, tape: mm });
    expect(full.filter((word) => /^\d+$/.test(word))).toEqual(['2000', '4000']);
  });
});
