// Patient axes, in mm: X to the patient's left, Y cranial, Z anterior. The origin is the
// middle between the teardrops' lower ends. Pixel coordinates count from the centre of the
// upper left pixel, x to the right, y downwards.

// Taken out once: in a test's own context each look-up of a global is slow, and this runs per pixel.
const { PI, abs, asin, atan2, cos, hypot, imul, max, min, sign, sin, sqrt } = Math;

/** @typedef {[number, number, number]} Vec3 */
/** @typedef {{x: number, y: number}} Point */
/**
 * @typedef {object} Camera
 * @property {Vec3} right @property {Vec3} up @property {Vec3} toSource
 * @property {Vec3} target     point in the isocentre plane that the central ray passes
 * @property {number} sourceMm distance of the source from the target
 * @property {number} pitch    mm in the isocentre plane for one pixel
 * @property {number} cx @property {number} cy  pixel of the central ray
 * @property {number} width @property {number} height
 */

export const DEG = PI / 180;

export const add = (a, b) => [a[0] + b[0], a[1] + b[1], a[2] + b[2]];
export const sub = (a, b) => [a[0] - b[0], a[1] - b[1], a[2] - b[2]];
export const scale = (a, k) => [a[0] * k, a[1] * k, a[2] * k];
export const dot = (a, b) => a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
export const cross = (a, b) => [
  a[1] * b[2] - a[2] * b[1],
  a[2] * b[0] - a[0] * b[2],
  a[0] * b[1] - a[1] * b[0],
];
export const length = (a) => hypot(a[0], a[1], a[2]);
export const unit = (a) => scale(a, 1 / length(a));
export const clamp = (v, lo, hi) => (v < lo ? lo : v > hi ? hi : v);
export const mix = (a, b, t) => a + (b - a) * t;
export const smooth = (lo, hi, v) => {
  const t = clamp((v - lo) / (hi - lo), 0, 1);
  return t * t * (3 - 2 * t);
};

/** Two unit vectors that stand square on `n` and on each other. */
export function perpendiculars(n) {
  const helper = abs(n[2]) < 0.9 ? [0, 0, 1] : [1, 0, 0];
  const first = unit(cross(helper, n));
  return [first, cross(n, first)];
}

/** Seeded generator (mulberry32): numbers in [0, 1), the same for the same seed. */
export function seededRandom(seed) {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let t = state;
    t = imul(t ^ (t >>> 15), t | 1);
    t ^= t + imul(t ^ (t >>> 7), t | 61);
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
}

/** Camera coordinates (right, up, towards the source) of a patient point. */
export function toCamera(camera, point) {
  const p = sub(point, camera.target);
  return [dot(p, camera.right), dot(p, camera.up), dot(p, camera.toSource)];
}

/** The same turn without the shift, for directions. */
export const turnToCamera = (camera, v) => [
  dot(v, camera.right),
  dot(v, camera.up),
  dot(v, camera.toSource),
];

/** Where the ray through a point meets the isocentre plane, in mm. */
export function toPlane(camera, point) {
  const q = toCamera(camera, point);
  const f = 1 / (1 - q[2] / camera.sourceMm);
  return [q[0] * f, q[1] * f];
}

/** Pixel of a patient point. @returns {Point} */
export function project(camera, point) {
  const [ex, ey] = toPlane(camera, point);
  return { x: camera.cx + ex / camera.pitch, y: camera.cy - ey / camera.pitch };
}

/** Point-source camera; `magnification` holds in the plane through `target`. */
export function makeCamera({ toSource, up, target, rollDeg = 0, ...film }) {
  const sourceMm = film.sourceDetectorMm / film.magnification;
  const right = cross(up, toSource);
  const c = cos(rollDeg * DEG);
  const s = sin(rollDeg * DEG);
  return {
    right: add(scale(right, c), scale(up, -s)),
    up: add(scale(up, c), scale(right, s)),
    toSource,
    target,
    sourceMm,
    pitch: film.pixelSpacingMm / film.magnification,
    cx: (film.width - 1) / 2,
    cy: (film.height - 1) / 2,
    width: film.width,
    height: film.height,
  };
}

/**
 * Opening axis of a shell from radiographic inclination and version (Murray 1993):
 * lateral sinRI cosRA, distal cosRI cosRA, anterior sinRA.
 * @param {number} sideSign +1 for the left hip, -1 for the right
 */
export function openingAxis(inclinationDeg, versionDeg, sideSign) {
  const i = inclinationDeg * DEG;
  const v = versionDeg * DEG;
  return [
    sideSign * sin(i) * cos(v),
    -cos(i) * cos(v),
    sin(v),
  ];
}

/** Points on a circle in space. */
export function circlePoints(centre, axis, radius, count) {
  const [a, b] = perpendiculars(axis);
  return Array.from({ length: count }, (_, k) => {
    const t = (k / count) * 2 * PI;
    return add(centre, add(scale(a, radius * cos(t)), scale(b, radius * sin(t))));
  });
}

/**
 * Ellipse that a circle in space makes on the film, from the dual conic H diag(1,1,-1) Ht, which
 * stays finite when the circle is seen edge-on.
 * @returns {{centre: Point, major: number, minor: number, angleDeg: number}} whole axes in px;
 *   the angle runs from the image's x axis to the long axis, anticlockwise as seen, -90..90
 */
export function projectedCircle(camera, centre, axis, radius) {
  const middle = project(camera, centre);
  const column = (q, w) => [
    (camera.cx - middle.x) * w + q[0] / camera.pitch,
    (camera.cy - middle.y) * w - q[1] / camera.pitch,
    w,
  ];
  const [a, b] = perpendiculars(axis).map((v) => {
    const q = scale(turnToCamera(camera, v), radius);
    return column(q, -q[2] / camera.sourceMm);
  });
  const q = toCamera(camera, centre);
  const c = column(q, 1 - q[2] / camera.sourceMm);
  const dual = (i, j) => a[i] * a[j] + b[i] * b[j] - c[i] * c[j];
  const k = -1 / dual(2, 2);
  const x = -dual(0, 2) * k;
  const y = -dual(1, 2) * k;
  const sxx = dual(0, 0) * k + x * x;
  const syy = dual(1, 1) * k + y * y;
  const sxy = -(dual(0, 1) * k + x * y);
  const half = hypot((sxx - syy) / 2, sxy);
  return {
    centre: { x: middle.x + x, y: middle.y + y },
    major: 2 * sqrt((sxx + syy) / 2 + half),
    minor: 2 * sqrt(max(0, (sxx + syy) / 2 - half)),
    angleDeg: (0.5 * atan2(2 * sxy, sxx - syy)) / DEG,
  };
}

/** Inclination and version as one film shows them: long axis against the horizontal of the pelvis, arcsin(minor/major). */
export function filmAngles(camera, centre, axis, radius, sideSign, rollDeg) {
  const e = projectedCircle(camera, centre, axis, radius);
  const source = add(camera.target, scale(camera.toSource, camera.sourceMm));
  const facing = sign(dot(axis, sub(source, centre))) || 1;
  let inclination = sideSign * (e.angleDeg - rollDeg);
  if (inclination < 0) inclination += 180;
  return {
    inclinationDeg: inclination,
    versionDeg: (facing * asin(min(1, e.minor / e.major))) / DEG,
    ellipse: e,
  };
}

/**
 * Space angles that make the film show the angles asked for. Rays diverge, so a hip beside the
 * central ray shows some degrees more or less version than it has.
 */
export function spaceAnglesForFilm(camera, centre, radius, sideSign, rollDeg, wanted) {
  let { inclinationDeg, versionDeg } = wanted;
  for (let round = 0; round < 40; round++) {
    const axis = openingAxis(inclinationDeg, versionDeg, sideSign);
    const seen = filmAngles(camera, centre, axis, radius, sideSign, rollDeg);
    inclinationDeg += wanted.inclinationDeg - seen.inclinationDeg;
    versionDeg += wanted.versionDeg - seen.versionDeg;
  }
  return { inclinationDeg, versionDeg };
}

/** Smooth curve through points (each an array of any length), centripetal enough for outlines. */
export function curve(points, { closed = false, steps = 5 } = {}) {
  const n = points.length;
  const at = (i) => points[closed ? (i + n) % n : clamp(i, 0, n - 1)];
  const out = [];
  for (let i = 0; i < (closed ? n : n - 1); i++) {
    const [p0, p1, p2, p3] = [at(i - 1), at(i), at(i + 1), at(i + 2)];
    for (let s = 0; s < steps; s++) {
      const t = s / steps;
      out.push(
        p1.map((v, k) => {
          const m1 = (p2[k] - p0[k]) / 2;
          const m2 = (p3[k] - v) / 2;
          const dv = p2[k] - v;
          return v + t * (m1 + t * (3 * dv - 2 * m1 - m2 + t * (m1 + m2 - 2 * dv)));
        }),
      );
    }
  }
  if (!closed) out.push(points[n - 1]);
  return out;
}
