/** The true cross-section in millimetres, y down, for the drawing at a bar's datum end. */
import { mm } from '#shared/domain/section/mass-formulas.ts';
import type { Section } from '#shared/domain/section/types.ts';

export type OutlineShape =
  | {
      readonly kind: 'polygon';
      readonly points: readonly (readonly [x: number, y: number])[];
      readonly hole: boolean;
    }
  | {
      readonly kind: 'circle';
      readonly cx: number;
      readonly cy: number;
      readonly r: number;
      readonly hole: boolean;
    };
export type Outline = {
  readonly width: number;
  readonly height: number;
  readonly shapes: readonly OutlineShape[];
};

const rect = (x: number, y: number, w: number, h: number, hole = false): OutlineShape => ({
  kind: 'polygon',
  points: [
    [x, y],
    [x + w, y],
    [x + w, y + h],
    [x, y + h],
  ],
  hole,
});

/**
 * Channels and beams are known by depth and mass only, so flange and walls take ordinary proportions (flange 0.4 of the depth for
 * channels and 0.6 for beams unless named) with one wall thickness that gives the section's area; from memory, for the drawing alone.
 */
function rolled(section: Section): Outline {
  const d = section.dimensions;
  const h = mm(d.depth ?? 0);
  const beam = section.family === 'beam';
  const b = d.flange ? mm(d.flange) : h * (/^HE[AB]/.test(section.name) ? 1 : beam ? 0.6 : 0.4);
  const area = section.mass.per === 'length' ? section.mass.mgPerM / 7850 : 0;
  // area = 2bt + (h − 2t)t, solved for t.
  const p = 2 * b + h;
  const t = Math.min(h / 4, b / 3, (p - Math.sqrt(Math.max(0, p * p - 8 * area))) / 4);
  if (!beam)
    return {
      width: b,
      height: h,
      shapes: [
        {
          kind: 'polygon',
          hole: false,
          points: [
            [0, 0],
            [b, 0],
            [b, t],
            [t, t],
            [t, h - t],
            [b, h - t],
            [b, h],
            [0, h],
          ],
        },
      ],
    };
  const l = (b - t) / 2;
  const r = (b + t) / 2;
  return {
    width: b,
    height: h,
    shapes: [
      {
        kind: 'polygon',
        hole: false,
        points: [
          [0, 0],
          [b, 0],
          [b, t],
          [r, t],
          [r, h - t],
          [b, h - t],
          [b, h],
          [0, h],
          [0, h - t],
          [l, h - t],
          [l, t],
          [0, t],
        ],
      },
    ],
  };
}

/** Outline of any section; sheets are drawn as a strip twelve times as wide as thick. */
export function sectionOutline(section: Section): Outline {
  const d = section.dimensions;
  switch (section.family) {
    case 'angle': {
      const [a, b, t] = [mm(d.legA ?? 0), mm(d.legB ?? 0), mm(d.thickness ?? 0)];
      return {
        width: b,
        height: a,
        shapes: [
          {
            kind: 'polygon',
            hole: false,
            points: [
              [0, 0],
              [t, 0],
              [t, a - t],
              [b, a - t],
              [b, a],
              [0, a],
            ],
          },
        ],
      };
    }
    case 'flat': {
      const [w, t] = [mm(d.width ?? 0), mm(d.thickness ?? 0)];
      return { width: w, height: t, shapes: [rect(0, 0, w, t)] };
    }
    case 'round': {
      const size = mm(d.diameter ?? 0);
      return {
        width: size,
        height: size,
        shapes: [{ kind: 'circle', cx: size / 2, cy: size / 2, r: size / 2, hole: false }],
      };
    }
    case 'square': {
      const size = mm(d.width ?? 0);
      return { width: size, height: size, shapes: [rect(0, 0, size, size)] };
    }
    case 'channel':
    case 'beam':
      return rolled(section);
    case 'tube':
    case 'gauge-tube':
    case 'round-tube':
    case 'pipe': {
      const wall = mm(d.wall ?? 0);
      if (d.diameter !== undefined) {
        const size = mm(d.diameter);
        const circle = (r: number, hole: boolean): OutlineShape => ({
          kind: 'circle',
          cx: size / 2,
          cy: size / 2,
          r,
          hole,
        });
        return {
          width: size,
          height: size,
          shapes: [circle(size / 2, false), circle(size / 2 - wall, true)],
        };
      }
      const [w, h] = [mm(d.width ?? 0), mm(d.height ?? 0)];
      return {
        width: w,
        height: h,
        shapes: [rect(0, 0, w, h), rect(wall, wall, w - 2 * wall, h - 2 * wall, true)],
      };
    }
    case 'plate':
    case 'floor-plate':
    case 'sheet': {
      const t = mm(d.thickness ?? 0);
      return { width: 12 * t, height: t, shapes: [rect(0, 0, 12 * t, t)] };
    }
  }
}
