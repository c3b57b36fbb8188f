export const LIVE_EVENT_KINDS = [
  'case-changed',
  'images-changed',
  'remarks-changed',
  'rating-changed',
  'meeting-changed',
  'decision-changed',
  'membership-changed',
] as const;
export type LiveEventKind = (typeof LIVE_EVENT_KINDS)[number];
