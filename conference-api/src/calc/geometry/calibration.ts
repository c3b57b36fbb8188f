import type { FieldSpec } from '../common/field-spec.js';
import { requireArray } from '../common/input-checks.js';
import { limitedNumber, readBody } from '../common/optional-input.js';

export interface CalibrationInput {
  /** True size of the object measured: over 0 to 1000 mm. */
  trueMm: number;
  /** The same on the image: over 0 to 100 000 pixels. */
  measuredPx: number;
  /** Lengths to convert, 1000 at most, each 0 to 100 000 pixels. */
  lengthsPx?: number[] | null;
}

export interface CalibrationResult {
  mmPerPx: number;
  lengthsMm: number[];
  definition: string;
  cautions: string[];
}

export const CALIBRATION_FIELDS: readonly FieldSpec[] = [
  { name: 'trueMm', type: 'number' },
  { name: 'measuredPx', type: 'number' },
  { name: 'lengthsPx', type: 'array' },
];

/**
 * Scale of an image from an object of known size, usually the prosthetic head, and lengths in mm.
 *
 * Throws CalcInputError with the field: `required`, `type`, `range` or `too-many`.
 * Source: the ratio of true to measured size (common practice).
 */
export function calculateCalibration(input: CalibrationInput): CalibrationResult {
  const body = readBody(input);
  const trueMm = limitedNumber(body.trueMm, 'trueMm', { over: 0, max: 1000, unit: 'mm' });
  const measuredPx = limitedNumber(body.measuredPx, 'measuredPx', { over: 0, max: 100_000, unit: 'px' });
  const lengthsPx = requireArray(body.lengthsPx ?? [], 'lengthsPx', 1000).map((length) =>
    limitedNumber(length, 'lengthsPx', { min: 0, max: 100_000, unit: 'px each' }),
  );
  return {
    mmPerPx: trueMm / measuredPx,
    lengthsMm: lengthsPx.map((length) => (length * trueMm) / measuredPx),
    definition: 'True size over measured size of an object of known size in the plane of the joint',
    cautions: [
      'Support for a decision only. The judgement of the treating team comes first.',
      'Holds only at the depth of the object measured; a marker at another depth misleads.',
      'Use the true head diameter (22.225 mm for a nominal 22) of the hip that is measured.',
      'Pixels must be as wide as high, or lengths and angles are off.',
    ],
  };
}
