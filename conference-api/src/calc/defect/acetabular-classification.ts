import {
  CLASS_ROWS,
  DEFECT_CLASSES,
  KOHLER_STATES,
  MIGRATION_DIRECTIONS,
  TEARDROP_STATES,
} from './acetabular-table.js';
import type {
  AcetabularClass,
  ClassRow,
  DefectFindings,
  KohlerState,
  MigrationDirection,
  TeardropState,
} from './acetabular-table.js';

/** A class, or why there is none. */
export interface Classification {
  class: AcetabularClass | null;
  possible: AcetabularClass[];
  disagreements: string[];
  remarks: string[];
  missing: (keyof DefectFindings)[];
}

/** The four findings that the order of decisions uses, all known. */
interface Decisive {
  readonly overThreshold: boolean;
  readonly direction: MigrationDirection;
  readonly teardrop: TeardropState;
  readonly kohler: KohlerState;
}

// Below this a reading is not told from none on a plain film (common practice, no source).
const READING_ERROR_MM = 2;

const FINDING_ORDER: readonly (keyof DefectFindings)[] = [
  'migrationMm',
  'direction',
  'ischialLysis',
  'teardrop',
  'kohler',
  'superiorRim',
  'transverseLine',
];

/** The class of `findings` where migration strictly over `thresholdMm` separates II from III. */
export function classifyAtThreshold(findings: DefectFindings, thresholdMm: number): Classification {
  const missing = FINDING_ORDER.filter((name) => findings[name] === null);
  const none = { class: null, possible: [], remarks: [], missing };
  const contradiction = migrationContradiction(findings);
  if (contradiction !== null) return { ...none, disagreements: [contradiction] };

  const answers = new Set(completions(findings, thresholdMm).map(decide));
  const possible = DEFECT_CLASSES.filter((name) => answers.has(name));
  if (answers.size > 1) return { ...none, possible, disagreements: [] };

  const [candidate] = possible;
  if (candidate === undefined) {
    return { ...none, disagreements: ['Migration is medial, but the Köhler line and teardrop are not destroyed.'] };
  }
  const { disagreements, remarks } = compare(findings, candidate);
  if (disagreements.length > 0) return { ...none, disagreements, remarks };
  return { class: candidate, possible, disagreements, remarks, missing };
}

function migrationContradiction({ migrationMm, direction }: DefectFindings): string | null {
  if (direction === 'none' && migrationMm !== null && migrationMm > READING_ERROR_MM) {
    return `Direction is none, but migration is ${migrationMm} mm.`;
  }
  if (migrationMm === 0 && direction !== null && direction !== 'none') {
    return `Direction is ${direction}, but migration is 0 mm.`;
  }
  return null;
}

/** Every way the findings that are not known could turn out. */
function completions(findings: DefectFindings, thresholdMm: number): Decisive[] {
  const { migrationMm } = findings;
  const all: Decisive[] = [];
  for (const direction of directionsOpen(findings)) {
    // Without migration there is nothing to be over the threshold.
    const couldBeOver = migrationMm === null ? direction !== 'none' : migrationMm > thresholdMm;
    const couldBeUnder = migrationMm === null || migrationMm <= thresholdMm;
    const over = [...(couldBeOver ? [true] : []), ...(couldBeUnder ? [false] : [])];
    for (const teardrop of findings.teardrop === null ? TEARDROP_STATES : [findings.teardrop]) {
      for (const kohler of findings.kohler === null ? KOHLER_STATES : [findings.kohler]) {
        all.push(...over.map((overThreshold) => ({ overThreshold, direction, teardrop, kohler })));
      }
    }
  }
  return all;
}

function directionsOpen({ direction, migrationMm }: DefectFindings): readonly MigrationDirection[] {
  if (direction !== null) return [direction];
  if (migrationMm === 0) return ['none'];
  if (migrationMm !== null && migrationMm > READING_ERROR_MM) {
    return MIGRATION_DIRECTIONS.filter((name) => name !== 'none');
  }
  return MIGRATION_DIRECTIONS;
}

function decide({ overThreshold, direction, teardrop, kohler }: Decisive): AcetabularClass | null {
  if (overThreshold) return kohler === 'disrupted' || teardrop === 'absent' ? 'IIIB' : 'IIIA';
  if (kohler === 'disrupted' || teardrop === 'moderate' || teardrop === 'absent') return 'IIC';
  if (direction === 'superolateral') return 'IIB';
  if (direction === 'superior' || direction === 'superomedial') return 'IIA';
  return direction === 'none' ? 'I' : null;
}

const WORDS: Record<keyof ClassRow, string> = {
  direction: 'Direction of migration',
  ischialLysis: 'Ischial lysis',
  teardrop: 'Teardrop',
  kohler: 'Köhler line',
  superiorRim: 'Superior rim',
};

function compare(findings: DefectFindings, candidate: AcetabularClass) {
  const row = CLASS_ROWS[candidate];
  const disagreements: string[] = [];
  const remarks: string[] = [];
  for (const name of Object.keys(WORDS) as (keyof ClassRow)[]) {
    const value: string | null = findings[name];
    const fits: readonly string[] = row[name].fits;
    const near: readonly string[] = row[name].near;
    if (value === null || fits.includes(value)) continue;
    const sentence = `${WORDS[name]} is ${value}; class ${candidate} has ${fits.join(' or ')}.`;
    (near.includes(value) ? remarks : disagreements).push(sentence);
  }
  return { disagreements, remarks };
}
