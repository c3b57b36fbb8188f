export const FINAL_DECISION_KINDS = ['as-agreed', 'with-variation', 'not-proceeding'] as const;
export type FinalDecisionKind = (typeof FINAL_DECISION_KINDS)[number];
export const FINAL_DECISION_WORDS: Record<FinalDecisionKind, string> = {
  'as-agreed': 'As agreed',
  'with-variation': 'With variation',
  'not-proceeding': 'Not proceeding',
};

export interface Dissent {
  personId: string;
  /** In the dissenter's own words. */
  words: string;
}

/** What the chair writes. */
export interface DecisionContent {
  chosenOptionId: string | null;
  text: string;
  conditions: string;
  timing: string;
  dissent: Dissent[];
}

export interface OptionFigures {
  optionId: string;
  title: string;
  n: number;
  median: number | null;
  low: number | null;
  high: number | null;
  values: number[];
  preferredBy: number;
}

/** All that is signed, in one canonical form. Names as they were that day. */
export interface DecisionRecord {
  format: 'kerfside-decision-1';
  conference: string;
  caseCode: string;
  caseVersion: number;
  number: number;
  version: number;
  replaces: number | null;
  amendmentReason: string | null;
  question: string;
  options: { id: string; title: string; description: string }[];
  content: { chosenOption: string | null; text: string; conditions: string; timing: string; dissent: { name: string; words: string }[] };
  rounds: { number: number; figures: OptionFigures[] }[];
  attendance: { name: string; discipline: string; unit: string; state: string }[];
  quorum: { met: boolean; missing: string[] };
  kind: 'decision' | 'advice';
  signedBy: string;
  signedAt: string;
  previousHash: string | null;
}
