// Pelvis and body as one sees them from the front. Outlines are for a left side that has x lateral;
// all invented numbers, chosen to sit inside the adult range.

import { addBone, addRidge, addSpot, cloudiness, MU, mottle, place, thicknessField, trabeculae } from './bones.mjs';
import { curve, DEG, seededRandom, smooth, toPlane } from './geometry.mjs';
import { coarse, eachPixel } from './raster.mjs';
import { ellipsoid } from './solids.mjs';

// Taken out once: in a test's own context each look-up of a global is slow, and this runs per pixel.
const { PI, abs, cos, exp, max, sin } = Math;

/** Lower end of the teardrop, from the midline, mm. */
export const TEARDROP = 58;
/** Native hip centre: lateral from the midline and above the inter-teardrop line, mm. */
export const HIP = { x: 89, y: 16, head: 23.5 };

// [x, y, z, cortex, edge radius]
const HEMIPELVIS = [
  [3, 4, 42, 0.8, 5], [9, 10, 42, 0.9, 6], [19, 13, 42, 1.1, 6], [25, 10.5, 42, 1.2, 7], [37, 13, 35, 1.3, 9],
  [49, 20, 25, 1.6, 11], [58.5, 31, 12, 1.9, 14], [64, 44, -5, 2.1, 15], [63.5, 60, -25, 1.9, 15], [58, 72, -40, 1.5, 12],
  [50, 79, -50, 0.9, 10], [43, 86, -55, 0.5, 12], [39, 98, -58, 0.35, 14], [38, 112, -60, 0.35, 14],
  [43, 127, -55, 0.6, 12], [54, 139, -42, 1.3, 8], [70, 147, -25, 1.8, 6], [88, 150.5, -10, 2.1, 5], [107, 147.5, 5, 2.2, 5], [125, 137, 20, 2.2, 5],
  [137, 121, 30, 2.1, 5], [142, 105, 36, 2, 5], [140, 92, 40, 1.7, 5], [133.5, 81, 41, 1.3, 6], [126, 73, 36, 1, 7],
  [119, 65, 33, 1.1, 8], [114.5, 57, 32, 1.2, 8], [113.5, 49, 24, 1.2, 9], [115.5, 42, 14, 1.3, 9], [117, 35, 5, 1.2, 9],
  [115, 23, -8, 0.9, 10], [108, 7, -18, 0.9, 11], [99, -6, -24, 1, 12], [89, -16, -30, 1.3, 12],
  [81, -25, -36, 1.4, 11], [77.5, -36, -40, 1.3, 11], [76.5, -46, -42, 1.4, 12], [70, -56, -42, 1.4, 12],
  [59, -60, -36, 1.1, 10], [47, -56, -22, 1.1, 8], [34, -48, -2, 1.1, 7], [20, -39, 18, 1, 6], [9.5, -32, 32, 0.9, 6],
  [4.5, -26, 38, 0.8, 5], [2.6, -10, 42, 0.8, 5],
];
const FORAMEN = [
  [33, -6, 20, 1.1, 5], [44, -5, 8, 1.1, 5], [53, -9, -8, 1.2, 6], [57, -19, -22, 1.3, 7], [57, -31, -30, 1.3, 7],
  [52, -41, -28, 1.3, 7], [43, -43, -15, 1.2, 6], [32, -37, 2, 1.1, 5], [23, -27, 18, 1.1, 5], [21, -16, 26, 1.1, 5],
  [25, -9, 26, 1.1, 5],
];
// [x, y, z, thickness, reach]
const THICKNESS = [
  [98, 116, 10, 4.5, 22], [72, 104, -30, 10, 15], [120, 96, 30, 11, 10], [84, 143, -15, 12, 8], [124, 133, 20, 14, 8],
  [137, 104, 36, 13, 7], [50, 110, -58, 24, 12], [60, 76, -38, 24, 12], [74, 64, -15, 22, 12], [96, 60, 5, 26, 16],
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
};
const TEARDROP_LINE = [
  [62.4, 15, 0, 0], [61.9, 10, 0, 0.7], [60.8, 3, 0, 1.1], [57.6, -0.5, 0, 1.25], [54.4, 2.6, 0, 1.1], [54, 10, 0, 0.7], [55.4, 18, 0, 0.25], [57, 23, 0, 0],
];

const FULL = { from: -25 * DEG, to: 232 * DEG };

/** Where the lined socket of a side lies, as a cavity of the pelvis. */
export function socket(camera, sideSign, centre, radius, options = {}) {
  const [x, y] = toPlane(camera, centre);
  const turn = sideSign > 0 ? FULL : { from: PI - FULL.to, to: PI - FULL.from };
  return { x, y, radius, lining: 1.8, left: 0.36, weight: 0.8, ...turn, ...options };
}

// The far half seen from the side would shrink to a blade; real bone has depth there.
const flatten = ([x, y, z, ...rest]) => [x, y, z + (0.6 * (42 - z)) * smooth(75, 15, y), ...rest];

/** Half of the pelvis. `bone` may hold cavities, teardrop and ilioischial weights, density. */
export function addHemipelvis(sheet, sideSign, bone) {
  const side = (points) => place(bone.flattened ? points.map(flatten) : points, sideSign);
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
  addRidge(sheet, smoothSide(LINES.spine), left, { bend: 9, cortex: 0.9, mu: mu * 0.45, reach: 6, soft: 2 });
  if (teardrop > 0) {
    addRidge(sheet, smoothSide(TEARDROP_LINE), -left, { bend: 9, cortex: 1, mu: mu * 0.75 * teardrop, reach: 3.2 });
  }
}

const SACRUM = [
  [0, 121, -35, 0.8, 9], [20, 122, -38, 0.9, 9], [27, 118, -45, 0.8, 9], [38, 121, -52, 0.8, 10], [49, 117, -58, 0.5, 12], [53, 105, -60, 0.35, 14],
  [51, 92, -62, 0.35, 14], [46, 79, -68, 0.5, 12], [38, 66, -74, 0.8, 9], [31, 54, -78, 0.9, 8], [25, 43, -79, 0.9, 7], [18, 34.5, -79, 0.8, 6], [12, 30.5, -78, 0.7, 6], [5, 29.5, -77, 0.7, 5],
];
const FORAMINA = [[19, 101, 6.2, 4.4], [17.5, 86, 5.6, 4.2], [15.5, 72, 5, 3.8], [13.5, 59, 4.2, 3.3]];
const LUMBAR = [
  [0, 128, -20, 1, 9], [20, 127, -20, 1, 8], [27, 130, -20, 1, 7], [24.5, 140, -25, 1, 7], [30, 144, -34, 0.8, 6], [42, 147, -38, 0.8, 5],
  [47, 153, -38, 0.8, 5], [43, 157, -38, 0.8, 5], [31, 153, -36, 0.8, 6], [25, 153, -26, 1, 7], [27, 161, -20, 1, 7], [20, 164, -20, 1, 8], [0, 163, -20, 1, 9],
];
const both = (half) => [...half, ...place(half.slice(0, -1), -1).reverse()].filter((p, i, a) => i === 0 || p[0] !== a[i - 1][0] || p[1] !== a[i - 1][1]);

const ring = (x, y, z, a, b, weight) =>
  Array.from({ length: 25 }, (_, k) => [x + a * cos(k * 15 * DEG), y + b * sin(k * 15 * DEG), z, weight]);

/** Sacrum, coccyx, last lumbar vertebra. */
export function addSpine(sheet, density = 1) {
  const { camera } = sheet;
  const cavities = [1, -1].flatMap((s) =>
    FORAMINA.map(([x, y, a]) => {
      const [cx, cy] = toPlane(camera, [s * x, y, -60]);
      return { x: cx, y: cy, radius: a * 0.8, lining: 0.9, left: 0.62, weight: 0.6, depth: 2.4, from: 0.1, to: PI - 0.1 };
    }),
  );
  const t = thicknessField(camera, [[0, 118, -50, 34, 16], [44, 106, -58, 24, 14], [-44, 106, -58, 24, 14], [0, 80, -70, 20, 16], [0, 45, -76, 11, 14]]);
  addBone(sheet, { outlines: [curve(both(SACRUM), { closed: true, steps: 4 })], thickness: t, plate: 0.9, cavities, density: density * 0.9, pattern: trabeculae(0.5, 1) });
  addBone(sheet, { outlines: [curve(both(LUMBAR), { closed: true, steps: 3 })], thickness: thicknessField(camera, [[0, 150, -25, 36, 14], [45, 156, -36, 7, 10], [-45, 156, -36, 7, 10]]), plate: 0.9, density: density * 0.85, pattern: trabeculae(PI / 2, 1) });
  for (const s of [1, -1]) {
    addRidge(sheet, ring(s * 15, 158, -40, 4.6, 6, 0.8), 1, { bend: 5, cortex: 0.9, reach: 4 });
    addRidge(sheet, curve(place([[50, 116, -50, 0], [46, 104, -50, 0.8], [45.5, 92, -52, 0.9], [42, 80, -56, 0]], s), { steps: 4 }), s, { bend: 9, cortex: 0.9, reach: 4, mu: -0.02 });
    addRidge(sheet, curve(place([[53, 118, -50, 0], [50, 104, -50, 0.7], [49, 92, -52, 0.8], [46, 80, -56, 0]], s), { steps: 4 }), -s, { bend: 9, cortex: 0.9, reach: 4 });
  }
  for (const [y, a, b] of [[148, 4, 9], [108, 3.2, 6], [93, 3, 5], [79, 2.6, 4.5]]) addRidge(sheet, ring(0, y, -80, a, b, 0.55), 1, { bend: 4, cortex: 0.8, reach: 3 });
  addRidge(sheet, curve([[-24, 125, -36, 0], [-12, 122.5, -34, 1], [0, 121.5, -32, 1], [12, 122.5, -34, 1], [24, 125, -36, 0]], { steps: 4 }), -1, { bend: 14, cortex: 1.1 });
  for (const [y, w] of [[26, 9], [18.5, 7.5], [12, 5.5], [6.5, 4]]) addSpot(sheet, ellipsoid(camera, [0, y, -70], [w, 4.1, 6]), 0.02, 0.2);
}

/** Soft tissue: trunk and thighs, fat outside muscle, bowel with gas, bladder. */
export function addBody(sheet, body) {
  const { size = 1, seed = 1 } = body;
  const { camera, width, height } = sheet;
  const reach = [-0.5 * width * camera.pitch, 0.5 * width * camera.pitch, -0.5 * height * camera.pitch, 0.5 * height * camera.pitch];
  const [tx, ty] = [camera.target[0], camera.target[1]];
  const oval = (x, half, depth, sharp) => {
    const q = abs(x) / half;
    return q >= 1 ? 0 : depth * (1 - q ** sharp) ** (1 / sharp);
  };
  const tissue = (x, y, inset) => {
    const hips = exp(-(((y + 28) / 95) ** 2));
    const low = smooth(-30, -210, y);
    const trunk = oval(x, (152 + 34 * hips) * size - inset, 200 * size - 1.6 * inset, 2.6);
    const half = (92 - 10 * low) * size;
    const thigh = (s) => oval(x - s * (half + 2 + 5 * low), half - inset * 0.8, (186 - 30 * low) * size - 1.6 * inset, 2.4);
    const legs = max(thigh(1), thigh(-1));
    return trunk + (legs - trunk) * smooth(-10, -125 + 0.35 * abs(x), y);
  };
  const grid = coarse(sheet, reach, 3, (ex, ey, out) => {
    out[0] = tissue(ex + tx, ey + ty, 0);
    out[1] = tissue(ex + tx, ey + ty, 24 * size);
    out[2] = 1 + 0.009 * cloudiness(ex + 60, ey - 25) + 0.004 * mottle(ex, ey);
  }, 4);
  eachPixel(sheet, grid, (k, ex, ey, at) => {
    sheet.tissue[k] += (MU.fat * at[0] + (MU.muscle - MU.fat) * at[1]) * at[2];
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
      addSpot(sheet, ellipsoid(camera, at, [a * k, b * k, 10 * k + 5], [[0.8, 0.6, 0], [-0.6, 0.8, 0], [0, 0, 1]]), MU.gas * 0.5, 0.3, 20 * k + 10);
    }
  }
}
