/**
 * Masses from geometry. US practice: 490 lb/ft3, the AISC convention (from memory; 40.83 lb/ft2 per inch of plate agrees).
 * Metric: 7850 kg/m3. Areas in square millimetres, results in milligrams per metre or per square metre.
 */
import { MG_PER_LB, NM_PER_FOOT, NM_PER_M, NM_PER_MM } from '#shared/domain/units.ts';
import type { System } from '#shared/domain/section/types.ts';

const MM_PER_INCH = 25.4;
const FT_PER_M = NM_PER_M / NM_PER_FOOT;
/** 490 lb/ft3 = 7849.05 kg/m3. */
const US_MG_PER_MM3 = (490 * MG_PER_LB) / (12 * MM_PER_INCH) ** 3;
const EN_MG_PER_MM3 = 7.85;

export const mm = (nm: number): number => nm / NM_PER_MM;
export const lbPerFtToMgPerM = (lbPerFt: number): number => Math.round(lbPerFt * MG_PER_LB * FT_PER_M);
export const lbPerFt2ToMgPerM2 = (lbPerFt2: number): number =>
  Math.round(lbPerFt2 * MG_PER_LB * FT_PER_M ** 2);
export const kgPerMToMgPerM = (kgPerM: number): number => Math.round(kgPerM * 1_000_000);

const density = (system: System) => (system === 'US' ? US_MG_PER_MM3 : EN_MG_PER_MM3);
export const areaToMgPerM = (areaMm2: number, system: System): number =>
  Math.round(areaMm2 * 1000 * density(system));
/** Plate: thickness in nanometres to milligrams per square metre. */
export const thicknessToMgPerM2 = (thicknessNm: number, system: System): number =>
  Math.round(mm(thicknessNm) * 1_000_000 * density(system));

export const roundArea = (d: number): number => (Math.PI / 4) * d * d;
export const roundTubeArea = (d: number, t: number): number => Math.PI * (d - t) * t;

/**
 * Square and rectangular tube with rounded corners. Outside radius: US twice the nominal wall; EN 10219-2 twice the
 * wall to 6 mm, 2.5 times to 10 mm, three times above; the inside radius is one wall less.
 */
export function boxArea(b: number, h: number, t: number, system: System): number {
  const factor = system === 'US' || t <= 6 ? 2 : t <= 10 ? 2.5 : 3;
  const outer = factor * t;
  const inner = outer - t;
  return 2 * t * (b + h - 2 * t) - (4 - Math.PI) * (outer ** 2 - inner ** 2);
}

/** Root radii of EN 10056-1 by leg in millimetres (from memory; between two sizes the smaller leg's counts). */
const ROOT_RADIUS: readonly (readonly [leg: number, r1: number])[] = [
  [20, 3.5],
  [35, 4],
  [40, 6],
  [45, 7],
  [55, 8],
  [65, 9],
  [75, 9],
  [80, 10],
  [90, 11],
  [100, 12],
  [120, 13],
  [150, 16],
  [180, 18],
];

/** Angle legs and thickness; EN ones with root radius r1 and toe radius r1/2, US ones without (their fillets differ by mill). */
export function angleArea(a: number, b: number, t: number, system: System): number {
  const plain = t * (a + b - t);
  if (system === 'US') return plain;
  const longer = Math.max(a, b);
  const r1 = ROOT_RADIUS.reduce((found, [leg, radius]) => (longer >= leg ? radius : found), 3.5);
  return plain + (1 - Math.PI / 4) * (r1 ** 2 - 2 * (r1 / 2) ** 2);
}
