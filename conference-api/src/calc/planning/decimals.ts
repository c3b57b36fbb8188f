/** A finite number as it is written in decimal: digits · 10^−decimals, exactly. */
interface Decimal {
  digits: bigint;
  decimals: number;
}

/** Numbers brought to one power of ten, so that sums and comparisons are exact. */
export interface ScaledNumbers {
  units: bigint[];
  /** A unit is 10^−decimals. */
  decimals: number;
}

/** Scales finite numbers ≥ 0 to whole units of their finest decimal place. */
export function scaleNumbers(numbers: readonly number[]): ScaledNumbers {
  const parsed = numbers.map(parseDecimal);
  const decimals = parsed.reduce((most, number) => Math.max(most, number.decimals), 0);
  return {
    units: parsed.map((number) => number.digits * 10n ** BigInt(decimals - number.decimals)),
    decimals,
  };
}

/** The number nearest to `units` · 10^−decimals. */
export function unscale(units: bigint, decimals: number): number {
  return Number(`${units}e-${decimals}`);
}

function parseDecimal(number: number): Decimal {
  const [mantissa = '0', exponent = '0'] = String(number).split('e');
  const [whole = '0', fraction = ''] = mantissa.split('.');
  const decimals = fraction.length - Number(exponent);
  const digits = BigInt(whole + fraction);
  return decimals >= 0
    ? { digits, decimals }
    : { digits: digits * 10n ** BigInt(-decimals), decimals: 0 };
}
