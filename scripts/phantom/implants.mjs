// Shell, liner, screws, head and stem as solids. No maker's design: plain shapes of the trade.

import { add, circlePoints, clamp, cross, dot, DEG, perpendiculars, scale, sub, unit } from './geometry.mjs';
import { MU, mottle } from './bones.mjs';
import { addSolid } from './raster.mjs';
import { cappedShell, ellipsoid, frustum, fused, loft, sphere, threadedRod } from './solids.mjs';

const METAL = { titanium: MU.titanium, cobalt: MU.cobalt, steel: MU.steel, ceramic: MU.ceramic };

const addMetal = (sheet, solid, mu, shade) => addSolid(sheet, solid, mu, 'metal', shade);

/** Thin round wire along points; near and far halves are drawn apart so that both count. */
export function addWire(sheet, points, radius, mu, closed = true) {
  const half = Math.ceil(points.length / 2);
  const loop = closed ? [...points, points[0]] : points;
  const parts = closed ? [loop.slice(0, half + 1), loop.slice(half)] : [loop];
  for (const part of parts) {
    const nodes = part.map((p) => ({ p, a: radius, b: radius }));
    addMetal(sheet, loft(sheet.camera, nodes, [0.31, 0.2, 0.93]), mu);
  }
}

/** Direction of a screw from polar angle off the dome's pole and clock angle (0 superior, 90 posterior). */
export function screwDirection(opening, polarDeg, clockDeg) {
  const pole = scale(opening, -1);
  const cranial = unit(sub([0, 1, 0], scale(pole, dot([0, 1, 0], pole))));
  let posterior = cross(pole, cranial);
  if (posterior[2] > 0) posterior = scale(posterior, -1);
  const [p, a] = [polarDeg * DEG, clockDeg * DEG];
  return unit(
    add(scale(pole, Math.cos(p)), add(scale(cranial, Math.sin(p) * Math.cos(a)), scale(posterior, Math.sin(p) * Math.sin(a)))),
  );
}

/** Where each screw of a shell begins, points and ends. */
export function screwPlaces(shell, centre, opening) {
  return (shell.screws ?? []).map((screw) => {
    const direction = screwDirection(opening, screw.polarDeg, screw.clockDeg);
    const seat = add(centre, scale(direction, shell.outerMm / 2 - shell.wallMm - 1));
    const aim = screw.tiltDeg ? unit(add(direction, scale([0, 1, 0], Math.tan(screw.tiltDeg * DEG)))) : direction;
    return { seat, aim, tip: add(seat, scale(aim, screw.lengthMm)), lengthMm: screw.lengthMm };
  });
}

function addScrews(sheet, places) {
  for (const { seat, aim, tip } of places) {
    const { camera } = sheet;
    addMetal(sheet, threadedRod(camera, add(seat, scale(aim, 2)), tip, 2.1, 1.15, 2.6), MU.titanium * 1.1);
    addMetal(sheet, frustum(camera, sub(seat, scale(aim, 1.4)), add(seat, scale(aim, 2.4)), 4.1, 2.3), MU.titanium * 1.1);
    addMetal(sheet, frustum(camera, sub(seat, scale(aim, 1.5)), add(seat, scale(aim, 1.2)), 1.7, 1.7), -MU.titanium * 0.9);
  }
}

function addHoles(sheet, shell, centre, opening, wall) {
  const outer = shell.outerMm / 2;
  const holes = shell.holes ?? [[26, 20], [30, -28], [52, -4], [50, 62]];
  for (const [polar, clock] of holes) {
    const d = screwDirection(opening, polar, clock);
    const from = add(centre, scale(d, outer - shell.wallMm - 0.2));
    const hole = frustum(sheet.camera, from, add(centre, scale(d, outer + 0.3)), 4.2, 3.6);
    const inWall = { box: hole.box, chord: (ex, ey) => Math.min(hole.chord(ex, ey), wall.chord(ex, ey)) };
    addMetal(sheet, inWall, -METAL[shell.material ?? 'titanium']);
  }
}

function addCementedCup(sheet, shell, centre, opening) {
  const { camera } = sheet;
  const outer = shell.outerMm / 2;
  const mantle = outer + (shell.cementMm ?? 4);
  const rough = (ex, ey) => clamp(1 + 0.16 * mottle(ex * 1.3, ey * 1.3), 0.5, 1.6);
  addSolid(sheet, cappedShell(camera, centre, opening, mantle, outer, 1.5), MU.cement, 'tissue', rough);
  for (const [polar, clock, r] of [[20, -10, 6], [55, 170, 5.5], [62, 20, 6.5]]) {
    const d = screwDirection(opening, polar, clock);
    const [a, b] = perpendiculars(d);
    addSolid(sheet, ellipsoid(camera, add(centre, scale(d, mantle + 1)), [9, r, r * 0.9], [d, a, b]), MU.cement * 0.9, 'tissue', rough);
  }
  addSolid(sheet, cappedShell(camera, centre, opening, outer, 14, 0), MU.polyethylene);
  addWire(sheet, circlePoints(centre, opening, outer - 0.4, 72), 0.42, MU.steel);
  const pole = scale(opening, -1);
  const side = unit(cross(pole, [0, 0, 1]));
  const arc = Array.from({ length: 25 }, (_, k) => (k / 24) * Math.PI).map((t) =>
    add(centre, add(scale(side, Math.cos(t) * (outer - 0.4)), scale(pole, Math.sin(t) * (outer - 0.4)))),
  );
  addWire(sheet, arc, 0.42, MU.steel, false);
}

/** Shell with holes, screws and liner, or a cemented cup with its mantle and wire. */
export function addCup(sheet, { shell, liner }, centre, opening, screws) {
  const { camera } = sheet;
  const outer = shell.outerMm / 2;
  if (shell.kind === 'cemented') return addCementedCup(sheet, shell, centre, opening);
  const inner = outer - shell.wallMm;
  const coat = (ex, ey) => 1 + 0.03 * mottle(ex * 2, ey * 2);
  const wall = cappedShell(camera, centre, opening, outer, inner);
  addMetal(sheet, wall, METAL[shell.material ?? 'titanium'], coat);
  addHoles(sheet, shell, centre, opening, wall);
  addScrews(sheet, screws);
  addLiner(sheet, liner, centre, opening, inner);
}

function addLiner(sheet, liner, centre, opening, inner) {
  const { camera } = sheet;
  const at = (k) => add(centre, scale(opening, k));
  if (liner.kind === 'dual-mobility') {
    addMetal(sheet, cappedShell(camera, centre, opening, inner - 0.1, inner - 3, 1.5), MU.cobalt);
    addSolid(sheet, sphere(camera, centre, inner - 3.2), MU.polyethylene);
    return;
  }
  const rim = liner.kind === 'constrained' ? 6 : 1;
  const mu = liner.kind === 'ceramic' ? MU.ceramic : MU.polyethylene;
  const layer = liner.kind === 'ceramic' ? 'metal' : 'tissue';
  addSolid(sheet, cappedShell(camera, centre, opening, inner - 0.2, liner.innerMm / 2, rim), mu, layer);
  if (liner.kind === 'constrained') {
    addWire(sheet, circlePoints(at(6.5), opening, liner.innerMm / 2 + 4.2, 72), 1.25, MU.steel);
    addWire(sheet, circlePoints(at(2), opening, liner.innerMm / 2 + 4.8, 72), 0.5, MU.steel);
  }
}

/**
 * Nodes of a stem along its frame: [y, medial edge, lateral edge, half depth] in femur axes.
 */
const STEMS = {
  tapered: [[-21, 33, 47, 7.5], [-26, 27.5, 49.5, 8], [-34, 25.5, 50.4, 8.2], [-48, 28.6, 50.2, 8], [-70, 32.4, 49.6, 7.4], [-100, 34.8, 48.8, 6.6], [-130, 36.6, 47.4, 5.6], [-150, 38.4, 45.8, 4.4], [-153, 40.4, 43.8, 2]],
  cemented: [[-22, 34, 46, 6], [-27, 30, 47.6, 6.2], [-45, 32.6, 48, 6], [-80, 35.4, 47.6, 5.2], [-120, 37.6, 46.2, 4.4], [-142, 39, 45, 3.4], [-145, 41, 43, 1.8]],
  long: [[-18, 33, 48, 8.5], [-30, 30, 50.5, 9.5], [-58, 31, 51, 10], [-64, 33.6, 50.4, 8.4], [-120, 34.4, 49.6, 7.6], [-180, 35.4, 48.6, 6.6], [-215, 36.6, 47.4, 5.4], [-220, 39.5, 44.5, 2.5]],
};

const stemNodes = (frame, rows) =>
  rows.map(([y, m, l, depth]) => ({ p: frame.toPatient([(m + l) / 2, y, 0]), a: (l - m) / 2, b: depth }));

const mantle = (rows) => rows.map(([y, m, l, d], i) => [i === rows.length - 1 ? y - 9 : y - 3, m - 3, l + 3, d + 3]);

/** Splits stem rows at a height, interpolating the cut section. */
function cutRows(rows, y) {
  const i = rows.findIndex((r) => r[0] < y);
  const t = (y - rows[i - 1][0]) / (rows[i][0] - rows[i - 1][0]);
  const at = rows[i - 1].map((v, k) => v + (rows[i][k] - v) * t);
  return [[...rows.slice(0, i), at], [at, ...rows.slice(i)]];
}

/**
 * Stem, neck and head. `frame` is the stem's frame with its origin in the head.
 * @returns {{tip: import('./geometry.mjs').Vec3}} stem's tip
 */
export function addStem(sheet, { stem }, frame, brokenFrame) {
  const { camera } = sheet;
  const rows = STEMS[stem.kind];
  const mu = METAL[stem.material ?? (stem.kind === 'cemented' ? 'steel' : 'titanium')];
  if (stem.kind === 'cemented') {
    const rough = (ex, ey) => clamp(1 + 0.2 * mottle(ex, ey), 0.4, 1.6);
    addSolid(sheet, loft(camera, stemNodes(frame, mantle(rows)), frame.lateral, true), MU.cement * 0.55, 'tissue', rough);
  }
  const parts = stem.fractureAt ? cutRows(rows, stem.fractureAt) : [rows];
  const pieces = parts.map((part, i) => loft(camera, stemNodes(i ? brokenFrame : frame, part), frame.lateral));
  const neck = [[35, -28], [22, -18.2], [10, -8.4], [3, -2.5]].map((p) => frame.toPatient([...p, 0]));
  const radii = [7, 6.1, 5.9, 5.6];
  const nodes = neck.map((p, i) => ({ p, a: radii[i], b: radii[i] * 0.9 }));
  addMetal(sheet, fused([...pieces, loft(camera, nodes, frame.lateral)]), mu);
  return { tip: (stem.fractureAt ? brokenFrame : frame).toPatient([(rows.at(-1)[1] + rows.at(-1)[2]) / 2, rows.at(-1)[0], 0]) };
}

/** Ball on the taper. */
export function addHead(sheet, head, centre) {
  addMetal(sheet, sphere(sheet.camera, centre, head.diameterMm / 2), METAL[head.material ?? 'cobalt']);
}

/** Cables round the shaft at heights of the femur's own axes, each with its crimp. */
export function addCables(sheet, heights, frame) {
  for (const y of heights) {
    const half = y > -75 ? 16.5 : 14.6;
    const middle = frame.toPatient([42, y, 0]);
    const tilted = unit(add(frame.down, add(scale(frame.lateral, 0.07), [0, 0, 0.16])));
    addWire(sheet, circlePoints(middle, tilted, half, 48), 0.85, MU.cobalt * 0.7);
    const crimp = frame.toPatient([42 + half + 0.8, y, 2]);
    addMetal(sheet, frustum(sheet.camera, add(crimp, scale(frame.down, -4)), add(crimp, scale(frame.down, 4)), 2.2, 2.2), MU.cobalt * 0.7);
  }
}
