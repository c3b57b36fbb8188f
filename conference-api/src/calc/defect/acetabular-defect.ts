import { CalcInputError } from '../common/calc-input-error.js';
import type { FieldSpec } from '../common/field-spec.js';
import { optionalBoolean, optionalChoice, optionalNumber, readBody } from '../common/optional-input.js';
import { classifyAtThreshold } from './acetabular-classification.js';
import { KOHLER_STATES, LYSIS_GRADES, MIGRATION_DIRECTIONS, RIM_STATES, TEARDROP_STATES } from './acetabular-table.js';
import type {
  AcetabularClass,
  DefectFindings,
  KohlerState,
  LysisGrade,
  MigrationDirection,
  RimState,
  TeardropState,
} from './acetabular-table.js';

export type { AcetabularClass } from './acetabular-table.js';

/** Findings on the films; null or absent is not known. */
export interface AcetabularDefectInput {
  /** Migration of the hip centre from the superior obturator line, calibrated: 0 to 150 mm. */
  migrationMm?: number | null;
  direction?: MigrationDirection | null;
  ischialLysis?: LysisGrade | null;
  teardrop?: TeardropState | null;
  kohler?: KohlerState | null;
  superiorRim?: RimState | null;
  /** A visible transverse line, or a rotated hemipelvis. */
  transverseLine?: boolean | null;
  /** Migration threshold between classes II and III in mm; 30 when not given. */
  rule?: 20 | 30 | null;
}

export type DefectFindingName = keyof DefectFindings;

export interface AcetabularDefectResult {
  /** Null when the findings disagree or too little is known. */
  class: AcetabularClass | null;
  /** A transverse line, class IIIB at either threshold, or a lost teardrop with a broken Köhler line. */
  suspectedDiscontinuity: boolean;
  /** Findings that contradict the class the others lead to; never empty when that is why it is null. */
  disagreements: string[];
  /** What the other threshold would give. */
  otherRule: AcetabularClass | null;
  missing: DefectFindingName[];
  /** Classes still open when too little is known. */
  possibleClasses: AcetabularClass[];
  /** Findings one grade off the class's row, which do not change it. */
  remarks: string[];
  definition: string;
  cautions: string[];
}

export const ACETABULAR_DEFECT_FIELDS: readonly FieldSpec[] = [
  { name: 'migrationMm', type: 'number' },
  { name: 'direction', type: 'string' },
  { name: 'ischialLysis', type: 'string' },
  { name: 'teardrop', type: 'string' },
  { name: 'kohler', type: 'string' },
  { name: 'superiorRim', type: 'string' },
  { name: 'transverseLine', type: 'boolean' },
  { name: 'rule', type: 'number' },
];

/**
 * The 1994 class of an acetabular defect from the findings on plain films, at a stated migration
 * threshold (`rule`, 20 or 30 mm; strictly over it is class III).
 *
 * Migration over the threshold: IIIB with a disrupted Köhler line or an absent teardrop, else IIIA.
 * Otherwise IIC with a disrupted Köhler line or a destroyed teardrop, IIB when superolateral, IIA
 * when superior or superomedial, I without migration. A finding that contradicts the resulting row
 * of the table makes the class null and is named in `disagreements`. A finding that is not known is
 * tried with every value it could have: if that leaves more than one class, the class is null.
 *
 * Throws CalcInputError with the field: `type`, `range` or `choice`.
 * Source: Paprosky and others 1994; table as in BMC Musculoskelet Disord s12891-020-03851-9 Table 1.
 * The order of decisions is an inference from that table, the 3-cm column is from memory.
 */
export function calculateAcetabularDefect(input: AcetabularDefectInput): AcetabularDefectResult {
  const findings = readFindings(input);
  const rule = readRule(input.rule);
  const own = classifyAtThreshold(findings, rule);
  const other = classifyAtThreshold(findings, rule === 30 ? 20 : 30);
  return {
    class: own.class,
    suspectedDiscontinuity:
      findings.transverseLine === true ||
      own.class === 'IIIB' ||
      other.class === 'IIIB' ||
      (findings.teardrop === 'absent' && findings.kohler === 'disrupted'),
    disagreements: own.disagreements,
    otherRule: other.class,
    missing: own.missing,
    possibleClasses: own.possible,
    remarks: own.remarks,
    definition: definitionOf(rule),
    cautions: cautionsFor(findings, own.class, other.class),
  };
}

function readFindings(input: AcetabularDefectInput): DefectFindings {
  const body = readBody(input);
  return {
    migrationMm: optionalNumber(body.migrationMm, 'migrationMm', { min: 0, max: 150, unit: 'mm' }),
    direction: optionalChoice(body.direction, 'direction', MIGRATION_DIRECTIONS),
    ischialLysis: optionalChoice(body.ischialLysis, 'ischialLysis', LYSIS_GRADES),
    teardrop: optionalChoice(body.teardrop, 'teardrop', TEARDROP_STATES),
    kohler: optionalChoice(body.kohler, 'kohler', KOHLER_STATES),
    superiorRim: optionalChoice(body.superiorRim, 'superiorRim', RIM_STATES),
    transverseLine: optionalBoolean(body.transverseLine, 'transverseLine'),
  };
}

function readRule(rule: unknown): 20 | 30 {
  if (rule === null || rule === undefined) return 30;
  if (typeof rule !== 'number') throw new CalcInputError('rule', 'type', 'rule must be a number.');
  if (rule !== 20 && rule !== 30) throw new CalcInputError('rule', 'choice', 'rule must be 20 or 30 (mm).');
  return rule;
}

const definitionOf = (rule: 20 | 30): string =>
  'Acetabular defect classification of Paprosky, Perona and Lawrence, J Arthroplasty 1994;9:33, ' +
  (rule === 20 ? 'migration threshold 2 cm as in the tables of 1994' : 'migration threshold 3 cm as in later texts');

function cautionsFor(
  findings: DefectFindings,
  own: AcetabularClass | null,
  other: AcetabularClass | null,
): string[] {
  const cautions = [
    'Support for a decision only. The judgement of the treating team comes first; the defect found at operation decides.',
    'What is not known is not counted as normal.',
    'Published agreement between readers, and with the findings at operation, is poor to moderate.',
    'Migration is measured from the superior obturator line on a calibrated image, not from the teardrop.',
    'The 3-cm threshold and the grading of ischial lysis in mm are from memory; the order of decisions is an inference.',
  ];
  if (own !== other) {
    cautions.push('The other migration threshold gives a different answer. State the threshold with the class.');
  }
  if (findings.transverseLine === null) {
    cautions.push('A transverse line was not looked for, so a discontinuity is not excluded.');
  }
  if (findings.transverseLine === true && own !== 'IIIB') {
    cautions.push('A transverse line points to a discontinuity whatever the class.');
  }
  if (findings.migrationMm === 20 || findings.migrationMm === 30) {
    cautions.push('Migration exactly at a threshold does not count as over it.');
  }
  return cautions;
}
