/** The findings the table is read by, and what each class expects of them. */
export const DEFECT_CLASSES = ['I', 'IIA', 'IIB', 'IIC', 'IIIA', 'IIIB'] as const;
export type AcetabularClass = (typeof DEFECT_CLASSES)[number];

export const MIGRATION_DIRECTIONS = ['none', 'superior', 'superolateral', 'superomedial', 'medial'] as const;
export type MigrationDirection = (typeof MIGRATION_DIRECTIONS)[number];
export const LYSIS_GRADES = ['none', 'mild', 'moderate', 'severe'] as const;
export type LysisGrade = (typeof LYSIS_GRADES)[number];
export const TEARDROP_STATES = ['intact', 'moderate', 'partial', 'absent'] as const;
export type TeardropState = (typeof TEARDROP_STATES)[number];
export const KOHLER_STATES = ['intact', 'disrupted'] as const;
export type KohlerState = (typeof KOHLER_STATES)[number];
export const RIM_STATES = ['intact', 'deficient'] as const;
export type RimState = (typeof RIM_STATES)[number];

/** What is known; null is not known. */
export interface DefectFindings {
  readonly migrationMm: number | null;
  readonly direction: MigrationDirection | null;
  readonly ischialLysis: LysisGrade | null;
  readonly teardrop: TeardropState | null;
  readonly kohler: KohlerState | null;
  readonly superiorRim: RimState | null;
  readonly transverseLine: boolean | null;
}

/**
 * One row: values the table prints (`fits`) and values one grade away that are remarked on but not
 * held against the class (`near`). Anything else disagrees with it.
 */
export interface ClassRow {
  readonly direction: Expected<MigrationDirection>;
  readonly ischialLysis: Expected<LysisGrade>;
  readonly teardrop: Expected<TeardropState>;
  readonly kohler: Expected<KohlerState>;
  readonly superiorRim: Expected<RimState>;
}

export interface Expected<T> {
  readonly fits: readonly T[];
  readonly near: readonly T[];
}

const fits = <T>(values: readonly T[], near: readonly T[] = []): Expected<T> => ({ fits: values, near });

// `fits` is the published table (1994; BMC s12891-020-03851-9 Table 1). `near`, one grade of lysis
// or teardrop either way, is our inference: without it a migration between 2 and 3 cm has no class
// at the 3-cm threshold although the later texts give one.
export const CLASS_ROWS: Readonly<Record<AcetabularClass, ClassRow>> = {
  I: {
    direction: fits(['none']),
    ischialLysis: fits(['none'], ['mild']),
    teardrop: fits(['intact']),
    kohler: fits(['intact']),
    superiorRim: fits(['intact']),
  },
  IIA: {
    direction: fits(['superior', 'superomedial']),
    ischialLysis: fits(['none', 'mild'], ['moderate']),
    teardrop: fits(['intact'], ['partial']),
    kohler: fits(['intact']),
    superiorRim: fits(['intact']),
  },
  IIB: {
    direction: fits(['superolateral']),
    ischialLysis: fits(['none', 'mild'], ['moderate']),
    teardrop: fits(['intact'], ['partial']),
    kohler: fits(['intact']),
    superiorRim: fits(['deficient']),
  },
  IIC: {
    direction: fits(['medial'], ['superomedial']),
    ischialLysis: fits(['mild'], ['none', 'moderate']),
    teardrop: fits(['moderate'], ['partial', 'absent', 'intact']),
    kohler: fits(['disrupted'], ['intact']),
    superiorRim: fits(['intact'], ['deficient']),
  },
  IIIA: {
    direction: fits(['superolateral'], ['superior']),
    ischialLysis: fits(['moderate'], ['mild', 'severe']),
    teardrop: fits(['moderate', 'partial'], ['intact']),
    kohler: fits(['intact']),
    superiorRim: fits(['deficient']),
  },
  IIIB: {
    direction: fits(['superomedial'], ['superior', 'medial']),
    ischialLysis: fits(['severe'], ['moderate']),
    teardrop: fits(['absent'], ['moderate', 'partial']),
    kohler: fits(['disrupted'], ['intact']),
    superiorRim: fits(['deficient']),
  },
};
