import { CalcInputError } from '../common/calc-input-error.js';

/** Diameters of heads that are offered, mm; 22.225 is the true one of the nominal 22 (7/8 inch). */
export const HEAD_DIAMETERS_MM = [22.225, 28, 32, 36, 40] as const;

export type FilmScale =
  | { source: 'pixel-spacing'; mmPerPx: number }
  | { source: 'known-circle'; mmPerPx: number; trueMm: number; measuredPx: number };

/**
 * Scale from the file's pixel spacing (mm per px). It holds at the detector, not at the depth of the joint,
 * where the file gives the spacing of the imager.
 */
export function scaleFromSpacing(mmPerPx: number): FilmScale {
  if (!(mmPerPx > 0.005 && mmPerPx < 5)) throw new CalcInputError('mmPerPx', 'range', 'A pixel measures between 0.005 and 5 mm.');
  return { source: 'pixel-spacing', mmPerPx };
}

/** Scale from a head or ball of known diameter (mm) that measures `measuredPx` across, at its own depth. */
export function scaleFromCircle(trueMm: number, measuredPx: number): FilmScale {
  if (!(trueMm >= 5 && trueMm <= 100)) throw new CalcInputError('trueMm', 'range', 'A head or ball measures between 5 and 100 mm.');
  if (!(measuredPx >= 5)) throw new CalcInputError('measuredPx', 'range', 'The circle is too small to take a scale from.');
  return { source: 'known-circle', mmPerPx: trueMm / measuredPx, trueMm, measuredPx };
}
