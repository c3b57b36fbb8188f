import type { FindingKind, FindingStrength, Mark } from './finding.js';

// Patterns of the detectors have bounded quantifiers only, so that no text makes one run away.

/** The strength of a match, or null when it is none. */
export type Judge = (match: RegExpMatchArray, text: string) => FindingStrength | null;

/** A mark for each match of a global pattern that the judge lets pass. */
export function markMatches(
  text: string,
  kind: FindingKind,
  pattern: RegExp,
  judge: FindingStrength | Judge,
): Mark[] {
  const marks: Mark[] = [];
  for (const match of text.matchAll(pattern)) {
    const strength = typeof judge === 'string' ? judge : judge(match, text);
    const start = match.index;
    if (strength !== null) marks.push({ kind, start, end: start + match[0].length, strength });
  }
  return marks;
}

/**
 * A mark for each value that follows a label directly: `label` is global, `value` sticky.
 * Two patterns, because a label may be in any case and the value often may not.
 */
export function markAfter(
  text: string,
  kind: FindingKind,
  { label, value }: { label: RegExp; value: RegExp },
  judge: FindingStrength | Judge,
): Mark[] {
  const marks: Mark[] = [];
  for (const found of text.matchAll(label)) {
    value.lastIndex = found.index + found[0].length;
    const match = value.exec(text);
    if (match === null) continue;
    const strength = typeof judge === 'string' ? judge : judge(match, text);
    if (strength === null) continue;
    marks.push({ kind, start: match.index, end: match.index + match[0].length, strength });
  }
  return marks;
}

/** Whether one of the words stands in the `reach` characters before `index`. */
export const isPrecededBy = (text: string, index: number, words: RegExp, reach = 40): boolean =>
  words.test(text.slice(Math.max(0, index - reach), index));

/** The marks without punctuation at their end, which belongs to the sentence. */
export const trimmed = (text: string, marks: Mark[]): Mark[] =>
  marks.map((mark) => {
    const tail = /[ .,;:!?(/-]{0,40}$/.exec(text.slice(mark.start, mark.end))?.[0] ?? '';
    return { ...mark, end: mark.end - tail.length };
  });

/** The digits of a text. */
export const digitsIn = (text: string): string => text.replace(/\D/g, '');

/** One digit over and over, as in a placeholder. */
export const isOneDigitRepeated = (digits: string): boolean => /^(\d)\1*$/.test(digits);
