// From a spec to places in space, and from there to the numbers that a reader of the film should find.

import { HIP, TEARDROP } from './anatomy.mjs';
import { femurFrame, LESSER, movedFrame } from './femur.mjs';
import { add, DEG, filmAngles, length, makeCamera, openingAxis, project, projectedCircle, scale, spaceAnglesForFilm, sub } from './geometry.mjs';
import { screwPlaces } from './implants.mjs';

const DEFAULTS = {
  seed: 1,
  side: 'left',
  projection: 'ap-pelvis',
  width: 1400,
  height: 1200,
  pixelSpacingMm: 0.3,
  sourceDetectorMm: 1150,
  magnification: 1.2,
  rollDeg: 0.6,
  centreMm: [0, 14],
  angles: 'film',
  shell: { kind: 'porous', outerMm: 54, wallMm: 4, inclinationDeg: 42, versionDeg: 15, heightMm: 17, lateralMm: 31 },
  liner: { kind: 'polyethylene' },
  head: { diameterMm: 32, material: 'cobalt', wearMm: 0 },
  stem: { kind: 'tapered' },
  bone: { density: 1, teardrop: 1, kohler: 1, cavities: [] },
  body: { size: 1 },
  exposure: {},
  burnedIn: [],
};

/** Spec with everything that was left out. */
export function completeSpec(spec = {}) {
  const out = { ...DEFAULTS, ...spec };
  for (const key of ['shell', 'head', 'stem', 'bone', 'body', 'exposure']) out[key] = { ...DEFAULTS[key], ...spec[key] };
  out.liner = { innerMm: out.head.diameterMm + 0.6, ...DEFAULTS.liner, ...spec.liner };
  if (out.shell.outerMm / 2 - out.shell.wallMm < out.head.diameterMm / 2 + 1) throw new RangeError('the head does not fit the shell');
  if (!(out.magnification >= 1 && out.magnification < 2)) throw new RangeError('magnification must lie between 1 and 2');
  return out;
}

const SIGN = { left: 1, right: -1 };

/** Cameras by projection; the lateral one is a shoot-through with the beam square on the neck. */
function cameraFor(spec, sideSign, hip) {
  const film = spec;
  const front = makeCamera({ ...film, toSource: [0, 0, 1], up: [0, 1, 0], target: [...spec.centreMm, 0] });
  if (spec.projection === 'ap-pelvis') return { front, camera: front };
  if (spec.projection === 'lateral') {
    const a = (spec.beamDeg ?? 42) * DEG;
    const toSource = [-sideSign * Math.sin(a), -Math.cos(a), 0];
    const along = [sideSign * Math.cos(a), -Math.sin(a), 0];
    const target = add(hip, add(scale(along, 38), [0, 0, 4]));
    const camera = makeCamera({ ...film, rollDeg: 0, toSource, up: [0, 0, 1], target });
    return { front, camera };
  }
  // Turned so that the obturator foramen of the operated side opens.
  const turn = sideSign * 38 * DEG;
  const toSource = [Math.sin(turn), 0, Math.cos(turn)];
  const target = [hip[0] * 0.86, spec.centreMm[1], 0];
  return { front, camera: makeCamera({ ...film, toSource, up: [0, 1, 0], target }) };
}

/** Femur's origin along the shaft, so that the lesser trochanters show the leg-length difference asked for. */
function seatFemur(sideSign, headCentre, wantedMm, right) {
  const stem = femurFrame(sideSign, headCentre, right);
  const other = femurFrame(-sideSign, [-sideSign * HIP.x, HIP.y, 0], right);
  const otherLesser = other.toPatient(LESSER);
  const own = otherLesser[1] - stem.toPatient(LESSER)[1];
  const slide = wantedMm === undefined ? 0 : (wantedMm - own) / -stem.down[1];
  const bone = femurFrame(sideSign, add(headCentre, scale(stem.down, slide)), right);
  return { stem, bone, other, otherLesser, lesser: bone.toPatient(LESSER) };
}

/** All places of a spec. */
export function layOut(spec) {
  const sideSign = SIGN[spec.side];
  const { shell, head } = spec;
  const cup = [sideSign * (TEARDROP + shell.lateralMm), shell.heightMm, 0];
  const { front, camera } = cameraFor(spec, sideSign, cup);
  const wanted = { inclinationDeg: shell.inclinationDeg, versionDeg: shell.versionDeg };
  const space = spec.angles === 'space' ? wanted : spaceAnglesForFilm(front, cup, shell.outerMm / 2, sideSign, spec.rollDeg, wanted);
  const opening = openingAxis(space.inclinationDeg, space.versionDeg, sideSign);
  const worn = head.wearMm ? scale([sideSign * 0.35, 0.94, 0], head.wearMm) : [0, 0, 0];
  const headCentre = add(cup, worn);
  const right = spec.projection === 'oblique' ? camera.right : undefined;
  const femur = seatFemur(sideSign, headCentre, spec.legLengthDifferenceMm, right);
  const { femurFracture: fracture } = spec;
  if (fracture) {
    const pivot = fracture.path[Math.floor(fracture.path.length / 2)];
    femur.slipped = movedFrame(femur.bone, pivot, fracture.shift, fracture.turnDeg * DEG);
  }
  const broken = spec.stem.fractureAt
    ? movedFrame(femur.stem, [44, spec.stem.fractureAt], spec.stem.fractureShift ?? [0, -2], (spec.stem.fractureTurnDeg ?? 7) * DEG)
    : undefined;
  return {
    sideSign, front, camera, cup, space, opening, headCentre, femur, broken,
    screws: shell.kind === 'cemented' ? [] : screwPlaces(shell, cup, opening),
    teardrops: { left: [TEARDROP, 0, 0], right: [-TEARDROP, 0, 0] },
  };
}

const px = (camera) => (point) => {
  const p = project(camera, point);
  return { x: round(p.x), y: round(p.y) };
};
const round = (v) => Math.round(v * 1000) / 1000;

/** Silhouette of a ball: mean diameter in pixels. */
function ballPixels(camera, centre, radius) {
  const source = add(camera.target, scale(camera.toSource, camera.sourceMm));
  const far = length(sub(centre, source));
  const sin = radius / far;
  const axis = scale(sub(source, centre), 1 / far);
  const e = projectedCircle(camera, add(centre, scale(axis, radius * sin)), axis, radius * Math.sqrt(1 - sin * sin));
  return { diameterPx: round(Math.sqrt(e.major * e.minor)), centrePx: { x: round(e.centre.x), y: round(e.centre.y) } };
}

function cupTruth(spec, scene) {
  const { camera, cup, opening, sideSign } = scene;
  const radius = spec.shell.outerMm / 2;
  const film = filmAngles(scene.front, cup, opening, radius, sideSign, spec.rollDeg);
  const e = projectedCircle(camera, cup, opening, radius);
  const c = Math.cos(e.angleDeg * DEG) * e.major * 0.5;
  const s = Math.sin(e.angleDeg * DEG) * e.major * 0.5;
  return {
    inclinationDeg: round(film.inclinationDeg),
    versionDeg: round(film.versionDeg),
    spaceInclinationDeg: round(scene.space.inclinationDeg),
    spaceVersionDeg: round(scene.space.versionDeg),
    outerDiameterMm: spec.shell.outerMm,
    centreMm: cup,
    centrePx: px(camera)(cup),
    rimEllipse: { centrePx: { x: round(e.centre.x), y: round(e.centre.y) }, majorPx: round(e.major), minorPx: round(e.minor), angleDeg: round(e.angleDeg) },
    rimEndsPx: [{ x: round(e.centre.x - c), y: round(e.centre.y + s) }, { x: round(e.centre.x + c), y: round(e.centre.y - s) }],
  };
}

/**
 * The numbers behind the film. Lengths in mm are those in the plane of the hips; film angles are
 * against the inter-teardrop line; leg-length difference is operated minus other side, positive
 * when the operated leg is longer.
 */
export function truthOf(spec, scene) {
  const { camera, headCentre, femur, sideSign } = scene;
  const at = px(camera);
  const other = spec.side === 'left' ? 'right' : 'left';
  return {
    side: spec.side,
    projection: spec.projection,
    pixelSpacingMm: spec.pixelSpacingMm,
    sourceDetectorMm: spec.sourceDetectorMm,
    magnification: spec.magnification,
    mmPerPixelAtHip: spec.pixelSpacingMm / spec.magnification,
    teardropsPx: { left: at(scene.teardrops.left), right: at(scene.teardrops.right) },
    cup: cupTruth(spec, scene),
    head: { diameterMm: spec.head.diameterMm, ...ballPixels(camera, headCentre, spec.head.diameterMm / 2) },
    hipCentre: {
      heightMm: round(headCentre[1] - scene.teardrops.left[1]),
      fromTeardropMm: round(sideSign * headCentre[0] - TEARDROP),
      px: at(headCentre),
    },
    otherHip: { heightMm: HIP.y - scene.teardrops.left[1], fromTeardropMm: HIP.x - TEARDROP, headDiameterMm: 2 * HIP.head, px: at([-sideSign * HIP.x, HIP.y, 0]) },
    lesserTrochantersPx: { [spec.side]: at(femur.lesser), [other]: at(femur.otherLesser) },
    legLengthDifferenceMm: round(femur.otherLesser[1] - femur.lesser[1]),
    screws: scene.screws.map((s) => ({ lengthMm: s.lengthMm, headPx: at(s.seat), tipPx: at(s.tip), tipMm: s.tip.map(round) })),
  };
}
