// A photograph-like picture: a shell after removal, from outside and from inside, on a drape with a ruler.

import { add, clamp, dot, mix, scale, smooth, unit } from './geometry.mjs';
import { mottle, cloudiness } from './bones.mjs';
import { textOnto } from './letters.mjs';
import { grain } from './raster.mjs';

const { abs, floor, hypot, max, min, round, sin, sqrt } = Math;

const LIGHT = unit([-0.45, 0.6, 0.72]);
const HALF = unit(add(LIGHT, [0, 0, 1]));
const beads = grain(21, 0.5, 1.6);
const weave = (x, y) => 0.5 * sin(x * 9.5) * sin(y * 9.5);

const shade = (normal, colour, gloss, wet) => {
  const lambert = 0.25 + 0.8 * max(0, dot(normal, LIGHT));
  const shine = gloss * max(0, dot(normal, HALF)) ** wet;
  return colour.map((c) => c * lambert + 255 * shine);
};

function drape(x, y) {
  const fold = 0.12 * sin(0.045 * x + 0.02 * y + 0.8 * cloudiness(x * 0.3, y * 0.3)) + 0.05 * cloudiness(x, y);
  const k = 0.9 + fold + 0.05 * weave(x, y);
  return [38 * k, 96 * k, 98 * k];
}

const HOLES = [[-0.1, 0.45, 0.85], [0.35, 0.35, 0.85], [0.05, -0.1, 0.99]].map(unit);

/** Outside of the shell: beads, holes, and bone that came away with it. */
function outside(p, opening, radius) {
  const normal = scale(p, 1 / radius);
  const side = normal[0] * 0.8 + normal[1] * 0.6;
  const rough = 0.16 * beads(p[0] * 1.4 + 9, p[1] * 1.4);
  const bent = unit(add(normal, [rough, 0.12 * beads(p[1] * 1.4, p[0] * 1.4 + 30), 0]));
  const bone = cloudiness(p[0] * 1.7 + 11, p[1] * 1.7 + 3) + 0.35 * mottle(p[0] * 2, p[1] * 2) + 0.5 * side;
  if (HOLES.some((hole) => dot(normal, hole) > 0.9885)) return shade(bent, [30, 28, 30], 0.05, 20);
  if (bone > 0.85) return shade(bent, mixColour([196, 166, 138], [126, 34, 30], clamp(0.5 + 0.4 * mottle(p[0] * 3, p[1] * 3), 0, 1)), 0.12, 30);
  return shade(bent, [142, 140, 139], 0.25, 24);
}

const mixColour = (a, b, t) => a.map((v, i) => mix(v, b[i], t));

/** Colour of a shell at a place, or undefined beside it. */
function shellColour(x, y, { opening, radius, wall }) {
  const r2 = x * x + y * y;
  if (r2 >= radius * radius) return undefined;
  const front = [x, y, sqrt(radius * radius - r2)];
  if (dot(front, opening) <= 0) return outside(front, opening, radius);
  const z = -(x * opening[0] + y * opening[1]) / opening[2];
  const far = hypot(x, y, z);
  const inner = radius - wall;
  if (far > radius) {
    const back = [x, y, -sqrt(radius * radius - r2)];
    return dot(back, opening) <= 0 && opening[2] < 0 ? outside(back, opening, radius) : undefined;
  }
  if (far > inner) return shade(opening, [150, 150, 153], 0.1, 12);
  const floorPoint = [x, y, -sqrt(max(0, inner * inner - r2))];
  const normal = scale(floorPoint, -1 / inner);
  const polar = -dot(unit(floorPoint), opening);
  const ring = abs(floor(polar * 40)) % 2 ? 4 : 0;
  for (const [hx, hy] of [[-6, 8], [7, 9], [1, -10]]) if (hypot(x - hx, y - hy) < 3.6) return shade(normal, [40, 36, 36], 0.1, 20);
  return shade(normal, [150 + ring, 151 + ring, 155 + ring], 0.55, 40);
}

function ruler(x, y) {
  if (y < -44 || y > -34) return undefined;
  const tick = abs(x - round(x)) < 0.09 && y > -34 - (round(x) % 10 === 0 ? 5 : round(x) % 5 === 0 ? 3.4 : 2.2);
  return tick ? [30, 30, 32] : [226, 224, 214];
}

/**
 * @param {{outerMm?: number, width?: number, height?: number, burnedIn?: string[]}} spec
 * @returns {{width: number, height: number, rgb: Uint8Array, mmPerPixel: number}}
 */
export function drawPhotograph(spec = {}) {
  const { outerMm = 54, width = 1200, height = 900, burnedIn = [] } = spec;
  const mm = 150 / width;
  const radius = outerMm / 2;
  const shells = [
    { at: [-34, 8], opening: unit([0.25, -0.5, -0.83]), radius, wall: 4 },
    { at: [36, 8], opening: unit([-0.2, 0.3, 0.93]), radius, wall: 4 },
  ];
  const rgb = new Uint8Array(width * height * 3);
  const noise = grain(31, 0.25, 0.8);
  for (let j = 0; j < height; j++) {
    for (let i = 0; i < width; i++) {
      const x = (i - width / 2) * mm;
      const y = (height / 2 - j) * mm;
      let colour = ruler(x, y) ?? drape(x, y);
      for (const s of shells) {
        const [u, v] = [x - s.at[0], y - s.at[1]];
        const shadow = 0.45 + 0.55 * smooth(radius * 0.75, radius * 1.35, hypot(u - 5, v + 6));
        colour = shellColour(u, v, s) ?? scale(colour, shadow);
      }
      const dim = (1 - 0.000022 * (x * x + y * y)) * (1 + 0.014 * noise(x * 2, y * 2));
      for (let c = 0; c < 3; c++) rgb[(j * width + i) * 3 + c] = min(255, max(0, colour[c] * dim));
    }
  }
  burnedIn.forEach((text, line) =>
    textOnto(width, height, text, 24, 24 + line * 42, 26, (k, cover) => {
      for (let c = 0; c < 3; c++) rgb[k * 3 + c] = mix(rgb[k * 3 + c], [250, 220, 90][c], cover);
    }),
  );
  for (let cm = -6; cm <= 6; cm++) {
    textOnto(width, height, String(cm + 7), width / 2 + (cm * 10) / mm - 8, height / 2 + 40.6 / mm, 15, (k, cover) => {
      for (let c = 0; c < 3; c++) rgb[k * 3 + c] = mix(rgb[k * 3 + c], 30, cover);
    });
  }
  return { width, height, rgb, mmPerPixel: mm };
}
