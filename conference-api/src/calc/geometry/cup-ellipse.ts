import { CalcInputError } from '../common/calc-input-error.js';
import type { FieldSpec } from '../common/field-spec.js';
import { limitedNumber, readBody } from '../common/optional-input.js';
import { toDegrees } from './angles.js';

export interface CupEllipseInput {
  /** Long axis of the ellipse of the rim: over 0 to 100 000 pixels. */
  majorPx: number;
  /** Short axis: 0 up to the long axis. */
  minorPx: number;
}

export interface CupEllipseResult {
  /** Radiographic version, unsigned: 0 to 90 degrees. */
  anteversionDeg: number;
  definition: string;
  cautions: string[];
}

export const CUP_ELLIPSE_FIELDS: readonly FieldSpec[] = [
  { name: 'majorPx', type: 'number' },
  { name: 'minorPx', type: 'number' },
];

/**
 * Unsigned radiographic version from the ellipse that the rim draws on an AP film:
 * arcsine of short over long axis. Any unit will do if both axes have the same.
 *
 * Throws CalcInputError with the field: `required`, `type`, `range`, or `longer-than-major`.
 * Source: Lewinnek and others, J Bone Joint Surg Am 1978;60:217 (formula from memory; follows from
 * the projection of a circle).
 */
export function calculateCupEllipse(input: CupEllipseInput): CupEllipseResult {
  const body = readBody(input);
  const majorPx = limitedNumber(body.majorPx, 'majorPx', { over: 0, max: 100_000, unit: 'px' });
  const minorPx = limitedNumber(body.minorPx, 'minorPx', { min: 0, max: 100_000, unit: 'px' });
  if (minorPx > majorPx) {
    throw new CalcInputError('minorPx', 'longer-than-major', 'minorPx must not be longer than majorPx.');
  }
  return {
    anteversionDeg: toDegrees(Math.asin(minorPx / majorPx)),
    definition:
      'Radiographic version as the arcsine of short over long axis of the rim, after Lewinnek and others, ' +
      'J Bone Joint Surg Am 1978;60:217 (formula from memory)',
    cautions: [
      'Support for a decision only. The judgement of the treating team comes first.',
      'The sign is not known: a single AP film does not tell anteversion from retroversion.',
      'Wrong where the image is distorted or the beam is not centred as for a pelvis film.',
    ],
  };
}
