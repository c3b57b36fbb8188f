import { CHARLSON_FIELDS, calculateCharlson } from '../calc/comorbidity/charlson.js';
import type { FieldSpec } from '../calc/common/field-spec.js';
import { ACETABULAR_DEFECT_FIELDS, calculateAcetabularDefect } from '../calc/defect/acetabular-defect.js';
import { CALIBRATION_FIELDS, calculateCalibration } from '../calc/geometry/calibration.js';
import { calculateCupEllipse, CUP_ELLIPSE_FIELDS } from '../calc/geometry/cup-ellipse.js';
import { calculateCupOrientation, CUP_ORIENTATION_FIELDS } from '../calc/geometry/cup-orientation.js';
import { calculateRemovalGeometry, REMOVAL_GEOMETRY_FIELDS } from '../calc/geometry/removal-geometry.js';
import { IDENTIFIER_SCREEN_FIELDS, screenIdentifiers } from '../calc/identifiers/identifier-screen.js';
import { calculateInfection2013, INFECTION_2013_FIELDS } from '../calc/infection/infection-2013.js';
import { calculateInfection2018, INFECTION_2018_FIELDS } from '../calc/infection/infection-2018.js';
import { agreement, AGREEMENT_FIELDS } from '../calc/panel/agreement.js';
import { panel, PANEL_FIELDS } from '../calc/panel/panel.js';
import { proportion, PROPORTION_FIELDS } from '../calc/panel/proportion.js';
import { ranking, RANKING_FIELDS } from '../calc/panel/ranking.js';
import { agendaFill, AGENDA_FILL_FIELDS } from '../calc/planning/agenda-fill.js';
import { MEETING_DATES_FIELDS, meetingDates } from '../calc/planning/meeting-dates.js';

interface Calculator {
  fields: readonly FieldSpec[];
  calculate: (input: never) => object;
}

/** Every calculator by the name of its route. Each checks its own input at run time. */
export const CALCULATORS = {
  'infection-2018': { fields: INFECTION_2018_FIELDS, calculate: calculateInfection2018 },
  'infection-2013': { fields: INFECTION_2013_FIELDS, calculate: calculateInfection2013 },
  'acetabular-defect': { fields: ACETABULAR_DEFECT_FIELDS, calculate: calculateAcetabularDefect },
  'cup-orientation': { fields: CUP_ORIENTATION_FIELDS, calculate: calculateCupOrientation },
  'cup-ellipse': { fields: CUP_ELLIPSE_FIELDS, calculate: calculateCupEllipse },
  calibration: { fields: CALIBRATION_FIELDS, calculate: calculateCalibration },
  'removal-geometry': { fields: REMOVAL_GEOMETRY_FIELDS, calculate: calculateRemovalGeometry },
  panel: { fields: PANEL_FIELDS, calculate: panel },
  agreement: { fields: AGREEMENT_FIELDS, calculate: agreement },
  ranking: { fields: RANKING_FIELDS, calculate: ranking },
  proportion: { fields: PROPORTION_FIELDS, calculate: proportion },
  'agenda-fill': { fields: AGENDA_FILL_FIELDS, calculate: agendaFill },
  'meeting-dates': { fields: MEETING_DATES_FIELDS, calculate: meetingDates },
  'identifier-screen': { fields: IDENTIFIER_SCREEN_FIELDS, calculate: screenIdentifiers },
  charlson: { fields: CHARLSON_FIELDS, calculate: calculateCharlson },
} as const satisfies Record<string, Calculator>;

export type CalculatorName = keyof typeof CALCULATORS;

export const CALCULATOR_NAMES = Object.keys(CALCULATORS) as CalculatorName[];
