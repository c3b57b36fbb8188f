// Hip seen by a shoot-through lateral: beam level with the table and square on the neck, the other
// leg lifted out of the way. Front of the body is up.

import { addBone, addRidge, addSpot, cloudiness, MU, mottle, thicknessField, trabeculae } from './bones.mjs';
import { breakLine } from './femur.mjs';
import { add, curve, DEG, scale, smooth, toPlane } from './geometry.mjs';
import { addSolid, coarse, eachPixel } from './raster.mjs';
import { ellipsoid, loft } from './solids.mjs';

// [along the neck, forwards, cortex, edge radius], mm from the cup's centre
const SOCKET_BONE = [
  [-120, 34, 0.3, 14], [-86, 46, 0.9, 10], [-58, 50, 1.2, 9], [-34, 44, 1.2, 9], [-14, 38, 1.3, 8], [0, 35, 1.4, 7], [7, 31, 1.2, 7],
  [9, 10, 0.35, 14], [8, -18, 0.35, 14], [8, -33, 1.4, 7], [12, -46, 1.3, 9], [24, -58, 1.3, 10], [36, -69, 1.3, 12], [37, -82, 1.2, 12],
  [25, -92, 1.2, 12], [5, -92, 1.2, 11], [-16, -82, 1.1, 10], [-32, -66, 1.1, 10], [-52, -54, 0.9, 10], [-82, -50, 0.6, 12], [-120, -48, 0.3, 14],
];
const PUBIS = [
  [-120, 66, 0.5, 9], [-92, 72, 1, 8], [-66, 66, 1.1, 8], [-44, 55, 1, 8], [-30, 46, 0.6, 9], [-38, 36, 0.5, 9], [-64, 44, 0.9, 8], [-94, 48, 0.9, 8], [-120, 46, 0.5, 9],
];

/** Points of the hip's own lateral plane in patient axes. */
function planePoints(scene, beamDeg, points) {
  const a = beamDeg * DEG;
  const along = [scene.sideSign * Math.cos(a), -Math.sin(a), 0];
  const { cup } = scene;
  const centre = [scene.sideSign * 89, 17, 0];
  const level = [centre[0] * 0.5 + cup[0] * 0.5, centre[1] * 0.5 + cup[1] * 0.5, 0];
  return points.map(([u, v, ...rest]) => [...add(level, add(scale(along, u), [0, 0, v])), ...rest]);
}

function addThigh(sheet, scene, size) {
  const { camera, width, height } = sheet;
  const half = [0.5 * width * camera.pitch, 0.5 * height * camera.pitch];
  const s = scene.sideSign;
  const grid = coarse(sheet, [-half[0], half[0], -half[1], half[1]], 1, (ex, ey, out) => {
    const u = s * ex + 38;
    const front = (84 - 0.06 * u - 12 * smooth(20, 150, u) + 10 * smooth(-20, -120, u)) * size;
    const back = -98 * size;
    const v = ey + 4;
    const q = Math.abs(v - (front + back) / 2) / ((front - back) / 2);
    const thick = (300 - 0.62 * u) * size;
    const flesh = q < 1 ? thick * (1 - q ** 2.4) ** 0.5 : 0;
    const skin = q < 0.86 ? thick * (1 - (q / 0.86) ** 2.4) ** 0.5 : 0;
    const mattress = v < back - 2 && v > back - 26 ? 0.05 : 0;
    out[0] = (MU.fat * flesh + (MU.muscle - MU.fat) * skin) * (1 + 0.007 * cloudiness(ex - 14, ey + 33)) + mattress;
  }, 3);
  eachPixel(sheet, grid, (k, ex, ey, at) => {
    sheet.tissue[k] += at[0];
  });
}

function addSocketBone(sheet, spec, scene, beamDeg) {
  const { camera, cup } = scene;
  const bone = (points) => [curve(planePoints(scene, beamDeg, points), { closed: true, steps: 5 })];
  const [x, y] = toPlane(camera, cup);
  const gap = spec.shell.lucencyMm ?? 0;
  const mantle = spec.shell.kind === 'cemented' ? (spec.shell.cementMm ?? 4) : 0;
  const cavities = [{ x, y, radius: spec.shell.outerMm / 2 + mantle - 0.4 + gap, lining: gap ? 1.5 : 0.8, left: 0.25, depth: gap ? 1.5 : 1.1, weight: 0.5 }];
  const thick = planePoints(scene, beamDeg, [[-10, 30, 34, 12], [-40, 10, 52, 20], [-90, 0, 30, 22], [-5, -36, 34, 10], [16, -76, 34, 13], [-26, -60, 28, 12]]);
  addBone(sheet, {
    outlines: bone(SOCKET_BONE),
    thickness: thicknessField(camera, thick),
    plate: 1,
    cavities,
    density: spec.bone.density * 1.15,
    pattern: trabeculae(0.7, 1.1),
  });
  addBone(sheet, {
    outlines: bone(PUBIS),
    thickness: thicknessField(camera, planePoints(scene, beamDeg, [[-80, 60, 20, 20], [-40, 48, 14, 12]])),
    density: spec.bone.density,
    pattern: trabeculae(0.1, 1),
  });
  const line = planePoints(scene, beamDeg, [[-46, -58, 0], [-26, -50, 0.6], [-6, -46, 0.8], [12, -52, 0.5], [24, -62, 0]]);
  addRidge(sheet, curve(line, { steps: 5 }), -scene.sideSign, { bend: 12, cortex: 0.9, soft: 1 });
}

const SIDE_BREAK = [[42, -156, -22], [42, -142, -13], [42, -124, -3], [42, -104, 8], [42, -88, 16], [42, -78, 24]];

/** Femur as nested lofts: bone, then the canal taken out again. */
function addFemurLofts(sheet, spec, frame, slipped) {
  const { camera } = sheet;
  const at = (f, rows, inset) => rows.map(([x, y, z, a, b]) => ({ p: f.toPatient([x, y, z]), a: a - inset(y), b: b - inset(y) }));
  const grainOf = trabeculae(0.15 * frame.sideSign, 1);
  const rough = (ex, ey) => Math.max(0.2, 1 + grainOf(ex, ey) + 0.08 * mottle(ex, ey));
  const rows = [[43, -22, -3, 17, 15], [42, -40, -1, 20, 16.5], [41, -58, 0, 17, 15.5], [42, -78, 1.5, 14.6, 14.8], [42, -110, 3, 14, 14.2], [42, -160, 4.5, 13.9, 14], [42, -220, 4, 13.8, 14], [42, -280, 2, 13.7, 14]];
  const cortex = (y) => 1 + 5.2 * smooth(-35, -115, y);
  const density = spec.bone.density * 0.9;
  const draw = (f, mask) => {
    const part = (inset) => loft(camera, at(f, rows, inset), f.lateral);
    addSolid(sheet, part(() => 0), MU.cortex * density, 'tissue', mask);
    addSolid(sheet, part(cortex), -MU.cortex * density, 'tissue', mask);
    addSolid(sheet, part(cortex), MU.spongy * density * 0.7, 'tissue', (ex, ey) => rough(ex, ey) * mask(ex, ey));
  };
  if (!slipped) draw(frame, () => 1);
  else {
    // The same spiral from the side: the part above the line is the lower fragment.
    const upper = breakLine(camera, frame, SIDE_BREAK, spec.seed);
    const lower = breakLine(camera, slipped, SIDE_BREAK, spec.seed);
    draw(frame, (ex, ey) => smooth(0.15, -0.15, upper(ex, ey)));
    draw(slipped, (ex, ey) => smooth(-0.15, 0.15, lower(ex, ey)));
  }
  const lump = (p, radii) => addSpot(sheet, ellipsoid(camera, frame.toPatient(p), radii), MU.spongy * 2.2 * density, 0.2, 2 * radii[2]);
  lump([54, -20, -9], [14, 27, 15]);
  lump([26, -58, -8], [10, 13, 9]);
}

/** Everything of the lateral view but the implants. */
export function addLateral(sheet, spec, scene) {
  const beamDeg = spec.beamDeg ?? 42;
  const { femur } = scene;
  addThigh(sheet, scene, spec.body.size);
  addSocketBone(sheet, spec, scene, beamDeg);
  addFemurLofts(sheet, spec, femur.bone, femur.slipped);
}
