// Spec in, radiograph and truth out.

import { addBody, addHemipelvis, addSpine, HIP, socket } from './anatomy.mjs';
import { expose } from './exposure.mjs';
import { addFemur } from './femur.mjs';
import { addCables, addCup, addHead, addStem } from './implants.mjs';
import { addKnee, kneeCamera, kneeTruth } from './knee.mjs';
import { addLateral } from './lateral.mjs';
import { burnIn, leadMarker } from './letters.mjs';
import { makeSheet } from './raster.mjs';
import { completeSpec, layOut, truthOf } from './scene.mjs';
import { toPlane } from './geometry.mjs';

/** Sockets, lysis and old beds as cavities of the operated half of the pelvis. */
function cavitiesOf(spec, scene) {
  const { shell, bone } = spec;
  const { camera, sideSign, cup } = scene;
  const bed = shell.outerMm / 2 + (shell.kind === 'cemented' ? (shell.cementMm ?? 4) : 0);
  const gap = shell.lucencyMm ?? 0;
  const main = socket(camera, sideSign, cup, bed - 0.4 + gap, {
    lining: gap ? 1.5 : 0.7,
    weight: gap ? 0.8 : 0.45,
    depth: gap ? 1.5 : 1,
    left: gap ? 0.22 : 0.3,
  });
  return [main, ...bone.cavities.map((c) => boneCavity(camera, sideSign, c))];
}

// Lytic cavities: uneven, with little reaction at the edge.
const LYSIS = { lining: 0.6, left: 0.38, depth: 1.2, weight: 0.22, lobes: 0.09 };

/** Cavity given by place lateral of the midline and above the teardrop line. */
function boneCavity(camera, sideSign, c) {
  const [x, y] = toPlane(camera, [sideSign * c.atMm[0], c.atMm[1], 0]);
  return { ...LYSIS, x, y, radius: c.radiusMm, left: c.left ?? LYSIS.left };
}

function drawPelvis(sheet, spec, scene) {
  const { camera, sideSign, femur } = scene;
  const { density } = spec.bone;
  addBody(sheet, { ...spec.body, seed: spec.seed });
  addSpine(sheet, density);
  const native = socket(camera, -sideSign, [-sideSign * HIP.x, HIP.y, 0], HIP.head + 3.2);
  addHemipelvis(sheet, -sideSign, { density, cavities: [native], flattened: spec.projection === 'oblique' });
  addHemipelvis(sheet, sideSign, { ...spec.bone, cavities: cavitiesOf(spec, scene) });
  addFemur(sheet, { frame: femur.other, density, seed: spec.seed + 1 });
  const lysis = (spec.femurCavities ?? []).map((c) => {
    const [x, y] = toPlane(camera, femur.bone.toPatient([...c.atMm, 0]));
    return { ...LYSIS, x, y, radius: c.radiusMm };
  });
  addFemur(sheet, { frame: femur.bone, operated: true, density, seed: spec.seed, fracture: spec.femurFracture, slipped: femur.slipped, cavities: lysis });
}

function drawKnee(spec) {
  const camera = kneeCamera(spec);
  const sideSign = spec.side === 'left' ? 1 : -1;
  const sheet = makeSheet(camera);
  addKnee(sheet, spec, sideSign);
  leadMarker(sheet, spec);
  const pixels = expose(sheet, spec);
  const truth = { ...kneeTruth(spec, camera, sideSign), burnedIn: burnIn(pixels, spec) };
  return { width: spec.width, height: spec.height, pixels, truth, spec };
}

/**
 * Draws one radiograph.
 * @param {object} input see `completeSpec` for what can be left out
 * @returns {{width: number, height: number, pixels: Uint16Array, truth: object, spec: object}}
 *   12-bit pixels, MONOCHROME2
 */
export function drawRadiograph(input) {
  const spec = completeSpec(input);
  if (spec.projection === 'ap-knee') return drawKnee(spec);
  const scene = layOut(spec);
  const sheet = makeSheet(scene.camera);
  if (spec.projection === 'lateral') addLateral(sheet, spec, scene);
  else drawPelvis(sheet, spec, scene);
  addCup(sheet, spec, scene.cup, scene.opening, scene.screws);
  const { tip } = addStem(sheet, spec, scene.femur.stem, scene.broken);
  addHead(sheet, spec.head, scene.headCentre);
  addCables(sheet, spec.cablesAtMm ?? [], scene.femur.bone);
  leadMarker(sheet, spec);
  const pixels = expose(sheet, spec);
  const truth = { ...truthOf(spec, scene), burnedIn: burnIn(pixels, spec) };
  truth.stemTipMm = tip;
  return { width: spec.width, height: spec.height, pixels, truth, spec };
}
