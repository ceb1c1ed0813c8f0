/** A count as the shop writes it: thousands set apart by a thin space, as masses and money are. */
export function wholeNumber(count: number): string {
  return String(count).replace(/\B(?=(\d{3})+$)/g, '\u2009');
}
