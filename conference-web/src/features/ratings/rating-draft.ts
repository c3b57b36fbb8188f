import type { Schemas } from '@/lib/api/types';
import type { Round } from './api/get-rounds';

/** A rating as it is being given. */
export interface RatingDraft {
  values: Record<string, number>;
  preferredOptionId: string;
  reason: string;
}

/** Begins with the rating that stands, where it is being changed. */
export const draftOf = (mine: Round['mine']): RatingDraft => ({
  values: Object.fromEntries((mine?.ratings ?? []).map(({ optionId, value }) => [optionId, value])),
  preferredOptionId: mine?.preferredOptionId ?? '',
  reason: mine?.reason ?? '',
});

/** Options that still have no rating. */
export const unrated = (options: Round['options'], draft: RatingDraft): string[] =>
  options.filter(({ id }) => draft.values[id] === undefined).map(({ id }) => id);

export const toBody = (options: Round['options'], draft: RatingDraft): Schemas['GiveRatingDto'] => ({
  ratings: options.map(({ id }) => ({ optionId: id, value: draft.values[id]! })),
  preferredOptionId: options.some(({ id }) => id === draft.preferredOptionId) ? draft.preferredOptionId : null,
  reason: draft.reason.trim(),
});
