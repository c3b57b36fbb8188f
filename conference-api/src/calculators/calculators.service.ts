import { Injectable } from '@nestjs/common';
import type { FieldSpec } from '../calc/common/field-spec.js';
import { type FieldError, Problem } from '../common/problems/problem.js';
import { type CalculatorName, CALCULATORS } from './registry.js';

@Injectable()
export class CalculatorsService {
  /** Refuses unknown fields and wrong types by field; the calculation refuses what is out of its range. */
  calculate(name: string, body: unknown): object {
    if (!Object.hasOwn(CALCULATORS, name)) throw new Problem('not-found', 'There is no calculator of this name.');
    if (typeof body !== 'object' || body === null || Array.isArray(body)) throw new Problem('invalid', 'Send the fields as one JSON object.');
    const { fields, calculate } = CALCULATORS[name as CalculatorName];
    const errors = fieldErrors(fields, body as Record<string, unknown>);
    if (errors.length) throw new Problem('invalid', errors[0]!.message, errors);
    return calculate(body as never);
  }
}

function fieldErrors(fields: readonly FieldSpec[], body: Record<string, unknown>): FieldError[] {
  return Object.entries(body).flatMap(([field, value]): FieldError[] => {
    const spec = fields.find(({ name }) => name === field);
    if (!spec) return [{ field, code: 'unknown-field', message: `${field} is not a field of this calculator.` }];
    if (value === null || typeOf(value) === spec.type) return [];
    return [{ field, code: 'type', message: `${field} must be of the type ${spec.type}.` }];
  });
}

const typeOf = (value: unknown) => (Array.isArray(value) ? 'array' : typeof value);
