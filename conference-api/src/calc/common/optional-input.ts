import { CalcInputError } from './calc-input-error.js';
import { requireChoice } from './input-checks.js';

/** What a number may be; `over` and `below` exclude the limit itself. */
export interface NumberLimits {
  readonly min?: number;
  readonly max?: number;
  readonly over?: number;
  readonly below?: number;
  readonly integer?: boolean;
  readonly unit?: string;
}

const isUnknown = (value: unknown): value is null | undefined =>
  value === null || value === undefined;

/** The body as an object; anything else is refused as `type` on the field `body`. */
export function readBody(body: unknown): Record<string, unknown> {
  if (typeof body !== 'object' || body === null || Array.isArray(body)) {
    throw new CalcInputError('body', 'type', 'The body must be a JSON object.');
  }
  return body as Record<string, unknown>;
}

/** A finite number within the limits, or null when it is null or absent (not known). */
export function optionalNumber(
  value: unknown,
  field: string,
  limits: NumberLimits = {},
): number | null {
  return isUnknown(value) ? null : limitedNumber(value, field, limits);
}

/** A finite number within the limits; refused as `required`, `type`, `integer` or `range`. */
export function limitedNumber(value: unknown, field: string, limits: NumberLimits = {}): number {
  if (isUnknown(value)) throw new CalcInputError(field, 'required', `${field} is required.`);
  if (typeof value !== 'number' || !Number.isFinite(value)) {
    throw new CalcInputError(field, 'type', `${field} must be a number.`);
  }
  if (limits.integer && !Number.isInteger(value)) {
    throw new CalcInputError(field, 'integer', `${field} must be a whole number.`);
  }
  const { min = -Infinity, max = Infinity, over = -Infinity, below = Infinity } = limits;
  if (value < min || value > max || value <= over || value >= below) {
    throw new CalcInputError(field, 'range', `${field} must be ${limitsInWords(limits)}.`);
  }
  return value;
}

/** True, false, or null when not known; other values are refused as `type`. */
export function optionalBoolean(value: unknown, field: string): boolean | null {
  if (isUnknown(value)) return null;
  if (typeof value !== 'boolean') {
    throw new CalcInputError(field, 'type', `${field} must be true or false.`);
  }
  return value;
}

/** One of the listed words, or null when not known. */
export function optionalChoice<T extends string>(
  value: unknown,
  field: string,
  choices: readonly T[],
): T | null {
  return isUnknown(value) ? null : requireChoice(value, field, choices);
}

function limitsInWords({ min, max, over, below, unit }: NumberLimits): string {
  const low = over !== undefined ? `over ${over}` : min !== undefined ? `${min} or more` : '';
  const high = below !== undefined ? `below ${below}` : max !== undefined ? `${max} or less` : '';
  const words = [low, high].filter((part) => part !== '').join(' and ');
  return unit === undefined ? words : `${words} (${unit})`;
}
