import type { Quadrant } from './rim-geometry';

/**
 * What lies behind each quadrant of the acetabulum and can be hurt by a screw's tip, a drill or a blade.
 * Quadrant system of Wasielewski and others, J Bone Joint Surg Am 1990;72:501, from memory. Its first line runs from
 * the anterior superior iliac spine through the centre; here the quadrants are drawn by the clock, so their borders
 * are approximate.
 */
export const STRUCTURES: Record<Quadrant, string> = {
  posterosuperior: 'sciatic nerve, superior gluteal vessels',
  posteroinferior: 'sciatic nerve, inferior gluteal and pudendal vessels',
  anterosuperior: 'external iliac vessels',
  anteroinferior: 'obturator nerve and vessels',
};

/** Where the ring gives way last: the shell can take pubis or ischium with it here. Common practice, no source. */
export const SLOW_HOURS = { from: 5, to: 7 } as const;
