import type { KnownFindings } from './infection-findings.js';

const ALWAYS = [
  'Support for a decision only. The judgement of the treating team, microbiology and local policy come first.',
  'What is not known is not counted as negative: the result can change when it is known.',
  'A value exactly at the threshold does not count as raised.',
  'Check the units: CRP in mg/L (10 times mg/dL), synovial cell count per µL (1000 times 10⁹/L).',
  'D-dimer in µg/L (same as ng/mL), as fibrinogen-equivalent units; D-dimer units are about half of these (from memory).',
  'A leukocyte esterase strip cannot be read in bloody fluid (from memory).',
  'Two positive cultures count as a major criterion only if they grew the same organism.',
  'Purulence has no role where an adverse local tissue reaction is suspected.',
];

/** The cautions that hold for every infection result, then those this work-up gives cause for. */
export function infectionCautions(findings: KnownFindings): string[] {
  return [...ALWAYS, ...unitSlips(findings), ...cultureRemarks(findings)];
}

// Common practice, no source: values far below what the unit asked for usually gives.
function unitSlips({ crpMgL, synovialWbcPerUl, dDimerUgL, pmnPercent }: KnownFindings): string[] {
  const slips: string[] = [];
  if (crpMgL !== null && crpMgL > 0 && crpMgL < 1) {
    slips.push(`CRP ${crpMgL} is low for mg/L. Check that it was not measured in mg/dL.`);
  }
  if (synovialWbcPerUl !== null && synovialWbcPerUl > 0 && synovialWbcPerUl < 100) {
    slips.push(`A synovial count of ${synovialWbcPerUl} is low for cells per µL. Check that it is not in 10⁹/L.`);
  }
  if (dDimerUgL !== null && dDimerUgL > 0 && dDimerUgL < 20) {
    slips.push(`D-dimer ${dDimerUgL} is low for µg/L. Check that it was not measured in mg/L.`);
  }
  if (pmnPercent !== null && pmnPercent > 0 && pmnPercent < 1) {
    slips.push(`${pmnPercent} is low for a percentage of neutrophils. Check that it is not a fraction.`);
  }
  return slips;
}

function cultureRemarks({ sameOrganismCultures, singlePositiveCulture }: KnownFindings): string[] {
  if (sameOrganismCultures === 1 && singlePositiveCulture !== true) {
    return ['One positive culture is recorded. It scores only when entered as a single positive culture.'];
  }
  return [];
}
