import { CalcInputError } from '../common/calc-input-error.js';
import type { FieldSpec } from '../common/field-spec.js';
import { requireChoice } from '../common/input-checks.js';
import { FLEISS_DEFINITION, fleissKappa, type Statistic } from './fleiss-kappa.js';
import { KENDALL_DEFINITION, kendallW, type KendallResult } from './kendall-w.js';
import { ALPHA_DEFINITION, krippendorffAlpha, type AlphaLevel } from './krippendorff-alpha.js';

export interface AgreementInput {
  method: 'fleiss-kappa' | 'krippendorff-alpha' | 'kendall-w';
  /** `fleiss-kappa`: case by category. */
  counts?: number[][] | null;
  /** `krippendorff-alpha`. */
  level?: AlphaLevel | null;
  /** `krippendorff-alpha`: rater by unit, null where missing. */
  data?: (number | null)[][] | null;
  /** `kendall-w`: judge by item. */
  scores?: number[][] | null;
}

interface Described {
  definition: string;
  cautions: string[];
}

export type AgreementAnswer = (Statistic & Described) | (KendallResult & Described);

export const AGREEMENT_FIELDS: readonly FieldSpec[] = [
  { name: 'method', type: 'string' },
  { name: 'counts', type: 'array' },
  { name: 'level', type: 'string' },
  { name: 'data', type: 'array' },
  { name: 'scores', type: 'array' },
];

const FIELDS_OF_METHOD = {
  'fleiss-kappa': ['counts'],
  'krippendorff-alpha': ['level', 'data'],
  'kendall-w': ['scores'],
} as const;

/**
 * Agreement of raters by one of three published statistics. Where the figure is
 * undefined, `value` is null and `why` gives the reason; otherwise `why` is null.
 *
 * @throws CalcInputError by field; a field of another method is refused as `not-used`.
 */
export function agreement(input: AgreementInput): AgreementAnswer {
  const method = requireChoice(input.method, 'method', [
    'fleiss-kappa',
    'krippendorff-alpha',
    'kendall-w',
  ]);
  refuseOtherMethodsFields(input, method);
  // Missing fields are refused by the functions below, which check at run time.
  if (method === 'fleiss-kappa') {
    const result = fleissKappa({ counts: input.counts as number[][] });
    return { ...result, definition: FLEISS_DEFINITION, cautions: [] };
  }
  if (method === 'kendall-w') {
    return { ...kendallW({ scores: input.scores as number[][] }), definition: KENDALL_DEFINITION };
  }
  const level = input.level as AlphaLevel;
  const result = krippendorffAlpha({ level, data: input.data as (number | null)[][] });
  return { ...result, definition: `${ALPHA_DEFINITION}; level ${level}.`, cautions: [] };
}

function refuseOtherMethodsFields(input: AgreementInput, method: AgreementInput['method']): void {
  const used: readonly string[] = FIELDS_OF_METHOD[method];
  for (const name of ['counts', 'level', 'data', 'scores'] as const) {
    if (!used.includes(name) && input[name] !== undefined && input[name] !== null) {
      throw new CalcInputError(name, 'not-used', `${name} is not used by ${method}.`);
    }
  }
}
