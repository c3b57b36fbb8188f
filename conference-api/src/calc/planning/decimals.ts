/** Numbers brought to one power of ten, so that sums and comparisons are exact. */
export interface ScaledNumbers {
  /** Whole units of 10^−decimals. */
  units: number[];
  decimals: number;
}

/** How many decimals a finite number has when written out in full. */
export function countDecimals(number: number): number {
  const [mantissa = '', exponent = '0'] = String(number).split('e');
  const fraction = mantissa.split('.')[1] ?? '';
  return Math.max(0, fraction.length - Number(exponent));
}

/** Scales finite numbers to whole units of the finest decimal place among them. */
export function scaleNumbers(numbers: readonly number[]): ScaledNumbers {
  const decimals = numbers.reduce((most, number) => Math.max(most, countDecimals(number)), 0);
  // Multiplying would round twice; the decimal text with a shifted exponent rounds to the unit itself.
  return { units: numbers.map((number) => shift(number, decimals)), decimals };
}

/** The number nearest to `units` · 10^−decimals. */
export function unscale(units: number, decimals: number): number {
  return shift(units, -decimals);
}

function shift(number: number, places: number): number {
  const [mantissa = '0', exponent = '0'] = String(number).split('e');
  return Number(`${mantissa}e${Number(exponent) + places}`);
}
