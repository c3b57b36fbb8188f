import type { OptionFigures } from '../calc/vocabulary/decisions.js';
import type { CaseOption } from '../calc/vocabulary/case-content.js';
import type { Ballot } from './entities/ballot.entity.js';

/** The middle of sorted numbers; null of none. */
export function median(sorted: number[]): number | null {
  if (!sorted.length) return null;
  const middle = Math.floor(sorted.length / 2);
  return sorted.length % 2 ? sorted[middle]! : (sorted[middle - 1]! + sorted[middle]!) / 2;
}

/** What the panel gave to each option; ballots that were superseded must have been left out. */
export function panelFigures(options: CaseOption[], ballots: Ballot[]): OptionFigures[] {
  return options.map((option) => {
    const values = ballots
      .flatMap((ballot) => ballot.ratings.filter((rating) => rating.optionId === option.id).map((rating) => rating.value))
      .sort((a, b) => a - b);
    return {
      optionId: option.id,
      title: option.title,
      n: values.length,
      median: median(values),
      low: values[0] ?? null,
      high: values.at(-1) ?? null,
      values,
      preferredBy: ballots.filter((ballot) => ballot.preferredOptionId === option.id).length,
    };
  });
}
