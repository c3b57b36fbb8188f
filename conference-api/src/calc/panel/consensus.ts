import type { FieldSpec } from '../common/field-spec.js';
import { requireChoice, requireInteger } from '../common/input-checks.js';
import {
  countInBand,
  countRegions,
  panel,
  readRatings,
  type PercentileRule,
} from './panel.js';
import { wilson } from './proportion.js';

export type ConsensusRule = 'rand' | 'three-quarters' | 'seventy-fifteen';
export type ConsensusDirection = 'for' | 'against' | 'unsettled';

export interface ConsensusInput {
  ratings: number[];
  rule: ConsensusRule;
  /** Members who were asked and gave no rating; shown, never counted in n. */
  abstentions?: number | null;
  /** Used by `rand` only. */
  percentiles?: PercentileRule | null;
}

export interface ConsensusAnswer {
  rule: ConsensusRule;
  reached: boolean;
  /** What the panel agreed on (or, where none was reached, leans to). */
  direction: ConsensusDirection;
  /** Ratings in the three-point region that the rule looks at. */
  k: number;
  n: number;
  abstentions: number;
  /** Wilson's 95 % interval of k/n. */
  low: number;
  high: number;
  definition: string;
  cautions: string[];
}

export const CONSENSUS_FIELDS: readonly FieldSpec[] = [
  { name: 'ratings', type: 'array' },
  { name: 'rule', type: 'string' },
  { name: 'abstentions', type: 'number' },
  { name: 'percentiles', type: 'string' },
];

const RULES = ['rand', 'three-quarters', 'seventy-fifteen'] as const;

const DEFINITIONS: Record<ConsensusRule, string> = {
  rand:
    'RAND/UCLA (RAND MR-1269, 2001): median 7–9 or 1–3 without disagreement (IPR ≤ IPRAS); ' +
    'k counts ratings in the median’s three-point region.',
  'three-quarters':
    'At least 75 % of those rating in 7–9 (for) or in 1–3 (against); 75 % is the median threshold ' +
    'in Delphi studies (Diamond IR et al., J Clin Epidemiol 2014;67:401).',
  'seventy-fifteen':
    '70/15: at least 70 % in 7–9 and fewer than 15 % in 1–3 (for), or the reverse (against), ' +
    'as in core-outcome studies.',
};

/**
 * Whether a round reached consensus by a published rule that the conference chose.
 * Shares are compared as whole numbers, so 6 of 8 is exactly 75 %.
 *
 * Source: RAND MR-1269; Diamond 2014 (75 %); core-outcome practice (70/15; its
 * mirror image for 'against' is from memory).
 *
 * @throws CalcInputError by field, as `panel` does.
 */
export function consensus(input: ConsensusInput): ConsensusAnswer {
  const ratings = readRatings(input.ratings);
  const rule = requireChoice(input.rule, 'rule', RULES);
  const abstentions = requireInteger(input.abstentions ?? 0, 'abstentions', 0, 1000);
  const found = rule === 'rand' ? byRand(ratings, input.percentiles) : byShares(ratings, rule);
  const n = ratings.length;
  return {
    rule,
    ...found,
    n,
    abstentions,
    ...wilson(found.k, n),
    definition: DEFINITIONS[rule],
    cautions: n < 8 ? ['Fewer than 8 ratings: show counts, not verdicts.'] : [],
  };
}

type Finding = Pick<ConsensusAnswer, 'reached' | 'direction' | 'k'>;

function byRand(ratings: number[], percentiles: PercentileRule | null | undefined): Finding {
  const { band, disagreement } = panel({ ratings, percentiles: percentiles ?? null });
  const direction = { appropriate: 'for', inappropriate: 'against', uncertain: 'unsettled' } as const;
  return {
    reached: !disagreement && band !== 'uncertain',
    direction: direction[band],
    k: countInBand(ratings, band),
  };
}

function byShares(ratings: number[], rule: 'three-quarters' | 'seventy-fifteen'): Finding {
  const { low, high } = countRegions(ratings);
  const n = ratings.length;
  const k = Math.max(low, high);
  const opposed = Math.min(low, high);
  const reached =
    rule === 'three-quarters' ? k * 4 >= n * 3 : k * 10 >= n * 7 && opposed * 100 < n * 15;
  if (low === high) return { reached, direction: 'unsettled', k };
  return { reached, direction: high > low ? 'for' : 'against', k };
}
