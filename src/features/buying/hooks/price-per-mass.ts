import { MG_PER_KG, MG_PER_LB } from '#shared/domain/units.ts';
import { currencyDigits } from '#src/lib/currencies.ts';

/** `USD/lb` or `EUR/kg`. */
export function pricePerMassUnit(units: 'imperial' | 'metric', currency: string): string {
  return `${currency}/${units === 'imperial' ? 'lb' : 'kg'}`;
}

/**
 * `0.842`: what a bar costs by mass, to a tenth of a cent, because suppliers quote it so. Shown only; money
 * is kept a bar in whole minor units.
 */
export function pricePerMass(
  priceMinor: number,
  massMg: number,
  units: 'imperial' | 'metric',
  currency: string,
): string {
  if (massMg <= 0) return '';
  const digits = currencyDigits(currency);
  const perMg = priceMinor / 10 ** digits / massMg;
  const mg = units === 'imperial' ? MG_PER_LB : MG_PER_KG;
  return (perMg * mg).toFixed(digits + 1);
}
