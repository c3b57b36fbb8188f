import { CalcInputError } from '@kerfside/calc/common/calc-input-error.js';

/** A result, or why there is none in the calculation's own words: a value out of range is no fault of the page. */
export function tryCalculation<T>(calculate: () => T): { result: T; refusal?: undefined } | { result?: undefined; refusal: string } {
  try {
    return { result: calculate() };
  } catch (error) {
    if (error instanceof CalcInputError) return { refusal: error.message };
    throw error;
  }
}
