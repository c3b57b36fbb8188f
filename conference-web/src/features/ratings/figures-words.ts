import { panel } from '@kerfside/calc/panel/panel.js';
import type { OptionFigures, Round } from './api/get-rounds';

/** The figures of an option in every round that may be seen. */
export const figuresOf = (rounds: readonly Round[], optionId: string): (OptionFigures & { number: number })[] =>
  rounds.flatMap((round) => {
    const figures = round.figures?.find((other) => other.optionId === optionId);
    return figures ? [{ ...figures, number: round.number }] : [];
  });

type Figures = Pick<OptionFigures, 'n' | 'median' | 'low' | 'high' | 'values'>;

/** Below this a panel gets counts, no verdict (RAND/UCLA panels have 8 members or more). */
export const SMALLEST_PANEL = 8;

/** `3 inappropriate, 1 uncertain, 4 appropriate`. */
export function countWords(values: readonly number[]): string {
  const low = values.filter((value) => value <= 3).length;
  const high = values.filter((value) => value >= 7).length;
  return `${low} inappropriate, ${values.length - low - high} uncertain, ${high} appropriate`;
}

/** What the panel makes of an option: the verdict of a full panel, the counts of a small one. */
export function verdictWords({ n, values }: Figures): string {
  if (n === 0) return 'No ratings';
  if (n < SMALLEST_PANEL) return countWords(values);
  const { verdict, disagreement } = panel({ ratings: [...values] });
  const word = verdict[0]!.toUpperCase() + verdict.slice(1);
  return `${word}${disagreement ? ', with disagreement' : ''}: ${countWords(values)}`;
}

/** `n = 9, median 7, range 4 to 9`; lines break only between them. */
export function figureWords({ n, median, low, high }: Figures): string {
  const words = n === 0 ? ['n = 0'] : [`n = ${n}`, `median ${median}`, `range ${low} to ${high}`];
  return words.map((word) => word.replaceAll(' ', '\u00a0')).join(', ');
}
