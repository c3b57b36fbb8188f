import type { FindingKind } from '@kerfside/calc/identifiers/finding.js';

const WORDS: Record<FindingKind, string> = {
  'date-of-birth': 'date of birth',
  'age-over-89': 'age over 89',
  date: 'date',
  email: 'e-mail address',
  url: 'web address',
  'ip-address': 'network address',
  'nhs-number': 'national health number',
  'health-number': 'health number',
  'national-id': 'national identity number',
  'card-number': 'card number',
  'device-serial': 'serial number of a device',
  phone: 'telephone number',
  postcode: 'postcode',
  address: 'address',
  name: 'name',
  place: 'place',
  'record-number': 'record number',
};
const DATED: FindingKind[] = ['date', 'date-of-birth'];

export const identifierWords = (kind: string): string => WORDS[kind as FindingKind] ?? 'identifier';

/** What to do about it. */
export const identifierRemedy = (kind: string): string =>
  DATED.includes(kind as FindingKind) ? 'Write an interval instead, such as ‘9 years ago’.' : kind === 'age-over-89' ? 'Write 90 and over.' : 'Take it out.';

export const strengthWords = { certain: 'is certainly', likely: 'is likely', possible: 'may be' } as const;
