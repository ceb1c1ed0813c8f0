/** Money is whole minor units with its currency beside it (ISO 4217). */

function parts(currency: string): { digits: number; sign: string } {
  const format = new Intl.NumberFormat('en-US', {
    style: 'currency',
    currency,
    currencyDisplay: 'narrowSymbol',
  });
  return {
    digits: format.resolvedOptions().maximumFractionDigits ?? 2,
    sign: format.formatToParts(0).find(({ type }) => type === 'currency')?.value ?? currency,
  };
}

/** How many minor units make one of the currency: 100 for USD and EUR, 1 for JPY. */
export const minorPerUnit = (currency: string): number => 10 ** parts(currency).digits;

/** `$ 18 462.10`, thin spaces between thousands. Fractions of a minor unit are rounded to the nearest. */
export function formatMoney(minor: number, currency: string): string {
  const { digits, sign } = parts(currency);
  const rounded = Math.round(Math.abs(minor));
  const [whole = '', part] = (rounded / 10 ** digits).toFixed(digits).split('.');
  const grouped = whole.replace(/\B(?=(\d{3})+$)/g, '\u2009');
  return `${minor < 0 && rounded !== 0 ? '−' : ''}${sign}\u00a0${grouped}${part ? `.${part}` : ''}`;
}

/** An amount by its two usual writings: `1,234.50` or `1 234.50`, and `1.234,50` or `1 234,50`; signs and code aside. */
const POINT = /^(\d{1,3}(?:[, ]\d{3})+|\d+)(?:\.(\d+))?$/;
const COMMA = /^(\d{1,3}(?:[. ]\d{3})+|\d+),(\d+)$/;

/**
 * Reads `1,234.50`, `1 234,50`, `$ 98`, `98 USD`. Null when it is no amount, has more digits than the currency
 * (`98.405` in dollars is asked, never taken for thousands), or is past whole minor units.
 */
export function parseMoney(text: string, currency: string): number | null {
  const { digits, sign } = parts(currency);
  const plain = text
    .replace(/[\s\u2009\u202f]+/g, ' ')
    .replaceAll(sign, '')
    .replace(new RegExp(currency, 'i'), '')
    .trim();
  const [, whole, part = ''] = POINT.exec(plain) ?? COMMA.exec(plain) ?? [];
  if (whole === undefined || part.length > digits) return null;
  const minor = Number(whole.replace(/[., ]/g, '')) * 10 ** digits + Number(part.padEnd(digits, '0') || 0);
  return Number.isSafeInteger(minor) ? minor : null;
}
