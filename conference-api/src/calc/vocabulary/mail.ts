/**
 * queued → sending → handing-over → sent.
 * `uncertain`: the process ended between handing over and noting it; a person decides.
 */
export const OUTBOX_STATES = ['queued', 'sending', 'handing-over', 'sent', 'failed', 'uncertain', 'dropped'] as const;
export type OutboxState = (typeof OUTBOX_STATES)[number];
export const OUTBOX_STATE_WORDS: Record<OutboxState, string> = {
  queued: 'Waiting',
  sending: 'Being sent',
  'handing-over': 'Being handed over',
  sent: 'Sent',
  failed: 'Refused for good',
  uncertain: 'Perhaps sent',
  dropped: 'Dropped',
};
