/** What a finding may be. */
export const FINDING_KINDS = [
  'date-of-birth',
  'age-over-89',
  'date',
  'name',
  'nhs-number',
  'health-number',
  'national-id',
  'card-number',
  'record-number',
  'device-serial',
  'email',
  'url',
  'ip-address',
  'phone',
  'postcode',
  'address',
  'place',
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

/** The mark of a regular expression's match, or of its named group `value` where it has one. */
export function markOf(match: RegExpMatchArray, kind: FindingKind, strength: FindingStrength): Mark {
  const whole = match[0];
  const value = match.groups?.value ?? whole;
  // The value stands last in every pattern here that has one, except for trailing context.
  const start = (match.index ?? 0) + whole.lastIndexOf(value);
  return { kind, start, end: start + value.length, strength };
}
