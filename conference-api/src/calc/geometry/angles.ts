const DEGREES_PER_RADIAN = 180 / Math.PI;

/** Degrees to radians. */
export const toRadians = (degrees: number): number => degrees / DEGREES_PER_RADIAN;

/** Radians to degrees, never minus zero. */
export const toDegrees = (radians: number): number => radians * DEGREES_PER_RADIAN + 0;
