// Each takes digits only, without separators.

const digitsOf = (text: string): number[] => Array.from(text, Number);
const sameDigits = (text: string): boolean => /^(\d)\1*$/.test(text);

/**
 * Luhn check over any number of digits; a number of one repeated digit does not count.
 * Source: ISO/IEC 7812-1 annex B (from memory).
 */
export function passesLuhn(number: string): boolean {
  if (!/^\d{2,}$/.test(number) || sameDigits(number)) return false;
  const sum = digitsOf(number)
    .reverse()
    .map((digit, i) => (i % 2 === 0 ? digit : digit * 2 > 9 ? digit * 2 - 9 : digit * 2))
    .reduce((total, digit) => total + digit, 0);
  return sum % 10 === 0;
}

/**
 * NHS number of the United Kingdom: ten digits, weights 10 to 2, check digit 11 minus the rest
 * modulo 11, 11 becomes 0 and 10 is never issued. Source: NHS data dictionary, as in python-stdnum.
 */
export function isNhsNumber(number: string): boolean {
  if (!/^\d{10}$/.test(number) || sameDigits(number)) return false;
  const digits = digitsOf(number);
  const sum = digits.slice(0, 9).reduce((total, digit, i) => total + digit * (10 - i), 0);
  return (11 - (sum % 11)) % 11 === digits[9];
}

const BC_WEIGHTS = [2, 4, 8, 5, 10, 9, 7, 3] as const;

/** Personal health number of British Columbia: ten digits, the first 9. Source: python-stdnum ca/bc_phn. */
export function isBcHealthNumber(number: string): boolean {
  if (!/^9\d{9}$/.test(number) || sameDigits(number)) return false;
  const digits = digitsOf(number);
  const sum = BC_WEIGHTS.reduce((total, weight, i) => total + ((weight * (digits[i + 1] ?? 0)) % 11), 0);
  return (11 - (sum % 11)) % 11 === digits[9];
}

/** Health card of Ontario: ten digits with a Luhn check (from memory). */
export const isOntarioHealthNumber = (number: string): boolean => /^[1-9]\d{9}$/.test(number) && passesLuhn(number);

const MEDICARE_WEIGHTS = [1, 3, 7, 9, 1, 3, 7, 9] as const;

/**
 * Medicare card of Australia: eight digits (the first 2 to 6), a check digit, then the issue number
 * and the person's number where given, so 9 to 11 digits (rule from memory).
 */
export function isAustralianMedicare(number: string): boolean {
  if (!/^[2-6]\d{8,10}$/.test(number) || sameDigits(number)) return false;
  const digits = digitsOf(number);
  const sum = MEDICARE_WEIGHTS.reduce((total, weight, i) => total + weight * (digits[i] ?? 0), 0);
  return sum % 10 === digits[8];
}

/** Social insurance number of Canada: nine digits with a Luhn check. */
export const isCanadianSin = (number: string): boolean => /^\d{9}$/.test(number) && passesLuhn(number);

/** Social security number of the United States: the ranges that were ever issued. */
export const isUsSocialSecurity = (number: string): boolean =>
  /^(?!000|666|9)\d{3}(?!00)\d{2}(?!0000)\d{4}$/.test(number);
