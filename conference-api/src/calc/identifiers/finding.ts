/** What a finding may be; of two equally strong ones on the same spot the earlier kind is kept. */
export const FINDING_KINDS = [
  'date-of-birth',
  'age-over-89',
  'date',
  'email',
  'url',
  'ip-address',
  'nhs-number',
  'health-number',
  'national-id',
  'card-number',
  'device-serial',
  'phone',
  'postcode',
  'address',
  'name',
  'place',
  'record-number',
] as const;
export type FindingKind = (typeof FINDING_KINDS)[number];

/** From weak to strong. */
export const FINDING_STRENGTHS = ['possible', 'likely', 'certain'] as const;
export type FindingStrength = (typeof FINDING_STRENGTHS)[number];

/** A place in the text, in UTF-16 code units: `text.slice(start, end)` of the input is `text`. */
export interface Finding {
  kind: FindingKind;
  start: number;
  end: number;
  text: string;
  strength: FindingStrength;
}

/** A finding before the text is cut out. */
export interface Mark {
  readonly kind: FindingKind;
  readonly start: number;
  readonly end: number;
  readonly strength: FindingStrength;
}

/** Looks for one family of identifiers in a text prepared by `plainText`. */
export type Detector = (text: string) => Mark[];

export const strengthRank = (strength: FindingStrength): number => FINDING_STRENGTHS.indexOf(strength);
