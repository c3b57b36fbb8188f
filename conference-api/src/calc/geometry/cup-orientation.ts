import type { FieldSpec } from '../common/field-spec.js';
import { requireChoice } from '../common/input-checks.js';
import { limitedNumber, optionalNumber, readBody } from '../common/optional-input.js';
import { anglesFromAxis, axisFromAngles, ORIENTATION_DEFINITIONS, tiltAxis } from './cup-axis.js';
import type { CupAngles, OrientationDefinition } from './cup-axis.js';

export type { CupAngles, OrientationDefinition } from './cup-axis.js';

export interface CupOrientationInput {
  from: OrientationDefinition;
  /** 0 to 90 degrees. */
  inclinationDeg: number;
  /** Over -90 and below 90 degrees; retroversion is negative. */
  anteversionDeg: number;
  /** -45 to 45 degrees, posterior positive; 0 when not given. */
  pelvicTiltDeg?: number | null;
}

export interface CupOrientationResult {
  radiographic: CupAngles;
  operative: CupAngles;
  anatomical: CupAngles;
  /** Radiographic angles within 30 to 50 and 5 to 25 degrees, the edges included. */
  safeZone: { inclination: boolean; anteversion: boolean };
  definition: string;
  cautions: string[];
}

export const CUP_ORIENTATION_FIELDS: readonly FieldSpec[] = [
  { name: 'from', type: 'string' },
  { name: 'inclinationDeg', type: 'number' },
  { name: 'anteversionDeg', type: 'number' },
  { name: 'pelvicTiltDeg', type: 'number' },
];

// Far under any error of measurement; keeps an exact edge inside after converting to and fro.
const EDGE_DEG = 1e-9;

/**
 * Cup inclination and version in the three published definitions, after pelvic tilt if given,
 * and whether the radiographic angles lie in the zone of 40±10 and 15±10 degrees.
 *
 * Throws CalcInputError with the field: `required`, `type`, `choice` or `range`.
 * Sources: Murray, J Bone Joint Surg Br 1993;75-B:228 (definitions; formulas derived from them);
 * Lewinnek and others, J Bone Joint Surg Am 1978;60:217 (zone).
 */
export function calculateCupOrientation(input: CupOrientationInput): CupOrientationResult {
  const body = readBody(input);
  const from = requireChoice(body.from, 'from', ORIENTATION_DEFINITIONS);
  const given: CupAngles = {
    inclinationDeg: limitedNumber(body.inclinationDeg, 'inclinationDeg', { min: 0, max: 90, unit: 'degrees' }),
    anteversionDeg: limitedNumber(body.anteversionDeg, 'anteversionDeg', { over: -90, below: 90, unit: 'degrees' }),
  };
  const tilt = optionalNumber(body.pelvicTiltDeg, 'pelvicTiltDeg', { min: -45, max: 45, unit: 'degrees' }) ?? 0;
  const axis = tiltAxis(axisFromAngles(from, given), tilt);
  // What was typed in is given back as typed, not after rounding to and fro.
  const angles = (name: OrientationDefinition) =>
    name === from && tilt === 0 ? given : anglesFromAxis(name, axis);
  const radiographic = angles('radiographic');
  return {
    radiographic,
    operative: angles('operative'),
    anatomical: angles('anatomical'),
    safeZone: {
      inclination: within(radiographic.inclinationDeg, 30, 50),
      anteversion: within(radiographic.anteversionDeg, 5, 25),
    },
    definition:
      'Radiographic, operative and anatomical orientation after Murray, J Bone Joint Surg Br 1993;75-B:228; ' +
      'zone 40±10 and 15±10 degrees, radiographic, after Lewinnek and others, J Bone Joint Surg Am 1978;60:217',
    cautions: [
      'Support for a decision only. The judgement of the treating team comes first.',
      'Always name the definition with the angle; the three differ by several degrees.',
      'A cup inside the zone can dislocate: in one series 58 % of dislocated cups lay inside both limits (Abdel and others 2016).',
      'A single AP film does not tell anteversion from retroversion.',
      'The tilt is a rotation about the transverse axis only; angles from a distorted or rotated film are off.',
    ],
  };
}

const within = (value: number, low: number, high: number): boolean =>
  value >= low - EDGE_DEG && value <= high + EDGE_DEG;
