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

/** Reads `1,234.50`, `1 234,50`, `$ 98`. Null when it is no amount or has more digits than the currency. */
export function parseMoney(text: string, currency: string): number | null {
  const { digits } = parts(currency);
  const plain = text.replace(/[^\d.,-]/g, '');
  const decimal = /[.,](\d{1,2})$/.exec(plain);
  const whole = (decimal ? plain.slice(0, decimal.index) : plain).replace(/[.,]/g, '');
  if (!/^\d+$/.test(whole) || (decimal?.[1]?.length ?? 0) > digits) return null;
  const minor = Number(whole) * 10 ** digits + Number((decimal?.[1] ?? '').padEnd(digits, '0') || 0);
  return Number.isSafeInteger(minor) ? minor : null;
}
