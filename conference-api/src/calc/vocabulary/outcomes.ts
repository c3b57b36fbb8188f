export const BLOOD_LOSS_BANDS = { 'under-500': 'Under 500 mL', '500-999': '500 to 999 mL', '1000-1999': '1000 to 1999 mL', '2000-or-over': '2000 mL or over' } as const;
export const COMPLICATIONS = {
  none: 'None',
  fracture: 'Fracture',
  'vessel-injury': 'Vessel injury',
  'nerve-injury': 'Nerve injury',
  'pelvic-discontinuity': 'Pelvic discontinuity',
  'retained-metal': 'Retained metal',
  dislocation: 'Dislocation',
  infection: 'Infection',
  reoperation: 'Reoperation',
  death: 'Death',
  other: 'Other',
} as const;

export interface OutcomeContent {
  /** What was done for each planned step, by step id. */
  steps: { stepId: string; method: string; asPlanned: boolean | null }[];
  missingKit: string;
  minutes: number | null;
  bloodLoss: keyof typeof BLOOD_LOSS_BANDS | null;
  complications: (keyof typeof COMPLICATIONS)[];
  defectFound: string | null;
  removedShellMm: number | null;
  implantedShellMm: number | null;
  /** Hours of the rim clock where bone was lost, 1 to 12. */
  boneLostHours: number[];
  cultures: string;
  lesson: string;
}
