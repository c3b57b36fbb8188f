// The femur from the front. Its own axes: origin at the native head's centre, x lateral, y along the
// shaft upwards; the shaft's axis is x = 42.

import { addBone, addRidge, MU, thicknessField, trabeculae } from './bones.mjs';
import { add, cross, curve, DEG, scale, seededRandom, toPlane } from './geometry.mjs';

export const ADDUCTION = 5 * DEG;
export const SHAFT_X = 42;
/** Tip of the lesser trochanter in the femur's axes. */
export const LESSER = [20.4, -59.3, 0];

// [x, y, z, cortex, edge radius]
const LATERAL = [
  [44, 1, -6, 0.9, 6], [51, 7, -8, 0.9, 8], [58, 4, -8, 1, 9], [65, -7, -5, 1.1, 10], [66.5, -19, -3, 1.3, 12], [63.5, -34, 0, 1.8, 15],
  [59.5, -50, 0, 2.8, 15], [57, -68, 0, 4.2, 14.5], [56, -95, 0, 5.6, 14.2], [55.8, -140, 0, 6.6, 14], [55.6, -190, 0, 6.8, 13.8], [55.4, -260, 0, 6.6, 13.6],
];
const MEDIAL = [
  [28.4, -260, 0, 6.8, 13.6], [28.2, -190, 0, 6.9, 13.8], [28, -140, 0, 6.6, 14], [27.6, -100, 0, 5.6, 14.2], [26.6, -82, 0, 4.2, 14], [24, -70, 0, 2.8, 11],
  [20.8, -62.5, 0, 1.5, 8], [20.8, -56, 0, 1.4, 8], [24.2, -49, 0, 2.4, 9], [22, -42, 0, 3.6, 13],
];
const CUT_NECK = [[20, -35, 0, 2.8, 12], [24, -28.5, 0, 0.8, 13], [33, -20, 0, 0.5, 12], [38, -11, 0, 0.6, 8], [40.5, -4, -3, 0.9, 6]];
const NECK_AND_HEAD = [
  [18, -34, 0, 3, 14], [11.5, -26, 0, 1.8, 16], [2, -23.4, 0, 1, 22], [-9, -21.7, 0, 0.9, 23], [-18, -15, 0, 0.9, 23.5], [-23, -5, 0, 0.9, 23.5], [-22.8, 6, 0, 0.9, 23.5],
  [-17, 16.3, 0, 0.9, 23.5], [-8, 22.1, 0, 0.9, 23.5], [2, 23.4, 0, 0.9, 23.5], [11, 20.7, 0, 0.9, 22], [18, 14, 0, 1, 17], [24.5, 7.5, 0, 1.3, 14], [31, 2, 0, 1.5, 12], [37.5, -1.5, -3, 1.2, 8],
];

/**
 * Turns the femur's axes into the patient's.
 * @param {number} sideSign @param {import('./geometry.mjs').Vec3} head
 * @param {import('./geometry.mjs').Vec3} right image's right; the leg lies turned so that its neck is seen in full
 */
export function femurFrame(sideSign, head, right = [1, 0, 0]) {
  const c = Math.cos(ADDUCTION);
  const s = Math.sin(ADDUCTION);
  const across = scale(right, sideSign);
  const front = cross(right, [0, 1, 0]);
  const toPatient = ([x, y, z = 0]) =>
    add(head, add(scale(across, x * c + y * s), add([0, y * c - x * s, 0], scale(front, z))));
  return { sideSign, toPatient, down: add(scale(across, -s), [0, -c, 0]), lateral: add(scale(across, c), [0, -s, 0]) };
}

const placed = (frame, points) => points.map((p) => [...frame.toPatient(p), ...p.slice(3)]);

function shaftThickness(sheet, frame) {
  const field = thicknessField(
    sheet.camera,
    placed(frame, [[0, 0, 0, 47, 16], [20, -14, 0, 34, 9], [36, -30, 0, 36, 12], [54, -8, -5, 27, 12], [42, -60, 0, 31, 12], [22, -59, -8, 18, 5], [42, -100, 0, 28, 15], [42, -160, 0, 27.8, 24], [42, -240, 0, 27.4, 40]]),
  );
  return (ex, ey) => field(ex, ey);
}

/**
 * Jagged break through the femur; positive on the proximal side.
 * @param {number[][]} path points in femur axes from medial to lateral
 */
export function breakLine(camera, frame, path, seed) {
  const random = seededRandom(seed);
  const jagged = curve(path, { steps: 7 }).map(([x, y, z = 0], i) => [x, y + (i % 2 ? 1 : -1) * (0.2 + 0.9 * random()), z]);
  const line = jagged.map((p) => toPlane(camera, frame.toPatient(p)));
  const order = line[0][0] < line[line.length - 1][0] ? line : [...line].reverse();
  return (ex, ey) => {
    let i = 0;
    while (i < order.length - 2 && order[i + 1][0] < ex) i++;
    const [p, q] = [order[i], order[i + 1]];
    const slope = (q[1] - p[1]) / (q[0] - p[0] || 1e-6);
    return (ey - p[1] - slope * (ex - p[0])) / Math.hypot(1, slope);
  };
}

/**
 * Femur of one side.
 * @param {object} femur frame, operated (neck cut), fracture ({path}) with the lower part's frame `slipped`, cavities, density, seed
 */
export function addFemur(sheet, femur) {
  const { camera } = sheet;
  const { frame, operated, density = 1, cavities = [], seed = 5 } = femur;
  const shape = [...(operated ? CUT_NECK : NECK_AND_HEAD), ...LATERAL, ...MEDIAL];
  const draw = (f, clip) =>
    addBone(sheet, {
      outlines: [curve(placed(f, shape), { closed: true, steps: 5 })],
      thickness: shaftThickness(sheet, f),
      plate: 1.2,
      pattern: trabeculae(frame.sideSign * (operated ? 95 : 52) * DEG, 1.15),
      cavities,
      density,
      clip,
    });
  if (!femur.fracture) draw(frame);
  else {
    const { path } = femur.fracture;
    draw(frame, breakLine(camera, frame, path, seed));
    const lower = breakLine(camera, femur.slipped, path, seed);
    draw(femur.slipped, (ex, ey) => -lower(ex, ey));
  }
  const line = (pts) => curve(placed(frame, pts), { steps: 5 });
  const s = frame.sideSign > 0 ? 1 : -1;
  addRidge(sheet, line([[47, -2, -12, 0], [42, -18, -16, 0.7], [35, -36, -16, 0.8], [28, -50, -14, 0.7], [22, -58, -12, 0]]), s, { bend: 16, cortex: 1.4, mu: MU.cortex * 0.35 * density, reach: 8, soft: 2.5 });
}

/** Frame of a fragment that has slipped by `shift` (femur axes, mm) and turned about `pivot`. */
export function movedFrame(frame, pivot, shift, turn) {
  const c = Math.cos(turn);
  const s = Math.sin(turn);
  return {
    ...frame,
    toPatient: ([x, y, z = 0, ...rest]) => {
      const dx = x - pivot[0];
      const dy = y - pivot[1];
      return frame.toPatient([pivot[0] + shift[0] + dx * c - dy * s, pivot[1] + shift[1] + dx * s + dy * c, z, ...rest]);
    },
  };
}
