// Front view of a knee with a total replacement: femoral component, insert, tray with keel.
// Axes for a left knee: x lateral, y cranial, origin in the joint line.

import { addBone, addSpot, cloudiness, MU, place, thicknessField, trabeculae } from './bones.mjs';
import { curve, DEG, makeCamera, project } from './geometry.mjs';
import { coarse, eachPixel, outlineBox, outlineDistance, planeOutline } from './raster.mjs';
import { ellipsoid } from './solids.mjs';

const { abs, cos, sign, sin, sqrt } = Math;

const FEMUR = [
  [-14, 170, 0, 5.6, 14], [-14.4, 120, 0, 5, 14], [-17, 85, 0, 3, 14], [-26, 60, 0, 1.6, 12], [-38, 42, 0, 1.1, 10], [-42, 28, 0, 1, 10], [-40, 12, 0, 0.9, 10], [-30, 5, 0, 0.8, 10],
  [-10, 10, 0, 0.8, 10], [0, 16, 0, 0.8, 10], [10, 10, 0, 0.8, 10], [30, 5, 0, 0.8, 10], [39, 12, 0, 0.9, 10], [40, 28, 0, 1, 10], [34, 44, 0, 1.2, 11], [22, 64, 0, 1.8, 13], [16, 88, 0, 3.2, 14], [14.4, 120, 0, 5, 14], [14, 170, 0, 5.6, 14],
];
const TIBIA = [
  [-37, -19, 0, 0.9, 9], [0, -18.6, 0, 0.7, 9], [37, -19, 0, 0.9, 9], [39, -26, 0, 1, 10], [33, -42, 0, 1.3, 12], [22, -62, 0, 2.4, 13], [16, -88, 0, 4, 13], [13.4, -130, 0, 5.4, 13], [13, -180, 0, 5.8, 13],
  [-12.4, -180, 0, 5.4, 13], [-13, -130, 0, 5, 13], [-16, -88, 0, 3.6, 13], [-23, -62, 0, 2.2, 13], [-34, -42, 0, 1.2, 12], [-39, -27, 0, 1, 10],
];
const FIBULA = [
  [36, -32, -18, 1, 5], [43, -28, -18, 1, 6], [49, -35, -18, 1, 6], [47, -50, -18, 1.4, 6], [42, -80, -18, 2.4, 6], [41, -180, -18, 2.8, 6], [31, -180, -18, 2.8, 6], [32, -80, -18, 2.4, 6], [36, -52, -18, 1.4, 6],
];
const CAP = [
  [-37, 34], [-40, 22], [-39, 6], [-33, -2.5], [-20, -3.6], [-10, 0], [-8, 12], [-6, 18], [6, 18], [8, 12], [10, 0], [20, -3.6], [33, -2.5], [38, 6], [39, 22], [36, 34], [24, 30], [10, 33], [-10, 33], [-24, 30],
];
const TRAY = [[-37, -14], [37, -14], [37, -18.4], [8, -19], [7, -30], [5, -52], [0, -56], [-5, -52], [-7, -30], [-8, -19], [-37, -18.4]];

/** Turns points [x, y] about [0, -16] by degrees of varus and lays them out. */
const turned = (points, deg, dy = 0) => {
  const [c, s] = [cos(deg * DEG), sin(deg * DEG)];
  return points.map(([x, y]) => [x * c - (y + 16) * s, x * s + (y + 16) * c - 16 + dy, 0, 1, 1]);
};

/** Flat metal part of a given depth with rounded edges. */
function addPart(sheet, points, depth, mu, edge) {
  const outline = planeOutline(sheet.camera, points);
  const distance = outlineDistance([outline]);
  const grid = coarse(sheet, outlineBox(outline, 1), 3, distance);
  eachPixel(sheet, grid, (k, ex, ey, at) => {
    if (at[0] <= 0) return;
    const q = at[0] / edge;
    sheet.metal[k] += mu * depth * (q >= 1 ? 1 : sqrt(q * (2 - q)));
  });
}

function addLeg(sheet, size) {
  const { camera, width, height } = sheet;
  const half = [0.5 * width * camera.pitch, 0.5 * height * camera.pitch];
  const grid = coarse(sheet, [-half[0], half[0], -half[1], half[1]], 1, (ex, ey, out) => {
    const edge = (66 + 0.09 * ey + 6 * cos(ey / 60)) * size;
    const oval = (w, d) => (abs(ex) < w ? d * sqrt(1 - (ex / w) ** 2) : 0);
    out[0] = (MU.fat * oval(edge, 128 * size) + (MU.muscle - MU.fat) * oval(edge - 9, 108 * size)) * (1 + 0.012 * cloudiness(ex, ey));
  }, 3);
  eachPixel(sheet, grid, (k, _ex, _ey, at) => {
    sheet.tissue[k] += at[0];
  });
}

/** Camera of the knee's front view. */
export const kneeCamera = (spec) => makeCamera({ ...spec, toSource: [0, 0, 1], up: [0, 1, 0], target: [0, -12, 0] });

/** Draws the knee; `spec.knee` may hold trayVarusDeg and lucencyMm. */
export function addKnee(sheet, spec, sideSign) {
  const { trayVarusDeg = 0, lucencyMm = 0 } = spec.knee ?? {};
  const { camera } = sheet;
  const side = (points) => place(points, sideSign);
  const bone = (points, places, plate, angle, steps = 4) =>
    addBone(sheet, { outlines: [curve(side(points), { closed: true, steps })], thickness: thicknessField(camera, side(places)), plate, density: spec.bone.density, pattern: trabeculae(angle, 1.2) });
  addLeg(sheet, spec.body.size);
  bone(FIBULA, [[42, -36, -18, 13, 8], [38, -120, -18, 10, 40]], 1, 1.5);
  bone(FEMUR, [[0, 140, 0, 28, 30], [0, 80, 0, 31, 12], [-26, 24, 0, 46, 16], [26, 24, 0, 46, 16], [0, 26, 0, 32, 9]], 1.2, 1.5);
  bone(TIBIA, [[0, -30, 0, 44, 16], [0, -70, 0, 32, 14], [0, -140, 0, 26, 40]], 1.2, 1.6);
  addSpot(sheet, ellipsoid(camera, [0, 34, 40], [21, 22, 10]), MU.spongy * 1.5, 0.15);
  const sunk = -20 * abs(sin(trayVarusDeg * DEG));
  const tray = side(turned(TRAY, trayVarusDeg, sunk));
  if (lucencyMm) addPart(sheet, side(turned(TRAY.map(([x, y]) => [x + sign(x) * lucencyMm * 0.8, y < -14.5 ? y - lucencyMm : y]), trayVarusDeg, sunk)), 30, -MU.spongy * 0.45, 1);
  addPart(sheet, tray, 22, MU.titanium, 1.2);
  addPart(sheet, curve(side(turned(CAP, 0)), { closed: true, steps: 4 }), 26, MU.cobalt * 0.35, 4);
}

/** The knee's numbers: angle of the tray's upper edge against the tibia's axis, varus positive. */
export function kneeTruth(spec, camera, sideSign) {
  const { trayVarusDeg = 0 } = spec.knee ?? {};
  const at = (p) => project(camera, p);
  const [inner, outer] = place(turned(TRAY.slice(0, 2), trayVarusDeg, -20 * abs(sin(trayVarusDeg * DEG))), sideSign);
  return {
    side: spec.side,
    projection: spec.projection,
    pixelSpacingMm: spec.pixelSpacingMm,
    sourceDetectorMm: spec.sourceDetectorMm,
    magnification: spec.magnification,
    mmPerPixelAtHip: spec.pixelSpacingMm / spec.magnification,
    tray: { varusDeg: trayVarusDeg, widthMm: 74, innerPx: at(inner), outerPx: at(outer) },
    tibialAxisPx: [at([0, -60, 0]), at([0, -150, 0])],
  };
}
