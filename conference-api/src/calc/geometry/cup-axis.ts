import { toDegrees, toRadians } from './angles.js';

export const ORIENTATION_DEFINITIONS = ['radiographic', 'operative', 'anatomical'] as const;
export type OrientationDefinition = (typeof ORIENTATION_DEFINITIONS)[number];

/** Inclination and version in degrees; retroversion is negative. */
export interface CupAngles {
  inclinationDeg: number;
  anteversionDeg: number;
}

/** Unit vector along the cup's axis: lateral, anterior, distal. */
export interface CupAxis {
  readonly x: number;
  readonly y: number;
  readonly z: number;
}

/**
 * The cup's axis from its angles (degrees) in one of the three definitions.
 * Source: the definitions of Murray, J Bone Joint Surg Br 1993;75-B:228.
 */
export function axisFromAngles(definition: OrientationDefinition, angles: CupAngles): CupAxis {
  const inclination = toRadians(angles.inclinationDeg);
  const version = toRadians(angles.anteversionDeg);
  const [sinI, cosI] = [Math.sin(inclination), Math.cos(inclination)];
  const [sinV, cosV] = [Math.sin(version), Math.cos(version)];
  switch (definition) {
    case 'radiographic':
      return { x: sinI * cosV, y: sinV, z: cosI * cosV };
    case 'operative':
      return { x: sinI, y: cosI * sinV, z: cosI * cosV };
    case 'anatomical':
      return { x: sinI * cosV, y: sinI * sinV, z: cosI };
  }
}

/** The angles (degrees) of an axis in one of the three definitions; atan2 keeps precision at the limits. */
export function anglesFromAxis(definition: OrientationDefinition, { x, y, z }: CupAxis): CupAngles {
  switch (definition) {
    case 'radiographic':
      return {
        inclinationDeg: toDegrees(Math.atan2(x, z)),
        anteversionDeg: toDegrees(Math.atan2(y, Math.hypot(x, z))),
      };
    case 'operative':
      return {
        inclinationDeg: toDegrees(Math.atan2(x, Math.hypot(y, z))),
        anteversionDeg: toDegrees(Math.atan2(y, z)),
      };
    case 'anatomical':
      return {
        inclinationDeg: toDegrees(Math.atan2(Math.hypot(x, y), z)),
        anteversionDeg: toDegrees(Math.atan2(y, x)),
      };
  }
}

/** The axis after the pelvis tilts by `degrees` about its transverse axis, posterior positive. */
export function tiltAxis({ x, y, z }: CupAxis, degrees: number): CupAxis {
  const sin = Math.sin(toRadians(degrees));
  const cos = Math.cos(toRadians(degrees));
  return { x, y: y * cos + z * sin, z: z * cos - y * sin };
}
