import { ValidationPipe, type ValidationError } from '@nestjs/common';
import { type FieldError, Problem } from './problem.js';

// where a value breaks several rules the first of these says it best: what it is comes before how long it is
const FIRST = ['whitelistValidation', 'nestedValidation', 'isString', 'isNumber', 'isInt', 'isBoolean', 'isArray', 'isObject', 'isUuid', 'isEmail', 'isIn', 'isNotEmpty'];

/** Flattens nested validation errors to `field.path`, one entry each. */
export function fieldErrors(errors: ValidationError[], prefix = ''): FieldError[] {
  return errors.flatMap((error) => {
    const field = /^\d+$/.test(error.property) ? `${prefix}[${error.property}]` : prefix ? `${prefix}.${error.property}` : error.property;
    const constraints = error.constraints ?? {};
    const rule = FIRST.find((name) => name in constraints) ?? Object.keys(constraints)[0];
    const own = rule ? [toFieldError(field, rule, constraints[rule]!, error.value)] : [];
    return [...own, ...fieldErrors(error.children ?? [], field)];
  });
}

function toFieldError(field: string, rule: string, message: string, value: unknown): FieldError {
  if (rule === 'whitelistValidation') return { field, code: 'unknown-field', message: `${field} is not a field of this request.` };
  if (value === undefined) return { field, code: 'required', message: `${field} is missing.` };
  return { field, code: rule.replace(/[A-Z]/g, (letter) => `-${letter.toLowerCase()}`), message: `${message}.` };
}

/** Refuses unknown fields and wrong types with 422 by field. */
export const validationPipe = () =>
  new ValidationPipe({
    transform: true,
    whitelist: true,
    forbidNonWhitelisted: true,
    forbidUnknownValues: true,
    exceptionFactory: (errors) => {
      const list = fieldErrors(errors);
      return new Problem('invalid', list[0]?.message ?? 'The body does not fit.', list);
    },
  });
