// Letters as strokes on a 4 by 6 grid, for the lead marker and for burned-in text in tests.

import { clamp } from './geometry.mjs';

// Strokes are point strings "xy xy ..."; x 0-4 from the left, y 0-6 from below.
const STROKES = {
  A: ['00 26 40', '12 32'], B: ['00 06 36 45 44 33 03', '33 42 41 30 00'], C: ['45 36 16 05 01 10 30 41'],
  D: ['00 06 26 44 42 20 00'], E: ['46 06 00 40', '03 33'], F: ['46 06 00', '03 33'],
  G: ['45 36 16 05 01 10 30 41 43 23'], H: ['00 06', '40 46', '03 43'], I: ['20 26', '16 36', '10 30'],
  J: ['46 41 30 10 01'], K: ['00 06', '46 02', '13 40'], L: ['06 00 40'], M: ['00 06 23 46 40'], N: ['00 06 40 46'],
  O: ['16 05 01 10 30 41 45 36 16'], P: ['00 06 36 45 44 33 03'], Q: ['16 05 01 10 30 41 45 36 16', '22 40'],
  R: ['00 06 36 45 44 33 03', '23 40'], S: ['45 36 16 05 04 13 33 42 41 30 10 01'], T: ['06 46', '26 20'],
  U: ['06 01 10 30 41 46'], V: ['06 20 46'], W: ['06 10 24 30 46'], X: ['00 46', '06 40'], Y: ['06 23 46', '23 20'],
  Z: ['06 46 00 40'], 0: ['16 05 01 10 30 41 45 36 16', '11 35'], 1: ['05 26 20', '10 30'], 2: ['05 16 36 45 44 00 40'],
  3: ['05 16 36 45 44 33 13', '33 42 41 30 10 01'], 4: ['30 36 02 42'], 5: ['46 06 03 33 42 41 30 10 01'],
  6: ['45 36 16 05 01 10 30 41 42 33 03'], 7: ['06 46 10'], 8: ['13 04 05 16 36 45 44 33 13 02 01 10 30 41 42 33'],
  9: ['01 10 30 41 45 36 16 05 04 13 43'], '-': ['13 33'], '/': ['00 46'], ':': ['24 25', '21 22'], '.': ['20 21'], ',': ['21 10'],
};

/** Segments of a text, in units of its height, with the pen's start at 0. */
export function textSegments(text) {
  const out = [];
  let x = 0;
  for (const letter of text.toUpperCase()) {
    for (const stroke of STROKES[letter] ?? []) {
      const pts = stroke.split(' ').map((p) => [x + Number(p[0]) / 6, Number(p[1]) / 6]);
      for (let i = 0; i + 1 < pts.length; i++) out.push([...pts[i], ...pts[i + 1]]);
    }
    x += 5.6 / 6;
  }
  return { segments: out, width: x };
}

/** Calls `paint(index, cover)` for the pixels under a text; (left, top) in px, height in px. */
function strokeText(width, height, text, left, top, size, pen, paint) {
  const { segments } = textSegments(text);
  const cover = new Map();
  for (const [x0, y0, x1, y1] of segments) {
    const [ax, ay, bx, by] = [left + x0 * size, top + (1 - y0) * size, left + x1 * size, top + (1 - y1) * size];
    for (let y = Math.floor(Math.min(ay, by) - pen); y <= Math.max(ay, by) + pen + 1; y++) {
      for (let x = Math.floor(Math.min(ax, bx) - pen); x <= Math.max(ax, bx) + pen + 1; x++) {
        if (x < 0 || y < 0 || x >= width || y >= height) continue;
        const t = clamp(((x - ax) * (bx - ax) + (y - ay) * (by - ay)) / ((bx - ax) ** 2 + (by - ay) ** 2 || 1), 0, 1);
        const c = clamp(pen + 0.5 - Math.hypot(x - ax - t * (bx - ax), y - ay - t * (by - ay)), 0, 1);
        const k = y * width + x;
        if (c > (cover.get(k) ?? 0)) cover.set(k, c);
      }
    }
  }
  cover.forEach((c, k) => paint(k, c));
}

/** Text of a given height in px with a pen that suits it. */
export const textOnto = (width, height, text, left, top, size, paint) =>
  strokeText(width, height, text, left, top, size, size * 0.075, paint);

/** Lead letter of the side on the cassette, on the side's own edge of the film. */
export function leadMarker(sheet, spec) {
  if (spec.marker === false) return;
  const letter = spec.marker ?? (spec.side === 'left' ? 'L' : 'R');
  const size = 15 / spec.pixelSpacingMm;
  const [u, v] = spec.markerAt ?? [0.93, 0.14];
  const right = spec.side === 'left' || spec.projection === 'lateral';
  const left = (right ? u : 1 - u) * sheet.width - size / 3;
  strokeText(sheet.width, sheet.height, letter, left, v * sheet.height, size, size * 0.085, (k, c) => {
    sheet.metal[k] += 3.2 * c;
  });
}

/**
 * Burns lines of text into the pixels, as a scanner's console would.
 * @returns {{text: string, box: {x: number, y: number, width: number, height: number}}[]}
 */
export function burnIn(pixels, spec) {
  const size = spec.burnedInSizePx ?? 22;
  return spec.burnedIn.map((text, line) => {
    const x = Math.round(0.02 * spec.width + 14);
    const y = Math.round(0.02 * spec.height + 14 + line * size * 1.7);
    strokeText(spec.width, spec.height, text, x, y, size, size * 0.075, (k, c) => {
      pixels[k] = Math.round(pixels[k] + (4095 - pixels[k]) * c);
    });
    return { text, box: { x, y, width: Math.ceil(textSegments(text).width * size), height: size } };
  });
}
