import { NM_PER_INCH, NM_PER_MM, type Nm } from '#shared/domain/units.ts';

/** One number of a designation, exact: a fraction of the unit, and how it was written. */
export type Size = {
  readonly numerator: number;
  readonly denominator: number;
  /** Written with a fraction bar, e.g. 3/8 or 1-1/2. */
  readonly fraction: boolean;
  /** Written as `2-1/2`, which on a list without quantities may also mean two pieces of 1/2. */
  readonly dashed: boolean;
  readonly text: string;
};

const gcd = (a: number, b: number): number => (b === 0 ? a : gcd(b, a % b));

/** Reads `3/8`, `1-1/2`, `1 1/2`, `.375`, `4`. Returns null for anything else, improper fractions such as 11/2 included. */
export function readSize(text: string): Size | null {
  const mixed = /^(?:(\d+)(?:\s+|\s*-\s*))?(\d+)\/(\d+)$/.exec(text);
  if (mixed) {
    const [, whole = '0', n = '0', d = '1'] = mixed;
    const denominator = Number(d);
    if (denominator === 0 || Number(n) >= denominator) return null;
    return {
      numerator: Number(whole) * denominator + Number(n),
      denominator,
      fraction: true,
      dashed: /\d\s*-\s*\d/.test(text),
      text,
    };
  }
  const decimal = /^(\d*)(?:[.,](\d+))?$/.exec(text);
  if (!decimal || text === '') return null;
  const [, whole = '', digits = ''] = decimal;
  if (whole === '' && digits === '') return null;
  return {
    numerator: Number(`${whole}${digits}`),
    denominator: 10 ** digits.length,
    fraction: false,
    dashed: false,
    text,
  };
}

export const valueOf = ({ numerator, denominator }: Size): number => numerator / denominator;
export const inchesToNm = ({ numerator, denominator }: Size): Nm =>
  Math.round((numerator * NM_PER_INCH) / denominator) as Nm;
export const mmToNm = ({ numerator, denominator }: Size): Nm =>
  Math.round((numerator * NM_PER_MM) / denominator) as Nm;

/** Inches as a designation writes them: `3/8`, `3-1/2`, `4`; decimals where no 64th fits. */
export function inchText(nm: number): string {
  const per64 = NM_PER_INCH / 64;
  if (nm % per64 !== 0) return String(Number((nm / NM_PER_INCH).toFixed(4)));
  const total = nm / per64;
  const whole = Math.floor(total / 64);
  const rest = total % 64;
  if (rest === 0) return String(whole);
  const g = gcd(rest, 64);
  const part = `${rest / g}/${64 / g}`;
  return whole === 0 ? part : `${whole}-${part}`;
}

/** Millimetres as a designation writes them: `50`, `60.3`. */
export const mmText = (nm: number): string => String(Number((nm / NM_PER_MM).toFixed(3)));
