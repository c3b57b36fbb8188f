import type { Discipline } from './people.js';

export const CONSENSUS_RULES = ['rand', 'percent-75', '70-15'] as const;
export type ConsensusRule = (typeof CONSENSUS_RULES)[number];
export const CONSENSUS_RULE_WORDS: Record<ConsensusRule, string> = {
  rand: 'Median 7 to 9 without disagreement (RAND/UCLA)',
  'percent-75': 'At least 75 % rate 7 to 9',
  '70-15': 'At least 70 % rate 7 to 9 and fewer than 15 % rate 1 to 3',
};

/** Who sees which member gave which rating. */
export const NAMES_SHOWN = ['nobody', 'chair', 'all-after-round'] as const;
export type NamesShown = (typeof NAMES_SHOWN)[number];
export const NAMES_SHOWN_WORDS: Record<NamesShown, string> = {
  nobody: 'Nobody',
  chair: 'The chair only',
  'all-after-round': 'All members, once the round is closed',
};

export interface QuorumRule {
  /** Fewest members present who may rate. */
  raters: number;
  /** Fewest of a discipline; `infectionOnly` asks it for infected cases alone. */
  disciplines: { discipline: Discipline; atLeast: number; infectionOnly?: boolean }[];
}
