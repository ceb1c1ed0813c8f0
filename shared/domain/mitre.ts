/** Geometry of mitred ends: angles in degrees from square, lengths in one unit throughout. */

const tan = (degrees: number): number => Math.tan((degrees * Math.PI) / 180);
const cos = (degrees: number): number => Math.cos((degrees * Math.PI) / 180);

/** How far the long point stands beyond the short one on a width: w tan a. */
export const mitreOffset = (width: number, degrees: number): number => width * tan(degrees);

/** Short point of a piece with both ends mitred by opposite hands. */
export const shortPoint = (longPoint: number, width: number, degrees: number): number =>
  longPoint - 2 * mitreOffset(width, degrees);

/**
 * Stock that `count` trapezoids take when every second one is flipped and neighbours share a cut:
 * n (L − w tan a) + w tan a + (n − 1) k / cos a. Only for sections that may be flipped; an angle may not.
 */
export const flippedLength = (
  count: number,
  longPoint: number,
  width: number,
  degrees: number,
  kerf: number,
): number =>
  count * (longPoint - mitreOffset(width, degrees)) +
  mitreOffset(width, degrees) +
  ((count - 1) * kerf) / cos(degrees);

/** Stock that `count` of them take unflipped: long point after long point, a kerf between two. */
export const unflippedLength = (count: number, longPoint: number, kerf: number): number =>
  count * longPoint + (count - 1) * kerf;
