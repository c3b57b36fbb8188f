// How a bone with an outline, or the edge of a bony surface seen end-on, weakens the beam.

import { add, clamp, smooth, toPlane } from './geometry.mjs';
import {
  addSolid, coarse, eachPixel, grain, outlineBox, outlineDistance, planeOutline,
} from './raster.mjs';

// Taken out once: in a test's own context each look-up of a global is slow, and this runs per pixel.
const { PI, abs, atan2, cos, exp, max, min, sin, sqrt } = Math;

// Above the soft tissue that the bone displaces, per mm, near 60 keV effective.
export const MU = {
  muscle: 0.0205,
  fat: 0.0184,
  cortex: 0.05,
  spongy: 0.0145,
  gas: -0.0203,
  polyethylene: -0.0012,
  cement: 0.05,
  ceramic: 0.13,
  titanium: 0.13,
  cobalt: 0.42,
  steel: 0.4,
  lead: 1.2,
};

const fine = grain(11, 0.7, 3.2);
const broad = grain(12, 2.5, 9);
const clouds = grain(13, 9, 40, 1);

/** Spongy bone's streaks along `angle` (radians), mean 0; what changes slowly is in `patches`. */
export function trabeculae(angle = 0, strength = 1) {
  const c = cos(angle);
  const s = sin(angle);
  return (ex, ey) => {
    const u = ex * c + ey * s;
    const v = ey * c - ex * s;
    return strength * (0.1 * fine(u * 0.42, v) + 0.06 * fine(v * 0.55 + 40, u + 17));
  };
}

const patches = (ex, ey) => 1 + 0.06 * broad(ex, ey) + 0.12 * clouds(ex, ey);

export const cloudiness = (ex, ey) => clouds(ex, ey);
export const mottle = (ex, ey) => broad(ex, ey);

const dome = (q) => (q >= 1 ? 1 : q <= 0 ? 0 : sqrt(q * (2 - q)));

/** Thickness field from weighted places [x, y, z, thickness mm, reach mm]. */
export function thicknessField(camera, places) {
  const spots = places.map(([x, y, z, t, reach]) => [...toPlane(camera, [x, y, z]), t, 1 / (2 * reach * reach)]);
  const flat = Float64Array.from(spots.flat());
  return (ex, ey) => {
    let sum = 0;
    let weight = 1e-9;
    for (let i = 0; i < flat.length; i += 4) {
      const dx = ex - flat[i];
      const dy = ey - flat[i + 1];
      const w = exp(-(dx * dx + dy * dy) * flat[i + 3]) + 1e-5;
      sum += w * flat[i + 2];
      weight += w;
    }
    return sum / weight;
  };
}

/**
 * @typedef {object} Cavity  a round hole in a bone, lined with dense bone
 * @property {number} x @property {number} y  in the isocentre plane, mm
 * @property {number} radius @property {number} lining mm @property {number} left share of the bone that stays in front and behind
 * @property {number=} from @property {number=} to  lining's arc, radians
 * @property {number=} lobes how uneven the hole's edge is, 0 for round
 */

/** What cavities leave of a thickness, to out[0], and their lining, to out[1]. */
function hollowOut(cavities, ex, ey, thickness, out) {
  out[0] = thickness;
  out[1] = 0;
  for (const c of cavities) {
    const dx = ex - c.x;
    const dy = ey - c.y;
    const r2 = dx * dx + dy * dy;
    if (r2 > (1.3 * c.radius + c.lining) ** 2) continue;
    const angle = atan2(dy, dx);
    const radius = c.radius * (1 + (c.lobes ?? 0) * (sin(2 * angle + c.x) + 0.7 * sin(3 * angle + c.y) + 0.4 * sin(5 * angle)));
    const outer = (radius + c.lining) ** 2 - r2;
    if (outer <= 0) continue;
    const inner = radius * radius - r2;
    const hole = inner > 0 ? 2 * sqrt(inner) : 0;
    out[0] = max(thickness * c.left, out[0] - hole * (c.depth ?? 1));
    let turn = angle - (c.from ?? -PI);
    if (turn < 0) turn += 2 * PI;
    const span = (c.to ?? PI) - (c.from ?? -PI);
    const arc = span > 6.2 ? 1 : smooth(0, 0.35, turn) * smooth(0, 0.35, span - turn);
    out[1] += arc * (2 * sqrt(outer) - hole) * (c.weight ?? 1);
  }
}

// A flat bone seen from the side shows its substance on a smaller field.
const area = (outline) =>
  abs(outline.reduce((sum, p, i) => {
    const q = outline[(i + 1) % outline.length];
    return sum + p[0] * q[1] - q[0] * p[1];
  }, 0)) / 2;

/**
 * Adds a bone given by outlines whose vertices are [x, y, z, cortex mm, edge radius mm].
 * @param {object} bone outlines, thickness(ex, ey), plate (cortex in front and behind, mm),
 *   cavities, pattern(ex, ey), clip(ex, ey) signed mm, density
 */
export function addBone(sheet, bone) {
  const outlines = bone.outlines.map((o) => planeOutline(sheet.camera, o));
  const distance = outlineDistance(outlines);
  const packed = clamp(area(bone.outlines[0]) / area(outlines[0]), 0.8, 2.4);
  const pattern = bone.pattern ?? trabeculae();
  const { plate = 1, density = 1, cavities = [], clip } = bone;
  const grid = coarse(sheet, outlineBox(outlines[0], 1), 6, (ex, ey, to) => {
    distance(ex, ey, to);
    if (to[0] < -2) return;
    to[3] = bone.thickness(ex, ey);
    to[4] = patches(ex, ey);
    to[5] = clip ? clip(ex, ey) : 1;
  });
  const left = new Float64Array(2);
  eachPixel(sheet, grid, (k, ex, ey, at) => {
    const d = at[0];
    if (d <= 0) return;
    const cut = smooth(-0.15, 0.15, at[5]);
    if (cut === 0) return;
    const cortex = at[1];
    hollowOut(cavities, ex, ey, at[3], left);
    const t = left[0];
    // An edge without cortex is one bone passing behind another: it fades.
    const fade = cortex < 0.55 ? (1 - smooth(0.35, 0.55, cortex)) * (1 - smooth(0, 15, d)) : 0;
    const outer = t * dome(d / at[2]) * (1 - fade);
    const core = max(0, t - 2 * plate) * dome((d - cortex) / max(0.5, at[2] - cortex));
    const inner = min(core, outer);
    const shell = outer - inner + min(left[1], 14) * smooth(0, 3, d);
    const spongy = inner > 0 ? inner * max(0.1, at[4] + pattern(ex, ey)) : 0;
    sheet.tissue[k] += cut * density * packed * (MU.cortex * shell + MU.spongy * spongy);
  });
}

/**
 * Adds the bright line of a cortical surface that the beam grazes.
 * @param {number[][]} points [x, y, z, weight]
 * @param {number} side +1 when the bone lies to the left of the line's direction, -1 to the right
 * @param {{bend?: number, cortex?: number, mu?: number, reach?: number}} surface bend radius and thickness, mm
 */
export function addRidge(sheet, points, side, surface = {}) {
  const { bend = 12, cortex = 1, mu = MU.cortex, reach = 7, soft = 0.5 } = surface;
  const line = planeOutline(sheet.camera, points);
  const grid = coarse(sheet, outlineBox(line, reach), 2, (ex, ey, out) => {
    let best = 1e12;
    for (let i = 0; i + 1 < line.length; i++) {
      const [x, y, w] = line[i];
      const dx = line[i + 1][0] - x;
      const dy = line[i + 1][1] - y;
      const t = clamp(((ex - x) * dx + (ey - y) * dy) / (dx * dx + dy * dy || 1e-9), 0, 1);
      const rx = ex - x - t * dx;
      const ry = ey - y - t * dy;
      const r = rx * rx + ry * ry;
      if (r >= best) continue;
      best = r;
      out[0] = sqrt(r) * (dx * ry - dy * rx >= 0 ? side : -side);
      out[1] = w + t * (line[i + 1][2] - w);
    }
  });
  eachPixel(sheet, grid, (k, ex, ey, at) => {
    const d = at[0];
    if (d <= 0 || d > reach) return;
    const outer = sqrt(max(0, 2 * bend * d - d * d));
    const e = d - cortex;
    const r = bend - cortex;
    const inner = e > 0 ? sqrt(max(0, 2 * r * e - e * e)) : 0;
    sheet.tissue[k] += mu * at[1] * 2 * (outer - inner) * smooth(0, soft, d) * smooth(reach, reach * 0.4, d);
  });
}

/** Cloudy radiolucent or dense spot; `widest` (mm) gives it a gradual edge. */
export function addSpot(sheet, spot, mu, roughness = 0.3, widest = 0) {
  const solid = widest ? { box: spot.box, chord: (ex, ey) => spot.chord(ex, ey) ** 2 / widest } : spot;
  addSolid(sheet, solid, mu, 'tissue', (ex, ey) => clamp(1 + roughness * clouds(ex * 1.6 + 31, ey * 1.6 - 12), 0.1, 2));
}

/** Points mirrored to a side and shifted. */
export const place = (points, sideSign, at = [0, 0, 0]) =>
  points.map(([x, y, z, ...rest]) => [...add([x * sideSign, y, z], at), ...rest]);
