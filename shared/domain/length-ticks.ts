/** Whole ticks in a length that is not negative; halves go up. */
export function countTicks(nm: number, tick: number, rounding: 'nearest' | 'down' | 'up'): number {
  const rest = nm % tick;
  const below = (nm - rest) / tick;
  if (rest === 0 || rounding === 'down') return below;
  return rounding === 'up' || rest * 2 >= tick ? below + 1 : below;
}

function lowestTerms(above: number, below: number): string {
  return above % 2 === 0 ? lowestTerms(above / 2, below / 2) : `${above}/${below}`;
}

/** Feet, inches and the fraction in lowest terms from ticks of 1/denominator inch; under a foot no feet. */
export function writeInches(ticks: number, denominator: number): string {
  const over = ticks % denominator;
  const whole = (ticks - over) / denominator;
  const feet = Math.floor(whole / 12);
  const inches = whole - feet * 12;
  const fraction = over === 0 ? '' : lowestTerms(over, denominator);
  if (feet > 0) return `${feet}'-${[inches, fraction].join(' ').trim()}"`;
  return `${inches === 0 && fraction !== '' ? fraction : [inches, fraction].join(' ').trim()}"`;
}
