// What the detector and its processing make of the attenuation: scatter, blur, quantum noise,
// logarithm, evening out of large differences, edge emphasis, twelve bits.

import { clamp, mix, seededRandom } from './geometry.mjs';

// Taken out once: in a test's own context each look-up of a global is slow, and this runs per pixel.
const { PI, ceil, cos, exp, floor, log, max, min, round, sqrt, tanh } = Math;

/** Running mean along rows, written transposed. */
function boxTransposed(data, width, height, radius) {
  const out = new Float32Array(data.length);
  const n = 2 * radius + 1;
  for (let y = 0; y < height; y++) {
    const row = y * width;
    let sum = data[row] * (radius + 1);
    for (let k = 1; k <= radius; k++) sum += data[row + min(k, width - 1)];
    for (let x = 0; x < width; x++) {
      out[x * height + y] = sum / n;
      sum += data[row + min(x + radius + 1, width - 1)] - data[row + max(x - radius, 0)];
    }
  }
  return out;
}

/** Nearly Gaussian blur by repeated running means. */
export function blur(data, width, height, radius, times = 2) {
  let out = data;
  for (let i = 0; i < times; i++) {
    out = boxTransposed(boxTransposed(out, width, height, radius), height, width, radius);
  }
  return out;
}

const CELL = 8;

function shrink(data, width, height) {
  const w = ceil(width / CELL);
  const h = ceil(height / CELL);
  const out = new Float32Array(w * h);
  for (let j = 0; j < h; j++) {
    for (let i = 0; i < w; i++) {
      let sum = 0;
      let count = 0;
      for (let y = j * CELL; y < min(height, (j + 1) * CELL); y += 2) {
        for (let x = i * CELL; x < min(width, (i + 1) * CELL); x += 2) {
          sum += data[y * width + x];
          count++;
        }
      }
      out[j * w + i] = sum / count;
    }
  }
  return { w, h, data: out };
}

/** Row by row, a shrunken field brought back to the film's size. */
function rowsOf({ w, h, data }, width) {
  const across = new Float32Array(w + 1);
  const row = new Float32Array(width);
  return (y) => {
    const v = clamp((y - 3) / CELL, 0, h - 1.001);
    const j = floor(v);
    for (let i = 0; i < w; i++) across[i] = mix(data[j * w + i], data[(j + 1) * w + i], v - j);
    across[w] = across[w - 1];
    for (let x = 0; x < width; x++) {
      const u = max(0, (x - 3) / CELL);
      const i = u | 0;
      row[x] = across[i] + (across[i + 1] - across[i]) * (u - i);
    }
    return row;
  };
}

function bellTable(seed) {
  const random = seededRandom(seed);
  return Float32Array.from({ length: 65536 }, () => {
    const r = sqrt(-2 * log(1 - random()));
    return r * cos(2 * PI * random());
  });
}

/** Signal with scatter and quantum noise, as -ln. */
function detect(sheet, spec) {
  const { width, height, tissue, metal } = sheet;
  const { scatter = 0.16, quanta = 5200 } = spec.exposure;
  const n = width * height;
  const primary = new Float32Array(n);
  for (let i = 0; i < n; i++) primary[i] = exp(-tissue[i] - metal[i]);
  const sharp = blur(primary, width, height, 1, 1);
  for (let i = 0; i < n; i++) sharp[i] = 0.45 * primary[i] + 0.55 * sharp[i];
  const small = shrink(primary, width, height);
  for (let i = 0; i < small.data.length; i++) small.data[i] = min(small.data[i], 0.09);
  const haze = rowsOf({ ...small, data: blur(small.data, small.w, small.h, 14) }, width);
  const bell = bellTable(spec.seed * 31 + 7);
  const pick = seededRandom(spec.seed * 131 + 5);
  const out = new Float32Array(n);
  for (let y = 0; y < height; y++) {
    const veil = haze(y);
    for (let x = 0; x < width; x++) {
      const i = y * width + x;
      const signal = sharp[i] + scatter * veil[x] + 2e-4;
      const noise = bell[(pick() * 65536) | 0] / sqrt(quanta * signal * 60);
      out[i] = -log(signal * max(0.2, 1 + noise));
    }
  }
  return out;
}

function levels(values) {
  const bins = new Uint32Array(4096);
  for (let i = 0; i < values.length; i += 7) bins[clamp(floor(values[i] * 256), 0, 4095)]++;
  const total = bins.reduce((a, b) => a + b, 0);
  return (share) => {
    let sum = 0;
    for (let i = 0; i < bins.length; i++) {
      sum += bins[i];
      if (sum >= share * total) return i / 256;
    }
    return 16;
  };
}

/** Blackens what lies outside the collimator's opening, mm from the film's edge. */
function collimate(pixels, spec) {
  const { width, height, pixelSpacingMm, collimationMm = 4 } = spec;
  const edge = collimationMm / pixelSpacingMm;
  for (let y = 0; y < height; y++) {
    for (let x = 0; x < width; x++) {
      const d = min(x, y, width - 1 - x, height - 1 - y) - edge;
      if (d < 3) pixels[y * width + x] *= d < 0 ? 0 : (d + 1) / 4;
    }
  }
}

// Share of large differences taken away, edge emphasis, share of the film darker than soft tissue.
const PROCESSING = {
  'ap-pelvis': { even: 0.62, emphasis: 0.55, level: 0.3 },
  oblique: { even: 0.62, emphasis: 0.55, level: 0.3 },
  lateral: { even: 0.86, emphasis: 0.55, level: 0.47 },
  'ap-knee': { even: 0.6, emphasis: 0.5, level: 0.56 },
};

const TONES = 16384;

/** Grey values for 0 to twice the range: a straight part and a shoulder for metal. */
function toneCurve() {
  return Uint16Array.from({ length: TONES }, (_, i) => {
    const v = (2 * i) / (TONES - 1);
    const bent = v < 0.66 ? v : 0.66 + 0.34 * tanh((v - 0.66) / 0.34);
    return round(4095 * clamp(bent, 0, 1) ** 1.25);
  });
}

/** @returns {Uint16Array} 12-bit pixels, bright where the beam was weakened */
export function expose(sheet, spec) {
  const { width, height } = sheet;
  const film = detect(sheet, spec);
  const { even, emphasis, level } = { ...PROCESSING[spec.projection], ...spec.exposure };
  const small = shrink(sheet.tissue, width, height);
  for (let i = 0; i < small.data.length; i++) small.data[i] = clamp(small.data[i], 1.2, 8.5);
  const base = rowsOf({ ...small, data: blur(small.data, small.w, small.h, 9) }, width);
  const soft = blur(film, width, height, 4);
  const middle = small.data.reduce((a, b) => a + b, 0) / small.data.length;
  for (let y = 0; y < height; y++) {
    const wide = base(y);
    for (let x = 0; x < width; x++) {
      const i = y * width + x;
      film[i] += emphasis * (film[i] - soft[i]) - even * (wide[x] - middle) + 2;
    }
  }
  const share = levels(film);
  const low = share(level) - 0.66;
  const high = share(level) + 1.3;
  const tone = toneCurve();
  const pixels = new Uint16Array(width * height);
  const k = (TONES - 1) / 2 / (high - low);
  for (let i = 0; i < pixels.length; i++) pixels[i] = tone[clamp(round((film[i] - low) * k), 0, TONES - 1)];
  collimate(pixels, spec);
  return pixels;
}
