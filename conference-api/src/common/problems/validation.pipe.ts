import { ValidationPipe, type ValidationError } from '@nestjs/common';
import { type FieldError, Problem } from './problem.js';

/** Flattens nested validation errors to `field.path`, one entry each. */
export function fieldErrors(errors: ValidationError[], prefix = ''): FieldError[] {
  return errors.flatMap((error) => {
    const field = /^\d+$/.test(error.property) ? `${prefix}[${error.property}]` : prefix ? `${prefix}.${error.property}` : error.property;
    const own = Object.entries(error.constraints ?? {}).map(([code, message]) => ({
      field,
      code: code === 'whitelistValidation' ? 'unknown-field' : code.replace(/[A-Z]/g, (letter) => `-${letter.toLowerCase()}`),
      message: code === 'whitelistValidation' ? `${field} is not a field of this request.` : `${message}.`,
    }));
    return [...own, ...fieldErrors(error.children ?? [], field)];
  });
}

/** Refuses unknown fields and wrong types with 422 by field. */
export const validationPipe = () =>
  new ValidationPipe({
    transform: true,
    whitelist: true,
    forbidNonWhitelisted: true,
    forbidUnknownValues: true,
    stopAtFirstError: true,
    exceptionFactory: (errors) => {
      const list = fieldErrors(errors);
      return new Problem('invalid', list[0]?.message ?? 'The body does not fit.', list);
    },
  });
