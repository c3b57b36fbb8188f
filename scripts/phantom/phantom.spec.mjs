// The drawn films are the ground truth for measuring, so here the numbers are read back from the
// drawn pixels by code that shares nothing with the drawing: least-squares fits and edge searches.

import { drawRadiograph } from './render.mjs';
import { completeSpec, layOut, truthOf } from './scene.mjs';

// A film takes about a second of one core; a busy machine may need many times that.
jest.setTimeout(120_000);

const RAD = Math.PI / 180;

/** Brightness between pixels. */
function sample(image, x, y) {
  const i = Math.floor(x);
  const j = Math.floor(y);
  const at = (a, b) => image.pixels[b * image.width + a];
  const top = at(i, j) + (at(i + 1, j) - at(i, j)) * (x - i);
  const low = at(i, j + 1) + (at(i + 1, j + 1) - at(i, j + 1)) * (x - i);
  return top + (low - top) * (y - j);
}

/** Gaussian elimination. */
function solve(matrix, rhs) {
  const m = matrix.map((row, i) => [...row, rhs[i]]);
  m.forEach((_, c) => {
    const best = m.slice(c).reduce((b, row, i) => (Math.abs(row[c]) > Math.abs(m[b][c]) ? c + i : b), c);
    [m[c], m[best]] = [m[best], m[c]];
    m.forEach((row, r) => {
      if (r === c) return;
      const k = row[c] / m[c][c];
      row.forEach((_v, j) => {
        if (j >= c) row[j] -= k * m[c][j];
      });
    });
  });
  return m.map((row, i) => row[m.length] / row[i]);
}

function leastSquares(rows, values) {
  const n = rows[0].length;
  const cols = [...Array(n).keys()];
  const normal = cols.map((i) => cols.map((j) => rows.reduce((s, r) => s + r[i] * r[j], 0)));
  return solve(normal, cols.map((i) => rows.reduce((s, r, k) => s + r[i] * values[k], 0)));
}

/** Circle x2 + y2 + Dx + Ey + F = 0 (Kasa's fit). */
function fitCircle(points) {
  const [d, e, f] = leastSquares(points.map((p) => [p.x, p.y, 1]), points.map((p) => -(p.x ** 2 + p.y ** 2)));
  return { x: -d / 2, y: -e / 2, diameter: 2 * Math.sqrt((d * d + e * e) / 4 - f) };
}

/** Conic ax2 + bxy + cy2 + dx + ey = 1 about the points' middle; axes from its eigenvalues. */
function fitEllipse(points) {
  const mx = points.reduce((s, p) => s + p.x, 0) / points.length;
  const my = points.reduce((s, p) => s + p.y, 0) / points.length;
  const xy = points.map((p) => [(p.x - mx) / 100, (my - p.y) / 100]);
  const [a, b, c, d, e] = leastSquares(xy.map(([x, y]) => [x * x, x * y, y * y, x, y]), xy.map(() => 1));
  const [x0, y0] = solve([[2 * a, b], [b, 2 * c]], [-d, -e]);
  const k = 1 + a * x0 * x0 + b * x0 * y0 + c * y0 * y0;
  const root = Math.hypot(a - c, b);
  return {
    major: 200 * Math.sqrt((2 * k) / (a + c - root)),
    minor: 200 * Math.sqrt((2 * k) / (a + c + root)),
    angleDeg: (0.5 * Math.atan2(-b, c - a)) / RAD,
  };
}

/** Where along a line the film is brightest, with a parabola through the three highest samples. */
function peak(image, x, y, dx, dy, reach) {
  const values = [];
  for (let s = -reach; s <= reach; s += 0.5) values.push(sample(image, x + s * dx, y + s * dy));
  const k = values.indexOf(Math.max(...values.slice(1, -1)), 1);
  const [l, m, r] = [values[k - 1], values[k], values[k + 1]];
  const s = -reach + 0.5 * (k + (l - r) / (2 * (l - 2 * m + r) || 1));
  return { x: x + s * dx, y: y + s * dy, rise: m - Math.min(values[0], values.at(-1)) };
}

/** Steepest fall of brightness outwards from a centre. */
function edgeFrom(image, centre, angle, from, to) {
  let best = { fall: 0, at: from };
  for (let s = from; s < to; s += 0.25) {
    const at = (k) => sample(image, centre.x + k * Math.cos(angle), centre.y - k * Math.sin(angle));
    const fall = at(s - 1.5) - at(s + 1.5);
    if (fall > best.fall) best = { fall, at: s };
  }
  return { x: centre.x + best.at * Math.cos(angle), y: centre.y - best.at * Math.sin(angle) };
}

const lineAngle = (p, q) => Math.atan2(p.y - q.y, q.x - p.x) / RAD;

/** Height of a point above the line through the teardrops, in px. */
function above(truth, p) {
  const { right, left } = truth.teardropsPx;
  const len = Math.hypot(left.x - right.x, left.y - right.y);
  return ((left.y - right.y) * (p.x - right.x) - (left.x - right.x) * (p.y - right.y)) / len;
}

const wired = (extra = {}, shell = {}) => ({
  head: { diameterMm: 22.225, material: 'steel' },
  stem: { kind: 'cemented' },
  ...extra,
  shell: { kind: 'cemented', outerMm: 52, wallMm: 4, heightMm: 20, lateralMm: 31, cementMm: 3, ...shell },
});

/** Points of the drawn wire, away from the head and neck. */
function wirePoints(image) {
  const { rimEllipse: e } = image.truth.cup;
  const { head } = image.truth;
  const points = [];
  for (let t = 0; t < 360; t += 3) {
    const [u, v] = [(e.majorPx / 2 - 1.6) * Math.cos(t * RAD), (e.minorPx / 2) * Math.sin(t * RAD)];
    const [c, s] = [Math.cos(e.angleDeg * RAD), Math.sin(e.angleDeg * RAD)];
    const x = e.centrePx.x + u * c - v * s;
    const y = e.centrePx.y - u * s - v * c;
    if (Math.hypot(x - head.centrePx.x, y - head.centrePx.y) < head.diameterPx / 2 + 12) continue;
    const [nu, nv] = [Math.cos(t * RAD) / e.majorPx, Math.sin(t * RAD) / Math.max(e.minorPx, 12)];
    const n = Math.hypot(nu, nv);
    const found = peak(image, x, y, (nu * c - nv * s) / n, -(nu * s + nv * c) / n, 5);
    if (found.rise > 300) points.push(found);
  }
  return points;
}

describe('shell in the film', () => {
  // Radiographic inclination and version: Murray DW, J Bone Joint Surg Br 1993;75-B:228-232;
  // version from the ellipse as arcsin(minor/major): Lewinnek GE, JBJS Am 1978;60:217 (formula from memory).
  it.each([
    ['left', 30, 12], ['left', 45, 20], ['right', 40, 15], ['right', 65, 28], ['left', 55, 35],
  ])('%s, %d and %d degrees come back from the drawn wire', (side, inclinationDeg, versionDeg) => {
    const image = drawRadiograph(wired({ side, rollDeg: 1.4, seed: 3 }, { inclinationDeg, versionDeg }));
    const points = wirePoints(image);
    const e = fitEllipse(points);
    const { right, left } = image.truth.teardropsPx;
    const tilt = e.angleDeg - lineAngle(right, left);
    const inclination = side === 'left' ? tilt : -tilt;
    expect(points.length).toBeGreaterThan(25);
    expect(Math.abs(((inclination + 180) % 180) - inclinationDeg)).toBeLessThan(1);
    expect(Math.abs(Math.asin(e.minor / e.major) / RAD - versionDeg)).toBeLessThan(1);
    expect(image.truth.cup).toMatchObject({ inclinationDeg, versionDeg });
  });

  it('with a source far away the angles in space are those of the film', () => {
    const far = completeSpec({ sourceDetectorMm: 5_000_000, magnification: 1, rollDeg: 0, shell: { inclinationDeg: 40, versionDeg: 15 } });
    const { cup } = truthOf(far, layOut(far));
    expect(cup.spaceInclinationDeg).toBeCloseTo(40, 2);
    expect(cup.spaceVersionDeg).toBeCloseTo(15, 2);
    expect(cup.rimEllipse.minorPx / cup.rimEllipse.majorPx).toBeCloseTo(Math.sin(15 * RAD), 4);
    expect(cup.rimEllipse.majorPx * far.pixelSpacingMm).toBeCloseTo(54, 2);
  });

  it('an AP film does not show the sign of version, a lateral does', () => {
    const rim = (versionDeg, projection) => {
      const spec = completeSpec({ projection, shell: { inclinationDeg: 42, versionDeg } });
      return truthOf(spec, layOut(spec)).cup.rimEllipse;
    };
    const [ante, retro] = [rim(14, 'ap-pelvis'), rim(-14, 'ap-pelvis')];
    expect(ante.angleDeg).toBeCloseTo(retro.angleDeg, 1);
    expect(ante.minorPx / ante.majorPx).toBeCloseTo(retro.minorPx / retro.majorPx, 3);
    expect(Math.abs(rim(14, 'lateral').angleDeg - rim(-14, 'lateral').angleDeg)).toBeGreaterThan(15);
  });
});

describe('scale and lengths', () => {
  const image = drawRadiograph(wired({ seed: 8, magnification: 1.18, legLengthDifferenceMm: -12, head: { diameterMm: 28, material: 'cobalt' } }, { heightMm: 31 }));
  const { truth } = image;
  const rim = Array.from({ length: 30 }, (_, k) => edgeFrom(image, truth.head.centrePx, (60 + 6 * k) * RAD, 46, 66));
  const circle = fitCircle(rim);

  // True size = size at the detector / magnification: geometry of a point source.
  it('the drawn head has its size', () => {
    expect(Math.abs((circle.diameter * 0.3) / 1.18 - 28)).toBeLessThan(0.3);
    expect(Math.abs(circle.diameter - truth.head.diameterPx)).toBeLessThan(1.5);
  });

  it('the drawn head lies at its height above the inter-teardrop line', () => {
    expect(Math.abs(above(truth, circle) * truth.mmPerPixelAtHip - truth.hipCentre.heightMm)).toBeLessThan(0.4);
    expect(truth.hipCentre.heightMm).toBeCloseTo(31, 3);
  });

  it('lesser trochanters give the leg-length difference', () => {
    const { left, right } = truth.lesserTrochantersPx;
    const difference = (above(truth, right) - above(truth, left)) * truth.mmPerPixelAtHip;
    expect(Math.abs(difference - -12)).toBeLessThan(0.3);
  });

  it.each(['left', 'right'])('the %s teardrop and lesser trochanter are drawn where the truth says', (side) => {
    const drop = truth.teardropsPx[side];
    const lowerEdge = edgeFrom(image, { x: drop.x, y: drop.y - 10 }, -90 * RAD, 2, 18);
    expect(Math.abs(lowerEdge.y - drop.y)).toBeLessThan(2.5);
    const lesser = truth.lesserTrochantersPx[side];
    const lateral = side === 'left' ? 1 : -1;
    const mean = (from) => [0, 1, 2, 3, 4, 5].reduce((s, k) => s + sample(image, lesser.x + lateral * (from + k), lesser.y), 0) / 6;
    expect(mean(3)).toBeGreaterThan(mean(-10) * 1.15);
  });

  it('a screw ends at its tip', () => {
    const film = drawRadiograph({ seed: 2, shell: { heightMm: 20, screws: [{ polarDeg: 26, clockDeg: 10, lengthMm: 40 }] } });
    const [screw] = film.truth.screws;
    const len = Math.hypot(screw.tipPx.x - screw.headPx.x, screw.tipPx.y - screw.headPx.y);
    const [dx, dy] = [(screw.tipPx.x - screw.headPx.x) / len, (screw.tipPx.y - screw.headPx.y) / len];
    const along = (k) => sample(film, screw.tipPx.x + k * dx, screw.tipPx.y + k * dy);
    const inside = (along(-12) + along(-16) + along(-20)) / 3;
    const beyond = (along(4) + along(7) + along(10)) / 3;
    expect(inside).toBeGreaterThan(beyond + 350);
  });
});

describe('knee', () => {
  it('the tray stands at its varus to the axis of the tibia', () => {
    for (const side of ['left', 'right']) {
      const { truth } = drawRadiograph({ projection: 'ap-knee', side, width: 450, height: 600, pixelSpacingMm: 0.5, rollDeg: 2, knee: { trayVarusDeg: 5 } });
      const { innerPx, outerPx } = truth.tray;
      const [top, foot] = truth.tibialAxisPx;
      const tray = [outerPx.x - innerPx.x, outerPx.y - innerPx.y];
      const shaft = [foot.x - top.x, foot.y - top.y];
      const between = Math.acos((tray[0] * shaft[0] + tray[1] * shaft[1]) / Math.hypot(...tray) / Math.hypot(...shaft)) / RAD;
      expect(between).toBeCloseTo(95, 1);
      expect(innerPx.y).toBeGreaterThan(outerPx.y);
    }
  });
});

describe('seed', () => {
  const small = { width: 500, height: 420, pixelSpacingMm: 0.84 };

  it('gives the same pixels again, and others for another seed', () => {
    const [a, b, c] = [5, 5, 6].map((seed) => Buffer.from(drawRadiograph({ ...small, seed }).pixels.buffer));
    expect(a.equals(b)).toBe(true);
    expect(a.equals(c)).toBe(false);
  });

  it('stays within twelve bits and uses most of them', () => {
    const { pixels } = drawRadiograph(small);
    const top = pixels.reduce((m, v) => Math.max(m, v), 0);
    expect(top).toBeLessThanOrEqual(4095);
    expect(top).toBeGreaterThan(3900);
  });

  it.each([
    [{ head: { diameterMm: 60 } }, 'the head does not fit'],
    [{ magnification: 0.8 }, 'magnification'],
  ])('refuses %j', (spec, words) => {
    expect(() => drawRadiograph({ ...small, ...spec })).toThrow(words);
  });
});
