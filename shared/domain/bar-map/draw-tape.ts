/** The measuring tape under a bar: ticks as fine as can be told apart, numbers as often as they fit. */
import { textWidth, type Shape } from '#shared/domain/bar-map/shapes.ts';
import { NM_PER_FOOT, NM_PER_INCH, NM_PER_M, NM_PER_MM } from '#shared/domain/units.ts';

export type TapeUnits = 'imperial' | 'metric';

const STEPS: Readonly<Record<TapeUnits, readonly number[]>> = {
  imperial: [
    NM_PER_INCH,
    3 * NM_PER_INCH,
    6 * NM_PER_INCH,
    NM_PER_FOOT,
    2 * NM_PER_FOOT,
    5 * NM_PER_FOOT,
    10 * NM_PER_FOOT,
  ],
  metric: [
    10 * NM_PER_MM,
    50 * NM_PER_MM,
    100 * NM_PER_MM,
    500 * NM_PER_MM,
    NM_PER_M,
    2 * NM_PER_M,
    5 * NM_PER_M,
  ],
};
const LABEL = 2;
const HEIGHT = 4.6;

const labelOf = (nm: number, units: TapeUnits) =>
  units === 'imperial' ? `${nm / NM_PER_FOOT}'` : `${nm / NM_PER_M} m`;

export function drawTape(
  x0: number,
  x1: number,
  top: number,
  lengthNm: number,
  units: TapeUnits,
): { shapes: Shape[]; bottom: number } {
  const scale = (x1 - x0) / lengthNm;
  const steps = STEPS[units];
  const fine = steps.find((step) => step * scale >= 0.9) ?? steps.at(-1) ?? lengthNm;
  const whole = units === 'imperial' ? NM_PER_FOOT : NM_PER_M;
  const named =
    steps.find((step) => step >= whole && step * scale >= textWidth('00 m', LABEL) * 1.6) ??
    steps.at(-1) ??
    lengthNm;
  const shapes: Shape[] = [
    {
      kind: 'polygon',
      points: [
        [x0, top],
        [x1, top],
        [x1, top + HEIGHT],
        [x0, top + HEIGHT],
      ],
      fill: 'soap',
      weight: 0.15,
    },
  ];
  for (let k = 0; k * fine <= lengthNm; k++) {
    const nm = k * fine;
    const x = x0 + nm * scale;
    const long = nm % whole === 0;
    const half = nm % (whole / 2) === 0;
    shapes.push({
      kind: 'line',
      x1: x,
      y1: top,
      x2: x,
      y2: top + (long ? 2.6 : half ? 1.8 : 1),
      weight: long ? 0.25 : 0.12,
      tone: 'ink',
    });
  }
  for (let nm = named; nm * scale < x1 - x0 - 4; nm += named)
    shapes.push({
      kind: 'text',
      x: x0 + nm * scale + 0.6,
      y: top + HEIGHT - 0.6,
      text: labelOf(nm, units),
      size: LABEL,
      align: 'left',
      font: 'mono',
      bold: false,
      tone: 'faint',
    });
  return { shapes, bottom: top + HEIGHT };
}
