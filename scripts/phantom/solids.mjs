// Solids whose chord along a ray has a closed form. A ray is named by the point (ex, ey), in mm,
// where it meets the isocentre plane; the chord is in mm along the ray.

import {
  add, clamp, cross, dot, length, mix, scale, sub, toCamera, turnToCamera, unit,
} from './geometry.mjs';

// Taken out once: in a test's own context each look-up of a global is slow, and this runs per pixel.
const { abs, floor, hypot, max, min, sqrt } = Math;

/**
 * @typedef {object} Solid
 * @property {[number, number, number, number]} box  ex and ey from, to
 * @property {(ex: number, ey: number) => number} chord
 */

const discBox = (camera, q, radius) => {
  const f = 1 / (1 - q[2] / camera.sourceMm);
  const r = radius * f * 1.03;
  return [q[0] * f - r, q[0] * f + r, q[1] * f - r, q[1] * f + r];
};

const joinBoxes = (boxes) => [
  min(...boxes.map((b) => b[0])),
  max(...boxes.map((b) => b[1])),
  min(...boxes.map((b) => b[2])),
  max(...boxes.map((b) => b[3])),
];

const obliquity = (ex, ey, d) => sqrt(1 + (ex * ex + ey * ey) / (d * d));

/** Ellipsoid; `axes` are three unit vectors square on each other. @returns {Solid} */
export function ellipsoid(camera, centre, radii, axes = [[1, 0, 0], [0, 1, 0], [0, 0, 1]]) {
  const d = camera.sourceMm;
  const c = toCamera(camera, centre);
  const m = axes.map((v, i) => scale(turnToCamera(camera, v), 1 / radii[i]));
  return {
    box: discBox(camera, c, max(...radii)),
    chord(ex, ey) {
      const ox = ex - c[0];
      const oy = ey - c[1];
      let a = 0;
      let b = 0;
      let k = -1;
      for (let i = 0; i < 3; i++) {
        const r = m[i];
        const v = (-ex * r[0] - ey * r[1]) / d + r[2];
        const o = ox * r[0] + oy * r[1] - c[2] * r[2];
        a += v * v;
        b += v * o;
        k += o * o;
      }
      const disc = b * b - a * k;
      return disc > 0 ? ((2 * sqrt(disc)) / a) * obliquity(ex, ey, d) : 0;
    },
  };
}

export const sphere = (camera, centre, radius) => ellipsoid(camera, centre, [radius, radius, radius]);

/** Length inside a sphere of radius `r` about `c` and below the plane n.(q - c) = rim. */
function cappedBall(ex, ey, d, c, n, r, rim) {
  const ox = ex - c[0];
  const oy = ey - c[1];
  const vx = -ex / d;
  const vy = -ey / d;
  const a = vx * vx + vy * vy + 1;
  const b = vx * ox + vy * oy - c[2];
  const disc = b * b - a * (ox * ox + oy * oy + c[2] * c[2] - r * r);
  if (disc <= 0) return 0;
  const root = sqrt(disc);
  let s0 = (-b - root) / a;
  let s1 = (-b + root) / a;
  const slope = n[0] * vx + n[1] * vy + n[2];
  const start = n[0] * ox + n[1] * oy - n[2] * c[2] - rim;
  if (abs(slope) < 1e-9) return start < 0 ? s1 - s0 : 0;
  const cut = -start / slope;
  if (slope > 0) s1 = min(s1, cut);
  else s0 = max(s0, cut);
  return s1 > s0 ? s1 - s0 : 0;
}

/**
 * Hemispherical shell open towards `opening`; `inner` 0 gives a filled hemisphere.
 * @param {number} rim how far the rim's plane stands out of the centre, mm
 * @param {number} innerShift moves the inner sphere along the opening axis, mm @returns {Solid}
 */
export function cappedShell(camera, centre, opening, outer, inner, rim = 0, innerShift = 0) {
  const d = camera.sourceMm;
  const c = toCamera(camera, centre);
  const n = turnToCamera(camera, opening);
  const ci = add(c, scale(n, innerShift));
  return {
    box: discBox(camera, c, outer),
    chord(ex, ey) {
      const whole = cappedBall(ex, ey, d, c, n, outer, rim);
      if (whole === 0) return 0;
      const hollow = inner > 0 ? cappedBall(ex, ey, d, ci, n, inner, rim - innerShift) : 0;
      return max(0, whole - hollow) * obliquity(ex, ey, d);
    },
  };
}

/** Straight cylinder or cone between two points. @returns {Solid} */
export function frustum(camera, from, to, r0, r1) {
  const d = camera.sourceMm;
  const p = toCamera(camera, from);
  const q = toCamera(camera, to);
  const len = length(sub(q, p));
  const t = unit(sub(q, p));
  const slope = (r1 - r0) / len;
  return {
    box: joinBoxes([discBox(camera, p, r0), discBox(camera, q, r1)]),
    chord(ex, ey) {
      const o = [ex - p[0], ey - p[1], -p[2]];
      const v = [-ex / d, -ey / d, 1];
      const ot = dot(o, t);
      const vt = dot(v, t);
      let lo = -1e9;
      let hi = 1e9;
      if (abs(vt) > 1e-9) {
        lo = min(-ot / vt, (len - ot) / vt);
        hi = max(-ot / vt, (len - ot) / vt);
      } else if (ot < 0 || ot > len) return 0;
      const radius = r0 + slope * ot;
      const a = dot(v, v) - vt * vt - slope * slope * vt * vt;
      const b = dot(o, v) - ot * vt - radius * slope * vt;
      const k = dot(o, o) - ot * ot - radius * radius;
      const disc = b * b - a * k;
      if (a <= 0) return k < 0 || disc < 0 ? 0 : max(0, hi - lo) * obliquity(ex, ey, d);
      if (disc <= 0) return 0;
      lo = max(lo, (-b - sqrt(disc)) / a);
      hi = min(hi, (-b + sqrt(disc)) / a);
      return hi > lo ? (hi - lo) * obliquity(ex, ey, d) : 0;
    },
  };
}

/**
 * One section of a loft as the film sees it: place, half width across and chord through the middle.
 */
function seenSection(camera, node, axis, across) {
  const q = toCamera(camera, node.p);
  const view = unit([-q[0], -q[1], camera.sourceMm - q[2]]);
  const t = turnToCamera(camera, axis);
  const a = turnToCamera(camera, across);
  const b = cross(t, a);
  const along = dot(view, t);
  const inSection = sub(view, scale(t, along));
  const sin = max(0.22, length(inSection));
  const cosA = dot(inSection, a) / sin;
  const cosB = dot(inSection, b) / sin;
  const half = sqrt((node.a * cosB) ** 2 + (node.b * cosA) ** 2);
  const f = 1 / (1 - q[2] / camera.sourceMm);
  return { x: q[0] * f, y: q[1] * f, half: half * f, chord: (2 * node.a * node.b) / half / sin };
}

/**
 * Elliptical sections strung along a line of nodes (stems, necks, long bones, wires).
 * @param {{p: import('./geometry.mjs').Vec3, a: number, b: number}[]} nodes half widths along
 *   `across` and square on it, mm
 * @param {boolean} roundEnds @returns {Solid}
 */
export function loft(camera, nodes, across, roundEnds = false) {
  const parts = nodes.map((node, i) => {
    const axis = unit(sub(nodes[min(i + 1, nodes.length - 1)].p, nodes[max(i - 1, 0)].p));
    const flat = sub(across, scale(axis, dot(across, axis)));
    const side = length(flat) > 1e-6 ? unit(flat) : unit(cross(axis, [axis[1], axis[2], axis[0]]));
    return seenSection(camera, node, axis, side);
  });
  const box = joinBoxes(parts.map((s) => [s.x - s.half, s.x + s.half, s.y - s.half, s.y + s.half]));
  const last = parts.length - 2;
  return {
    box,
    chord(ex, ey) {
      let best = 1;
      let chord = 0;
      for (let i = 0; i <= last; i++) {
        const s = parts[i];
        const e = parts[i + 1];
        const dx = e.x - s.x;
        const dy = e.y - s.y;
        const raw = ((ex - s.x) * dx + (ey - s.y) * dy) / (dx * dx + dy * dy || 1e-9);
        if (!roundEnds && ((i === 0 && raw < 0) || (i === last && raw > 1))) continue;
        const t = clamp(raw, 0, 1);
        const h = mix(s.half, e.half, t);
        const r = ((ex - s.x - dx * t) ** 2 + (ey - s.y - dy * t) ** 2) / (h * h || 1e-9);
        if (r < best) {
          best = r;
          chord = mix(s.chord, e.chord, t);
        }
      }
      return best < 1 ? chord * sqrt(1 - best) : 0;
    },
  };
}

/** Threaded shank: the ridges of one edge lie half a pitch behind those of the other. @returns {Solid} */
export function threadedRod(camera, from, to, core, ridge, pitchMm) {
  const p = toCamera(camera, from);
  const q = toCamera(camera, to);
  const [fp, fq] = [p, q].map((v) => 1 / (1 - v[2] / camera.sourceMm));
  const dx = q[0] * fq - p[0] * fp;
  const dy = q[1] * fq - p[1] * fp;
  const seen = hypot(dx, dy);
  const len = length(sub(q, p));
  const sin = max(0.25, seen / fp / len);
  const turns = len / pitchMm;
  return {
    box: joinBoxes([discBox(camera, p, core + ridge), discBox(camera, q, core + ridge)]),
    chord(ex, ey) {
      const ox = ex - p[0] * fp;
      const oy = ey - p[1] * fp;
      const t = (ox * dx + oy * dy) / (seen * seen);
      if (t < 0 || t > 1) return 0;
      const off = (ox * dy - oy * dx) / seen / mix(fp, fq, t);
      const phase = t * turns + (off > 0 ? 0.5 : 0);
      const saw = 1 - 2 * abs(phase - floor(phase) - 0.5);
      const taper = min(1, (1 - t) * len * 0.35 + 0.15);
      const r = (core + ridge * max(0, 1.6 * saw - 0.6)) * taper;
      return abs(off) < r ? (2 * sqrt(r * r - off * off)) / sin : 0;
    },
  };
}

/** Parts of one piece: where they overlap the longest chord counts, not the sum. @returns {Solid} */
export const fused = (parts) => ({
  box: joinBoxes(parts.map((p) => p.box)),
  chord: (ex, ey) => {
    let longest = 0;
    for (const p of parts) {
      const b = p.box;
      if (ex >= b[0] && ex <= b[1] && ey >= b[2] && ey <= b[3]) longest = max(longest, p.chord(ex, ey));
    }
    return longest;
  },
});
