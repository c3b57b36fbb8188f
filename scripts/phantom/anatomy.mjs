// Pelvis and body as one sees them from the front. Outlines are for a left side that has x lateral;
// all invented numbers, chosen to sit inside the adult range.

import { addBone, addRidge, addSpot, cloudiness, MU, mottle, place, thicknessField, trabeculae } from './bones.mjs';
import { curve, DEG, seededRandom, smooth, toPlane } from './geometry.mjs';
import { coarse, eachPixel } from './raster.mjs';
import { ellipsoid } from './solids.mjs';

/** Lower end of the teardrop, from the midline, mm. */
export const TEARDROP = 58;
/** Native hip centre: lateral from the midline and above the inter-teardrop line, mm. */
export const HIP = { x: 89, y: 16, head: 23.5 };

// [x, y, z, cortex, edge radius]
const HEMIPELVIS = [
  [3, 4, 42, 1, 4], [9, 10, 42, 1, 4], [20, 13, 42, 1.3, 5], [26, 10, 42, 1.3, 6], [38, 13, 35, 1.4, 7],
  [50, 20, 25, 1.7, 9], [59, 31, 12, 1.9, 11], [64, 44, -5, 2, 12], [63, 60, -25, 1.9, 12], [57, 72, -40, 1.6, 10],
  [50, 79, -50, 1.2, 8], [45, 88, -55, 1, 7], [43, 103, -58, 1, 7], [43, 118, -60, 1.2, 7],
  [49, 132, -55, 1.7, 6], [64, 143, -38, 2, 5], [84, 150, -15, 2.2, 5], [106, 148, 5, 2.3, 5], [125, 136, 20, 2.3, 5],
  [137, 118, 30, 2.2, 5], [141, 102, 36, 2, 5], [138, 89, 40, 1.7, 5], [131, 80, 41, 1.5, 5], [125, 71, 36, 1.3, 5],
  [122, 62, 33, 1.4, 6], [121, 53, 32, 1.4, 7], [118, 44, 22, 1.4, 8], [117, 36, 5, 1.3, 8],
  [115, 24, -8, 1.1, 9], [108, 8, -18, 1.1, 9], [99, -5, -24, 1.2, 10], [89, -16, -30, 1.5, 10],
  [81, -25, -36, 1.6, 10], [78, -36, -40, 1.6, 10], [77, -47, -42, 1.7, 11], [70, -57, -42, 1.6, 11],
  [59, -61, -36, 1.4, 9], [47, -57, -22, 1.3, 7], [34, -49, -2, 1.3, 6], [20, -40, 18, 1.2, 5], [9, -33, 32, 1.2, 5],
  [4, -26, 38, 1, 4], [2.6, -10, 42, 1, 4],
];
const FORAMEN = [
  [33, -6, 20, 1.1, 5], [44, -5, 8, 1.1, 5], [53, -9, -8, 1.2, 6], [57, -19, -22, 1.3, 7], [57, -31, -30, 1.3, 7],
  [52, -41, -28, 1.3, 7], [43, -43, -15, 1.2, 6], [32, -37, 2, 1.1, 5], [23, -27, 18, 1.1, 5], [21, -16, 26, 1.1, 5],
  [25, -9, 26, 1.1, 5],
];
// [x, y, z, thickness, reach]
const THICKNESS = [
  [98, 112, 10, 5, 26], [72, 100, -30, 11, 16], [120, 100, 30, 9, 10], [84, 142, -15, 13, 9], [122, 132, 20, 12, 9],
  [136, 104, 36, 13, 8], [50, 110, -58, 24, 12], [60, 76, -38, 24, 12], [74, 64, -15, 22, 12], [96, 60, 5, 26, 16],
  [116, 54, 30, 20, 9], [90, 36, 0, 40, 15], [64, 24, 0, 20, 8], [88, 8, 0, 34, 16], [48, 14, 28, 15, 9],
  [22, 4, 42, 15, 10], [10, -16, 40, 14, 10], [24, -38, 18, 9, 8], [44, -52, -15, 11, 8], [66, -42, -38, 27, 11],
  [72, -20, -32, 25, 10], [60, -6, -14, 14, 7], [40, 2, 24, 12, 7],
];
const LINES = {
  // bone lies laterally of the quadrilateral plate
  ilioischial: [[65, 60, -30, 0], [63, 47, -20, 0.8], [60, 32, -12, 1], [57, 16, -12, 1], [55.5, 3, -16, 1], [56, -10, -22, 1], [59, -22, -28, 0.8], [61, -34, -34, 0]],
  anteriorRim: [[116, 36, 12, 0], [108, 25, 18, 0.5], [95, 13, 20, 0.6], [80, 5, 18, 0.5], [67, 2, 14, 0]],
  posteriorRim: [[117, 36, 0, 0], [112, 17, -18, 0.7], [103, 2, -24, 0.8], [94, -10, -28, 0.6], [84, -20, -32, 0]],
  tuberosity: [[76, -34, -44, 0], [67, -47, -46, 0.6], [58, -52, -42, 0.5], [49, -50, -30, 0]],
  spine: [[57, 22, -40, 0], [51, 16, -44, 0.7], [47.5, 11, -46, 0.9], [51, 6, -44, 0.7], [57, 0, -38, 0]],
  gluteal: [[122, 92, 30, 0], [108, 88, 15, 0.25], [94, 86, 5, 0.25], [80, 80, -15, 0]],
};
const TEARDROP_LINE = [
  [62.5, 19, 0, 0], [62, 11, 0, 0.8], [60.8, 4, 0, 1.1], [57.6, 0, 0, 1.2], [54.4, 3.6, 0, 1.1], [54.6, 12, 0, 0.9], [57, 21, 0, 0.5], [60, 29, 0, 0],
];

const FULL = { from: -25 * DEG, to: 232 * DEG };

/** Where the lined socket of a side lies, as a cavity of the pelvis. */
export function socket(camera, sideSign, centre, radius, options = {}) {
  const [x, y] = toPlane(camera, centre);
  const turn = sideSign > 0 ? FULL : { from: Math.PI - FULL.to, to: Math.PI - FULL.from };
  return { x, y, radius, lining: 1.3, left: 0.34, weight: 0.8, ...turn, ...options };
}

/** Half of the pelvis. `bone` may hold cavities, teardrop and ilioischial weights, density. */
export function addHemipelvis(sheet, sideSign, bone) {
  const side = (points) => place(points, sideSign);
  const smoothSide = (points) => curve(side(points), { steps: 5 });
  addBone(sheet, {
    outlines: [HEMIPELVIS, FORAMEN].map((o) => curve(side(o), { closed: true, steps: 4 })),
    thickness: thicknessField(sheet.camera, side(THICKNESS)),
    plate: 0.9,
    cavities: bone.cavities,
    density: bone.density,
    pattern: trabeculae(sideSign * 62 * DEG, 1.1),
  });
  const { teardrop = 1, kohler = 1, density = 1 } = bone;
  const mu = MU.cortex * density;
  const left = sideSign > 0 ? 1 : -1;
  addRidge(sheet, smoothSide(LINES.ilioischial), left, { bend: 22, cortex: 0.8, mu: mu * 0.75 * kohler });
  addRidge(sheet, smoothSide(LINES.anteriorRim), -left, { bend: 10, cortex: 0.7, mu: mu * 0.6, reach: 5 });
  addRidge(sheet, smoothSide(LINES.posteriorRim), -left, { bend: 14, cortex: 0.9, mu: mu * 0.7, reach: 6 });
  addRidge(sheet, smoothSide(LINES.tuberosity), -left, { bend: 12, cortex: 0.8, mu: mu * 0.6 });
  addRidge(sheet, smoothSide(LINES.spine), left, { bend: 7, cortex: 0.7, mu: mu * 0.6, reach: 6 });
  addRidge(sheet, smoothSide(LINES.gluteal), left, { bend: 20, cortex: 0.8, mu });
  if (teardrop > 0) {
    addRidge(sheet, smoothSide(TEARDROP_LINE), -left, { bend: 9, cortex: 1, mu: mu * 0.75 * teardrop, reach: 3.2 });
  }
}

const SACRUM = [
  [0, 123, -35, 1.2, 6], [23, 124, -38, 1.4, 6], [31, 119, -45, 1.2, 7], [43, 120, -52, 1.1, 8], [53, 112, -58, 1, 9], [53, 99, -60, 1, 9],
  [50, 86, -62, 1, 8], [44, 73, -68, 1.1, 7], [36, 60, -74, 1.1, 7], [29, 49, -78, 1.1, 6], [20, 41, -78, 1, 5], [9, 37, -76, 1, 5],
];
const FORAMINA = [[19, 101, 6.2, 4.4], [17.5, 86, 5.6, 4.2], [15.5, 72, 5, 3.8], [13.5, 59, 4.2, 3.3]];
const LUMBAR = [
  [0, 133, -20, 1.2, 9], [20, 132, -20, 1.2, 8], [26, 136, -20, 1.2, 7], [24, 146, -25, 1.2, 7], [31, 149, -34, 1, 5], [44, 154, -38, 1, 4],
  [45, 159, -38, 1, 4], [32, 158, -36, 1, 5], [24.5, 157, -26, 1.2, 7], [26, 165, -20, 1.2, 7], [20, 168, -20, 1.2, 8], [0, 167, -20, 1.2, 9],
];
const both = (half) => [...half, ...place(half.slice(0, -1), -1).reverse()].filter((p, i, a) => i === 0 || p[0] !== a[i - 1][0] || p[1] !== a[i - 1][1]);

const ring = (x, y, z, a, b, weight) =>
  Array.from({ length: 25 }, (_, k) => [x + a * Math.cos(k * 15 * DEG), y + b * Math.sin(k * 15 * DEG), z, weight]);

/** Sacrum, coccyx, last lumbar vertebra. */
export function addSpine(sheet, density = 1) {
  const { camera } = sheet;
  const cavities = [1, -1].flatMap((s) =>
    FORAMINA.map(([x, y, a]) => {
      const [cx, cy] = toPlane(camera, [s * x, y, -60]);
      return { x: cx, y: cy, radius: a * 0.8, lining: 0.9, left: 0.42, weight: 0.8, depth: 2.4, from: 0.2, to: Math.PI - 0.2 };
    }),
  );
  const t = thicknessField(camera, [[0, 118, -50, 34, 16], [44, 106, -58, 24, 14], [-44, 106, -58, 24, 14], [0, 80, -70, 20, 16], [0, 45, -76, 11, 14]]);
  addBone(sheet, { outlines: [curve(both(SACRUM), { closed: true, steps: 4 })], thickness: t, plate: 0.9, cavities, density: density * 0.9, pattern: trabeculae(0.5, 1) });
  addBone(sheet, { outlines: [curve(both(LUMBAR), { closed: true, steps: 3 })], thickness: thicknessField(camera, [[0, 150, -25, 36, 14], [45, 156, -36, 7, 10], [-45, 156, -36, 7, 10]]), plate: 0.9, density: density * 0.85, pattern: trabeculae(Math.PI / 2, 1) });
  for (const s of [1, -1]) {
    addRidge(sheet, ring(s * 15, 158, -40, 4.6, 6, 0.8), 1, { bend: 5, cortex: 0.9, reach: 4 });
    addRidge(sheet, curve(place([[50, 116, -50, 0], [46, 104, -50, 0.8], [45.5, 92, -52, 0.9], [42, 80, -56, 0]], s), { steps: 4 }), s, { bend: 9, cortex: 0.9, reach: 4, mu: -0.02 });
    addRidge(sheet, curve(place([[53, 118, -50, 0], [50, 104, -50, 0.7], [49, 92, -52, 0.8], [46, 80, -56, 0]], s), { steps: 4 }), -s, { bend: 9, cortex: 0.9, reach: 4 });
  }
  for (const [y, a, b] of [[148, 4, 9], [108, 3.2, 6], [93, 3, 5], [79, 2.6, 4.5]]) addRidge(sheet, ring(0, y, -80, a, b, 0.55), 1, { bend: 4, cortex: 0.8, reach: 3 });
  addRidge(sheet, curve([[-24, 125, -36, 0], [-12, 122.5, -34, 1], [0, 121.5, -32, 1], [12, 122.5, -34, 1], [24, 125, -36, 0]], { steps: 4 }), -1, { bend: 14, cortex: 1.1 });
  for (const [y, w] of [[33, 8], [25, 6.5], [18, 5], [12, 3.6]]) addSpot(sheet, ellipsoid(camera, [0, y, -70], [w, 3.6, 5]), 0.022, 0.2);
}

/** Soft tissue: trunk and thighs, fat outside muscle, bowel with gas, bladder. */
export function addBody(sheet, body) {
  const { size = 1, seed = 1 } = body;
  const { camera, width, height } = sheet;
  const reach = [-0.5 * width * camera.pitch, 0.5 * width * camera.pitch, -0.5 * height * camera.pitch, 0.5 * height * camera.pitch];
  const [tx, ty] = [camera.target[0], camera.target[1]];
  const oval = (x, half, depth, sharp) => {
    const q = Math.abs(x) / half;
    return q >= 1 ? 0 : depth * (1 - q ** sharp) ** (1 / sharp);
  };
  const tissue = (x, y, inset) => {
    const hips = Math.exp(-(((y + 20) / 120) ** 2));
    const trunk = oval(x, (148 + 42 * hips) * size - inset, 205 * size - 1.6 * inset, 2.6) * smooth(-75, 5, y);
    const thin = smooth(-30, -190, y);
    const thigh = (s) => oval(x - s * 96 * size, (89 - 14 * thin) * size - inset, (178 - 30 * thin) * size - 1.6 * inset, 2.3);
    const legs = Math.max(thigh(1), thigh(-1)) * smooth(25, -60, y);
    return Math.hypot(trunk, legs) ** 0.5 * Math.max(trunk, legs) ** 0.5;
  };
  const grid = coarse(sheet, reach, 2, (ex, ey, out) => {
    out[0] = tissue(ex + tx, ey + ty, 0);
    out[1] = tissue(ex + tx, ey + ty, 24 * size);
  });
  eachPixel(sheet, grid, (k, ex, ey, [all, muscle]) => {
    const patchy = 1 + 0.014 * cloudiness(ex + 60, ey - 25) + 0.004 * mottle(ex, ey);
    sheet.tissue[k] += (MU.fat * all + (MU.muscle - MU.fat) * muscle) * patchy;
  });
  addSpot(sheet, ellipsoid(camera, [0, 42, 20], [42, 26, 30]), 0.0012, 0.1);
  addBowel(sheet, seed);
}

function addBowel(sheet, seed) {
  const random = seededRandom(seed * 7919 + 3);
  const { camera } = sheet;
  const shadows = [[0, 62, 13, 15], [-6, 84, 10, 9], [70, 120, 17, 12], [88, 134, 14, 12], [-78, 116, 19, 15], [-66, 96, 11, 10], [30, 140, 14, 8], [-34, 152, 16, 8]];
  for (const [x, y, a, b] of shadows) {
    if (random() < 0.25) continue;
    for (let i = 0; i < 4; i++) {
      const at = [x + (random() - 0.5) * 2.2 * a, y + (random() - 0.5) * 1.8 * b, 30 + 30 * random()];
      const k = 0.5 + 0.7 * random();
      addSpot(sheet, ellipsoid(camera, at, [a * k, b * k, 9 * k + 3], [[0.8, 0.6, 0], [-0.6, 0.8, 0], [0, 0, 1]]), MU.gas * 0.55, 0.35);
    }
  }
}
