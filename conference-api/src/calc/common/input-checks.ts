import { CalcInputError } from './calc-input-error.js';

/** `value` unless it is null or absent, which is refused as `required`. */
export function requirePresent<T>(value: T | null | undefined, field: string): T {
  if (value === null || value === undefined) {
    throw new CalcInputError(field, 'required', `${field} is required.`);
  }
  return value;
}

/** A finite number within [min, max]; refused as `required`, `type` or `range`. */
export function requireNumber(
  value: unknown,
  field: string,
  min = -Number.MAX_VALUE,
  max = Number.MAX_VALUE,
): number {
  const present = requirePresent(value, field);
  if (typeof present !== 'number' || !Number.isFinite(present)) {
    throw new CalcInputError(field, 'type', `${field} must be a number.`);
  }
  if (present < min || present > max) {
    throw new CalcInputError(field, 'range', `${field} must be ${rangeInWords(min, max)}.`);
  }
  return present;
}

/** A whole number within [min, max]; refused as `required`, `type`, `integer` or `range`. */
export function requireInteger(
  value: unknown,
  field: string,
  min = Number.MIN_SAFE_INTEGER,
  max = Number.MAX_SAFE_INTEGER,
): number {
  const number = requireNumber(value, field);
  if (!Number.isInteger(number)) {
    throw new CalcInputError(field, 'integer', `${field} must be a whole number.`);
  }
  return requireNumber(number, field, min, max);
}

/** A list of at most `maxLength` entries; refused as `required`, `type` or `too-many`. */
export function requireArray(value: unknown, field: string, maxLength = 100_000): unknown[] {
  const present = requirePresent(value, field);
  if (!Array.isArray(present)) {
    throw new CalcInputError(field, 'type', `${field} must be a list.`);
  }
  if (present.length > maxLength) {
    throw new CalcInputError(field, 'too-many', `${field} may have ${maxLength} entries at most.`);
  }
  return present;
}

/** A non-empty string of at most `maxLength` characters. */
export function requireString(value: unknown, field: string, maxLength = 500): string {
  const present = requirePresent(value, field);
  if (typeof present !== 'string') {
    throw new CalcInputError(field, 'type', `${field} must be text.`);
  }
  if (present.trim() === '') {
    throw new CalcInputError(field, 'required', `${field} must not be empty.`);
  }
  if (present.length > maxLength) {
    throw new CalcInputError(field, 'too-long', `${field} may have ${maxLength} characters at most.`);
  }
  return present;
}

/** One of the listed words; refused as `required`, `type` or `choice`. */
export function requireChoice<T extends string>(
  value: unknown,
  field: string,
  choices: readonly T[],
): T {
  const text = requirePresent(value, field);
  if (typeof text !== 'string') {
    throw new CalcInputError(field, 'type', `${field} must be text.`);
  }
  const found = choices.find((choice) => choice === text);
  if (found === undefined) {
    throw new CalcInputError(field, 'choice', `${field} must be one of: ${choices.join(', ')}.`);
  }
  return found;
}

/** A JSON object (not a list, not null). */
export function requireObject(value: unknown, field: string): Record<string, unknown> {
  const present = requirePresent(value, field);
  if (typeof present !== 'object' || Array.isArray(present)) {
    throw new CalcInputError(field, 'type', `${field} must be an object.`);
  }
  return present as Record<string, unknown>;
}

/** An object without names other than the listed ones. */
export function requireOnlyKnown(
  object: Record<string, unknown>,
  field: string,
  known: readonly string[],
): void {
  for (const name of Object.keys(object)) {
    if (!known.includes(name)) {
      const path = `${field}.${name}`;
      throw new CalcInputError(path, 'unknown-field', `${path} is not a known field.`);
    }
  }
}

/**
 * A rectangular table: rows of one length with each cell read by `readCell`.
 * An empty table is legal here; what it means is for the caller to say.
 */
export function requireMatrix<T>(
  value: unknown,
  field: string,
  readCell: (cell: unknown, path: string) => T,
): T[][] {
  const rows = requireArray(value, field).map((row, i) => requireArray(row, `${field}[${i}]`));
  const width = rows[0]?.length ?? 0;
  return rows.map((row, i) => {
    if (row.length !== width) {
      const path = `${field}[${i}]`;
      throw new CalcInputError(path, 'shape', `${path} must have ${width} entries like the first.`);
    }
    return row.map((cell, j) => readCell(cell, `${field}[${i}][${j}]`));
  });
}

function rangeInWords(min: number, max: number): string {
  if (max === Number.MAX_VALUE || max === Number.MAX_SAFE_INTEGER) return `${min} or more`;
  if (min === -Number.MAX_VALUE || min === Number.MIN_SAFE_INTEGER) return `${max} or less`;
  return `from ${min} to ${max}`;
}
