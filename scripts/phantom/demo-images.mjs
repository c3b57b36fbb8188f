// The demo's images: invented hips, one entry a film, with the words that the demo shows beside it.

const LATERAL = { projection: 'lateral', width: 1200, height: 1000, pixelSpacingMm: 0.25 };
const OBLIQUE = { projection: 'oblique', width: 900, height: 1200 };
const LONG_FILM = { centreMm: [0, -34] };

const domeScrew = (clockDeg, lengthMm, polarDeg = 27, tiltDeg = 0) => ({ polarDeg, clockDeg, lengthMm, tiltDeg });

// Path of the break in femur axes, from medial to lateral.
const SPIRAL = [[16, -152], [27, -142], [36, -122], [46, -100], [56, -84], [68, -74]];

const CASES = {
  'vertical-shell': {
    seed: 101, side: 'left', rollDeg: 0.8,
    shell: { outerMm: 54, inclinationDeg: 62, versionDeg: 21, heightMm: 19, lateralMm: 32, screws: [domeScrew(14, 30), domeScrew(48, 25, 30)] },
    head: { diameterMm: 32, wearMm: 2.5 },
    legLengthDifferenceMm: -3,
  },
  'retroverted-shell': {
    seed: 102, side: 'right', rollDeg: -1.1, magnification: 1.18,
    shell: { outerMm: 56, inclinationDeg: 44, versionDeg: -9, heightMm: 16, lateralMm: 31, screws: [domeScrew(24, 30)] },
    head: { diameterMm: 36, material: 'ceramic' },
    liner: { kind: 'polyethylene' },
  },
  'infected-fixed-shell': {
    seed: 103, side: 'left', rollDeg: 0.4, body: { size: 1.08 },
    shell: { outerMm: 58, inclinationDeg: 41, versionDeg: 16, heightMm: 18, lateralMm: 32, screws: [domeScrew(4, 35, 24), domeScrew(40, 30, 32), domeScrew(-30, 25, 34)] },
    head: { diameterMm: 36 },
    femurCavities: [{ atMm: [58, -12], radiusMm: 8 }, { atMm: [54, -34], radiusMm: 5 }],
  },
  'high-centre-medial': {
    seed: 104, side: 'right', rollDeg: 0.9, magnification: 1.21,
    shell: { outerMm: 60, inclinationDeg: 37, versionDeg: 12, heightMm: 44, lateralMm: 13, lucencyMm: 2.5, holes: [] },
    head: { diameterMm: 32 },
    bone: { density: 0.92, teardrop: 0, kohler: 0.15, cavities: [{ atMm: [90, 16], radiusMm: 27, left: 0.3 }, { atMm: [70, -22], radiusMm: 10, left: 0.4 }] },
    legLengthDifferenceMm: -24,
  },
  'migration-early': {
    seed: 105, side: 'left', rollDeg: 0.3,
    shell: { outerMm: 52, inclinationDeg: 43, versionDeg: 14, heightMm: 18, lateralMm: 31, screws: [domeScrew(18, 25)] },
    head: { diameterMm: 28, wearMm: 0.6 },
  },
  'migration-late': {
    seed: 105, side: 'left', rollDeg: -0.7, magnification: 1.23,
    shell: { outerMm: 52, inclinationDeg: 57, versionDeg: 24, heightMm: 39, lateralMm: 39, lucencyMm: 2.5, screws: [domeScrew(18, 25)] },
    head: { diameterMm: 28, wearMm: 2.4 },
    bone: { density: 0.95, teardrop: 0.8, cavities: [{ atMm: [91, 20], radiusMm: 26.5, left: 0.32 }, { atMm: [73, -24], radiusMm: 9, left: 0.45 }] },
    legLengthDifferenceMm: -19,
  },
  'long-screws': {
    seed: 106, side: 'right', rollDeg: -0.5,
    shell: { outerMm: 54, inclinationDeg: 42, versionDeg: 13, heightMm: 21, lateralMm: 28, screws: [domeScrew(8, 35, 22), domeScrew(-86, 50, 24), domeScrew(-150, 45, 34)] },
    head: { diameterMm: 32 },
  },
  'cemented-cup': {
    seed: 107, side: 'left', rollDeg: 1, body: { size: 0.94 },
    shell: { kind: 'cemented', outerMm: 48, cementMm: 4, inclinationDeg: 46, versionDeg: 10, heightMm: 20, lateralMm: 31, lucencyMm: 2 },
    head: { diameterMm: 22.225, material: 'steel', wearMm: 3.2 },
    stem: { kind: 'cemented' },
    bone: { density: 0.86 },
  },
  'constrained-liner': {
    seed: 108, side: 'right', rollDeg: 0.2,
    shell: { outerMm: 60, inclinationDeg: 48, versionDeg: 7, heightMm: 24, lateralMm: 33, screws: [domeScrew(10, 30), domeScrew(55, 25, 34)] },
    head: { diameterMm: 28 },
    liner: { kind: 'constrained' },
  },
  'fracture-b2': {
    seed: 109, side: 'left', rollDeg: -0.6, ...LONG_FILM, body: { size: 0.93 },
    shell: { outerMm: 50, inclinationDeg: 40, versionDeg: 17, heightMm: 17, lateralMm: 31 },
    head: { diameterMm: 28 },
    bone: { density: 0.84 },
    legLengthDifferenceMm: -11,
    femurFracture: { path: SPIRAL, shift: [5, -5], turnDeg: -8 },
  },
  'stem-fracture': {
    seed: 110, side: 'right', rollDeg: 0.5, ...LONG_FILM, body: { size: 1.06 },
    shell: { outerMm: 54, inclinationDeg: 41, versionDeg: 18, heightMm: 17, lateralMm: 31 },
    head: { diameterMm: 32 },
    stem: { kind: 'cemented', fractureAt: -88, fractureShift: [-1.6, -1.2], fractureTurnDeg: -7 },
    femurCavities: [{ atMm: [52, -46], radiusMm: 6 }, { atMm: [31, -52], radiusMm: 5 }],
  },
  'jumbo-shell': {
    seed: 111, side: 'left', rollDeg: 0,
    shell: { outerMm: 70, wallMm: 5, inclinationDeg: 45, versionDeg: 19, heightMm: 29, lateralMm: 33, screws: [domeScrew(0, 45, 20), domeScrew(34, 40, 26), domeScrew(66, 30, 36)] },
    head: { diameterMm: 36 },
    liner: { kind: 'polyethylene' },
  },
  'dual-mobility': {
    seed: 112, side: 'right', rollDeg: -0.9,
    shell: { outerMm: 56, inclinationDeg: 50, versionDeg: 4, heightMm: 18, lateralMm: 31 },
    head: { diameterMm: 28, material: 'ceramic' },
    liner: { kind: 'dual-mobility' },
  },
  'lysis-early': {
    seed: 113, side: 'left', rollDeg: 0.5,
    shell: { outerMm: 54, inclinationDeg: 44, versionDeg: 15, heightMm: 18, lateralMm: 31, screws: [domeScrew(20, 30)] },
    head: { diameterMm: 28, wearMm: 1.1 },
  },
  'lysis-late': {
    seed: 113, side: 'left', rollDeg: -0.2, magnification: 1.19,
    shell: { outerMm: 54, inclinationDeg: 44, versionDeg: 15, heightMm: 18, lateralMm: 31, screws: [domeScrew(20, 30)] },
    head: { diameterMm: 28, wearMm: 4.2 },
    bone: { cavities: [{ atMm: [98, 52], radiusMm: 11, left: 0.3 }, { atMm: [84, 50], radiusMm: 8, left: 0.35 }, { atMm: [71, -20], radiusMm: 11, left: 0.35 }, { atMm: [67, -34], radiusMm: 7, left: 0.4 }] },
    femurCavities: [{ atMm: [58, -10], radiusMm: 9 }],
  },
  'long-leg': {
    seed: 114, side: 'right', rollDeg: 0.7,
    shell: { outerMm: 52, inclinationDeg: 39, versionDeg: 11, heightMm: 15, lateralMm: 33 },
    head: { diameterMm: 36 },
    legLengthDifferenceMm: 14,
  },
  'long-stem': {
    seed: 115, side: 'left', rollDeg: 0.2, centreMm: [0, -62], body: { size: 0.97 },
    shell: { outerMm: 58, inclinationDeg: 43, versionDeg: 16, heightMm: 22, lateralMm: 31, screws: [domeScrew(16, 30), domeScrew(50, 25, 32)] },
    head: { diameterMm: 36 },
    stem: { kind: 'long' },
    cablesAtMm: [-62, -84, -118],
  },
};

const KNEE = {
  seed: 116, side: 'right', projection: 'ap-knee', width: 900, height: 1200, pixelSpacingMm: 0.25, magnification: 1.1,
  knee: { trayVarusDeg: 5, lucencyMm: 2 },
};

const film = (caseKey, view, interval, caption, extra = {}) => {
  const spec = { ...CASES[caseKey], ...extra };
  return { fileName: `${caseKey}-${view}.dcm`, caseKey, projection: spec.projection ?? 'ap-pelvis', side: spec.side, interval, caption, spec };
};

/**
 * @returns {{fileName: string, caseKey: string, projection: string, side: string, interval: string, caption: string, spec: object}[]}
 *   `interval` counts from the last operation on that joint; the entry 'photograph' is for
 *   `drawPhotograph` and JPEG, all others for `drawRadiograph`
 */
export function demoImages() {
  return [
    film('vertical-shell', 'ap', '4 years', 'Steep shell without a lucent line, edge wear of the liner'),
    film('vertical-shell', 'lateral', '4 years', 'Same hip, shoot-through lateral', LATERAL),
    film('retroverted-shell', 'ap', '2 years', 'Shell without a lucent line; one film cannot tell the sign of version'),
    film('retroverted-shell', 'lateral', '2 years', 'Opening faces backwards', LATERAL),
    film('infected-fixed-shell', 'ap', '3 years', 'Three screws, no lucent line, cavities in the greater trochanter'),
    film('high-centre-medial', 'ap', '11 years', 'High and medial centre, Köhler line interrupted, teardrop not seen'),
    film('high-centre-medial', 'oblique', '11 years', 'Oblique of the same hip', OBLIQUE),
    film('migration-early', 'ap', '1 year', 'First follow-up film'),
    film('migration-late', 'ap', '6 years', 'Shell has moved up and outwards, lucent line all round'),
    film('long-screws', 'ap', '5 years', 'Two screws pass the pelvic brim'),
    film('long-screws', 'oblique', '5 years', 'Screw tips in the oblique view', OBLIQUE),
    film('cemented-cup', 'ap', '17 years', 'Cemented cup with wire marker, lucent line between cement and bone'),
    film('cemented-cup', 'lateral', '17 years', 'Same hip, shoot-through lateral', LATERAL),
    film('constrained-liner', 'ap', '2 years', 'Constrained liner with locking ring'),
    film('fracture-b2', 'ap', '9 years', 'Spiral break around the tip, stem has sunk'),
    film('fracture-b2', 'lateral', '9 years', 'Same hip, shoot-through lateral', LATERAL),
    film('stem-fracture', 'ap', '14 years', 'Broken stem, distal part held in cement'),
    film('jumbo-shell', 'ap', '6 years', 'Shell of 70 mm with three screws'),
    film('dual-mobility', 'ap', '3 years', 'Dual mobility bearing, ceramic head'),
    film('lysis-early', 'ap', '5 years', 'Earlier film'),
    film('lysis-late', 'ap', '13 years', 'Worn liner, cavities above the shell and in the ischium, shell has not moved'),
    film('long-leg', 'ap', '8 months', 'Operated leg longer'),
    film('long-stem', 'ap', '7 years', 'Long stem after an earlier revision, three cables'),
    { fileName: 'loose-knee-tray-ap.dcm', caseKey: 'loose-knee-tray', projection: 'ap-knee', side: 'right', interval: '8 years', caption: 'Tray in varus with a lucent line under it', spec: KNEE },
    { fileName: 'infected-fixed-shell-photograph.jpg', caseKey: 'infected-fixed-shell', projection: 'photograph', side: 'left', interval: '3 years', caption: 'A shell after removal, outside and inside, ruler in mm', spec: { outerMm: 58 } },
  ];
}
