import { CalcInputError } from '../common/calc-input-error.js';
import type { FieldSpec } from '../common/field-spec.js';
import { limitedNumber, optionalNumber, readBody } from '../common/optional-input.js';
import { toRadians } from './angles.js';

/** Exactly one of `bladeKerfMm` and `nextShellMm`. */
export interface RemovalGeometryInput {
  /** Outer diameter of the shell to be removed: 20 to 120 mm. */
  shellOuterMm: number;
  /** Thickness of bone taken, radially, so half the gain in diameter: 0 to 30 mm. */
  bladeKerfMm?: number | null;
  /** Outer diameter of the next shell: from that of the old one to 180 mm. */
  nextShellMm?: number | null;
  /** Angle of the shell seen from its centre: over 0 to 180 degrees; 180, a hemisphere, when not given. */
  subtendedDeg?: number | null;
}

export interface RemovalGeometryResult {
  radialMm: number;
  boneCm3: number;
  definition: string;
  cautions: string[];
}

export const REMOVAL_GEOMETRY_FIELDS: readonly FieldSpec[] = [
  { name: 'shellOuterMm', type: 'number' },
  { name: 'bladeKerfMm', type: 'number' },
  { name: 'nextShellMm', type: 'number' },
  { name: 'subtendedDeg', type: 'number' },
];

/**
 * Least volume of bone (cm³) that goes with a shell when a layer of even thickness is taken round
 * it, or when a larger shell takes its place concentrically:
 * (2π/3)·((D/2+t)³ − (D/2)³)·(1 − cos(subtended/2)).
 *
 * Throws CalcInputError with the field: `required`, `type`, `range`, `exactly-one` (both or neither
 * of bladeKerfMm and nextShellMm) or `smaller-than-shell`.
 * Source: volume of a spherical sector, elementary geometry.
 */
export function calculateRemovalGeometry(input: RemovalGeometryInput): RemovalGeometryResult {
  const body = readBody(input);
  const shellOuterMm = limitedNumber(body.shellOuterMm, 'shellOuterMm', { min: 20, max: 120, unit: 'mm' });
  const radialMm = readRadial(body, shellOuterMm);
  const subtendedDeg =
    optionalNumber(body.subtendedDeg, 'subtendedDeg', { over: 0, max: 180, unit: 'degrees' }) ?? 180;
  const inner = shellOuterMm / 2;
  const hemisphereMm3 = ((2 * Math.PI) / 3) * ((inner + radialMm) ** 3 - inner ** 3);
  return {
    radialMm,
    boneCm3: (hemisphereMm3 * capShare(subtendedDeg)) / 1000,
    definition: 'Volume of a layer of even thickness round a spherical shell, concentric; elementary geometry',
    cautions: [
      'A lower bound, not a prediction: bone that is pulled out, and the slow parts, come on top.',
      'For shells that are parts of a sphere only; flanged, elliptical and finned shells differ.',
      'bladeKerfMm is radial: half the gain in diameter.',
      'Support for a decision only. The treating team and the maker’s instructions come first.',
    ],
  };
}

function readRadial(body: Record<string, unknown>, shellOuterMm: number): number {
  const kerf = optionalNumber(body.bladeKerfMm, 'bladeKerfMm', { min: 0, max: 30, unit: 'mm' });
  const next = optionalNumber(body.nextShellMm, 'nextShellMm', { min: 0, max: 180, unit: 'mm' });
  if ((kerf === null) === (next === null)) {
    const field = kerf === null ? 'bladeKerfMm' : 'nextShellMm';
    throw new CalcInputError(field, 'exactly-one', 'Give either bladeKerfMm or nextShellMm, and only one.');
  }
  if (kerf !== null) return kerf;
  if (next! < shellOuterMm) {
    throw new CalcInputError('nextShellMm', 'smaller-than-shell', 'nextShellMm must not be smaller than shellOuterMm.');
  }
  return (next! - shellOuterMm) / 2;
}

// The share of a hemisphere; at 180 exactly 1, which the cosine misses by rounding.
const capShare = (subtendedDeg: number): number =>
  subtendedDeg === 180 ? 1 : 1 - Math.cos(toRadians(subtendedDeg / 2));
