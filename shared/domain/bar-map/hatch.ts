import type { Shape } from '#shared/domain/bar-map/shapes.ts';

/** Like pieces share one hatch; the first kind has none. Told apart in black and white, and quiet enough to write on. */
export const HATCHES = 6;

/** Lines of hatch number `index` inside a strip, clipped to it. */
export function hatchStrip(index: number, x: number, y: number, width: number, height: number): Shape[] {
  const line = (x1: number, y1: number, x2: number, y2: number): Shape => ({
    kind: 'line',
    x1,
    y1,
    x2,
    y2,
    weight: 0.12,
    tone: 'faint',
  });
  const slants = (step: number, up: boolean): Shape[] => {
    const lines: Shape[] = [];
    for (let at = x - height; at < x + width; at += step) {
      // A 45° stroke from the strip's foot, cut off at both ends of the piece.
      const from = Math.max(at, x);
      const to = Math.min(at + height, x + width);
      if (to <= from) continue;
      const [a, b] = [from - at, to - at];
      lines.push(up ? line(from, y + height - a, to, y + height - b) : line(from, y + a, to, y + b));
    }
    return lines;
  };
  switch (index % HATCHES) {
    case 1:
      return slants(1.6, true);
    case 2:
      return slants(1.6, false);
    case 3: {
      const marks: Shape[] = [];
      for (let at = x + 0.8; at < x + width; at += 1.6) marks.push(line(at, y, at, y + height));
      return marks;
    }
    case 4:
      return [
        line(x, y + height * 0.33, x + width, y + height * 0.33),
        line(x, y + height * 0.66, x + width, y + height * 0.66),
      ];
    case 5:
      return [...slants(2, true), ...slants(2, false)];
    default:
      return [];
  }
}
