// Adds up attenuation on the film's grid: closed-form solids pixel by pixel, and bones given by an
// outline, whose chord follows from the distance to the outline.

import { clamp, seededRandom, toPlane } from './geometry.mjs';

// Taken out once: in a test's own context each look-up of a global is slow, and this runs per pixel.
const { ceil, floor, max, min, round, sqrt } = Math;

const STEP = 2;
const TILE = 512;

/** @typedef {{camera: object, width: number, height: number, tissue: Float32Array, metal: Float32Array}} Sheet */

/** @returns {Sheet} */
export function makeSheet(camera) {
  const { width, height } = camera;
  return {
    camera,
    width,
    height,
    tissue: new Float32Array(width * height),
    metal: new Float32Array(width * height),
  };
}

const columns = (sheet, box) => {
  const { camera, width, height } = sheet;
  return [
    clamp(floor(camera.cx + box[0] / camera.pitch), 0, width),
    clamp(ceil(camera.cx + box[1] / camera.pitch) + 1, 0, width),
    clamp(floor(camera.cy - box[3] / camera.pitch), 0, height),
    clamp(ceil(camera.cy - box[2] / camera.pitch) + 1, 0, height),
  ];
};

/**
 * Adds a solid's attenuation.
 * @param {number} mu per mm; negative takes away what the solid displaces
 * @param {'tissue'|'metal'} layer
 * @param {((ex: number, ey: number) => number)=} shade factor on the chord
 */
export function addSolid(sheet, solid, mu, layer = 'tissue', shade) {
  const { camera, width } = sheet;
  const target = sheet[layer];
  const [x0, x1, y0, y1] = columns(sheet, solid.box);
  for (let y = y0; y < y1; y++) {
    const ey = (camera.cy - y) * camera.pitch;
    for (let x = x0; x < x1; x++) {
      const ex = (x - camera.cx) * camera.pitch;
      const chord = solid.chord(ex, ey);
      if (chord > 0) target[y * width + x] += mu * (shade ? chord * shade(ex, ey) : chord);
    }
  }
}

/** Grid of every second pixel (or `step`) with bilinear reading, for what changes slowly. */
export function coarse(sheet, box, channels, fill, step = STEP) {
  const { camera } = sheet;
  const [x0, x1, y0, y1] = columns(sheet, box);
  const w = ceil((x1 - x0) / step) + 2;
  const h = ceil((y1 - y0) / step) + 2;
  const data = Array.from({ length: channels }, () => new Float32Array(w * h));
  const out = new Float64Array(channels);
  for (let j = 0; j < h; j++) {
    for (let i = 0; i < w; i++) {
      fill((x0 + i * step - camera.cx) * camera.pitch, (camera.cy - y0 - j * step) * camera.pitch, out);
      for (let c = 0; c < channels; c++) data[c][j * w + i] = out[c];
    }
  }
  return { x0, x1, y0, y1, w, h, data, step };
}

/** Calls `visit(pixelIndex, ex, ey, values)` for all pixels of a coarse grid. */
export function eachPixel(sheet, grid, visit) {
  const { camera, width } = sheet;
  const values = new Float64Array(grid.data.length);
  for (let y = grid.y0; y < grid.y1; y++) {
    const v = (y - grid.y0) / grid.step;
    const j = floor(v);
    const fv = v - j;
    for (let x = grid.x0; x < grid.x1; x++) {
      const u = (x - grid.x0) / grid.step;
      const i = floor(u);
      const fu = u - i;
      const k = j * grid.w + i;
      for (let c = 0; c < values.length; c++) {
        const d = grid.data[c];
        const top = d[k] + (d[k + 1] - d[k]) * fu;
        const low = d[k + grid.w] + (d[k + grid.w + 1] - d[k + grid.w]) * fu;
        values[c] = top + (low - top) * fv;
      }
      visit(y * width + x, (x - camera.cx) * camera.pitch, (camera.cy - y) * camera.pitch, values);
    }
  }
}

/** Outline in the isocentre plane: flat arrays, attributes per vertex carried along. */
export function planeOutline(camera, points) {
  return points.map(([x, y, z, ...rest]) => [...toPlane(camera, [x, y, z]), ...rest]);
}

export function outlineBox(outline, margin = 0) {
  const xs = outline.map((p) => p[0]);
  const ys = outline.map((p) => p[1]);
  return [
    min(...xs) - margin, max(...xs) + margin,
    min(...ys) - margin, max(...ys) + margin,
  ];
}

const CELL = 8;

/** Squared distance to the segment at `k`; the place along it goes to `where[0]`. */
function toSegment(f, k, ex, ey, where) {
  const ox = ex - f[k];
  const oy = ey - f[k + 1];
  const t = clamp((ox * f[k + 2] + oy * f[k + 3]) * f[k + 4], 0, 1);
  where[0] = t;
  const rx = ox - t * f[k + 2];
  const ry = oy - t * f[k + 3];
  return rx * rx + ry * ry;
}

/** Segments that can be nearest to some point of a cell of 8 mm, and those that cross its rows. */
function cellIndex(f) {
  const cells = new Map();
  const bands = new Map();
  const all = Array.from({ length: f.length / 9 }, (_, i) => i * 9);
  const where = [0];
  return (ex, ey) => {
    const i = floor(ex / CELL);
    const j = floor(ey / CELL);
    const key = i * 4096 + j;
    let found = cells.get(key);
    if (!found) {
      const far = all.map((k) => sqrt(toSegment(f, k, (i + 0.5) * CELL, (j + 0.5) * CELL, where)));
      const limit = min(...far) + CELL * 1.42;
      if (!bands.has(j)) {
        const low = (k) => min(f[k + 1], f[k + 1] + f[k + 3]);
        const high = (k) => max(f[k + 1], f[k + 1] + f[k + 3]);
        bands.set(j, Int32Array.from(all.filter((k) => low(k) <= (j + 1) * CELL && high(k) >= j * CELL)));
      }
      found = { near: Int32Array.from(all.filter((_, n) => far[n] <= limit)), band: bands.get(j) };
      cells.set(key, found);
    }
    return found;
  };
}

/**
 * Distance (mm, positive inside) to closed outlines, even-odd, with two attributes of the nearest
 * place on them. @returns {(ex: number, ey: number, out: Float64Array) => void}
 */
export function outlineDistance(outlines) {
  const segs = outlines.flatMap((o) => o.map((p, i) => [p, o[(i + 1) % o.length]]));
  const f = new Float64Array(segs.length * 9);
  segs.forEach(([p, q], i) => {
    const dx = q[0] - p[0];
    const dy = q[1] - p[1];
    f.set([p[0], p[1], dx, dy, 1 / (dx * dx + dy * dy || 1e-9), p[2], q[2] - p[2], p[3], q[3] - p[3]], i * 9);
  });
  const lookUp = cellIndex(f);
  const where = [0];
  return (ex, ey, out) => {
    const { near, band } = lookUp(ex, ey);
    let best = 1e12;
    for (const k of near) {
      const r = toSegment(f, k, ex, ey, where);
      if (r >= best) continue;
      best = r;
      out[1] = f[k + 5] + where[0] * f[k + 6];
      out[2] = f[k + 7] + where[0] * f[k + 8];
    }
    let inside = false;
    for (const k of band) {
      const oy = ey - f[k + 1];
      const dy = f[k + 3];
      if (oy < 0 !== oy - dy < 0 && ex - f[k] < (oy / dy) * f[k + 2]) inside = !inside;
    }
    out[0] = inside ? sqrt(best) : -sqrt(best);
  };
}

/** Running mean along rows that wrap round, written transposed. */
const blur = (data, size, radius) => {
  const out = new Float32Array(data.length);
  for (let y = 0; y < size; y++) {
    let sum = 0;
    for (let k = -radius; k <= radius; k++) sum += data[y * size + ((k + size) % size)];
    for (let x = 0; x < size; x++) {
      out[x * size + y] = sum / (2 * radius + 1);
      sum += data[y * size + ((x + radius + 1) % size)] - data[y * size + ((x - radius + size) % size)];
    }
  }
  return out;
};

const blurBoth = (data, radius, times) => {
  let out = data;
  for (let i = 0; i < times; i++) out = blur(blur(out, TILE, radius), TILE, radius);
  return out;
};

/**
 * Band of noise that repeats without a seam, mean 0 and standard deviation 1.
 * @returns {(u: number, v: number) => number} u and v in mm
 */
export function grain(seed, fineMm, coarseMm, cellMm = 0.25) {
  const random = seededRandom(seed);
  const white = Float32Array.from({ length: TILE * TILE }, () => random() - 0.5);
  const fine = blurBoth(white, max(1, round(fineMm / cellMm / 2)), 2);
  const wide = blurBoth(white, max(2, round(coarseMm / cellMm / 2)), 2);
  let sum = 0;
  for (let i = 0; i < fine.length; i++) {
    fine[i] -= wide[i];
    sum += fine[i] * fine[i];
  }
  const k = 1 / sqrt(sum / fine.length);
  return (u, v) => {
    const fx = u / cellMm;
    const fy = v / cellMm;
    const ix = floor(fx);
    const iy = floor(fy);
    const x = fx - ix;
    const y = fy - iy;
    const a = (iy & (TILE - 1)) * TILE;
    const b = ((iy + 1) & (TILE - 1)) * TILE;
    const p = ix & (TILE - 1);
    const q = (ix + 1) & (TILE - 1);
    const top = fine[a + p] + (fine[a + q] - fine[a + p]) * x;
    const low = fine[b + p] + (fine[b + q] - fine[b + p]) * x;
    return k * (top + (low - top) * y);
  };
}
