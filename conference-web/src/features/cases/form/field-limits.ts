/** The bounds of a number, or the most characters of a text. */
export interface NumberLimit {
  min: number;
  max: number;
  whole?: boolean;
}

const between = (min: number, max: number): NumberLimit => ({ min, max });
const whole = (min: number, max: number): NumberLimit => ({ min, max, whole: true });

const SHORT = 200;
const LONG = 6000;

/**
 * What the server takes, so that a slip is told at the field and not by a refusal. By the section or the item; a test
 * holds them against the API's contract.
 */
export const NUMBER_LIMITS: Record<string, Record<string, NumberLimit>> = {
  patient: { ageYears: whole(0, 130) },
  screws: { hour: whole(1, 12), lengthMm: between(5, 120) },
  parts: { sizeMm: between(0, 400), outerDiameterMm: between(20, 100), innerDiameterMm: between(10, 80), thicknessMm: between(0, 40) },
  infection: {
    sameOrganismCultures: whole(0, 50),
    crpMgL: between(0, 1000),
    dDimerUgL: between(0, 200_000),
    esrMmH: between(0, 200),
    synovialWbcPerUl: between(0, 1_000_000),
    pmnPercent: between(0, 100),
    synovialCrpMgL: between(0, 1000),
  },
  bone: {
    migrationMm: between(0, 200),
    inclinationDeg: between(0, 90),
    versionDeg: between(-90, 90),
    hipCentreHeightMm: between(-100, 200),
    legLengthMm: between(-150, 150),
  },
  plan: { expectedNextShellMm: between(20, 100) },
};

export const TEXT_LIMITS: Record<string, Record<string, number>> = {
  heading: { title: 160, question: LONG, urgencyReason: 1000 },
  patient: {
    comorbidityNote: LONG,
    metalAllergy: SHORT,
    cementAllergy: SHORT,
    antibioticAllergy: SHORT,
    anticoagulationNote: SHORT,
    function: LONG,
  },
  history: { indexDiagnosis: 1000, indexInterval: SHORT, course: LONG },
  operations: { interval: SHORT, procedure: 1000 },
  parts: { maker: SHORT, model: SHORT, locking: SHORT, note: 1000 },
  infection: { sampling: SHORT, histology: LONG },
  cultures: { specimen: SHORT, result: SHORT, organism: SHORT, sensitivities: 1000 },
  bone: { column: 1000, note: LONG },
  plan: { reconstruction: LONG, expectedBoneLoss: 1000 },
  steps: { method: 2000, tool: 500, fallback: 1000, hazard: 1000, who: SHORT },
  kit: { item: 300, size: 100 },
  options: { title: SHORT, description: 2000 },
};

/** The most items of each list. */
export const LIST_LIMITS = { operations: 30, parts: 20, screws: 20, cultures: 30, steps: 40, kit: 80, options: 6 } as const;
export type ListName = keyof typeof LIST_LIMITS;
