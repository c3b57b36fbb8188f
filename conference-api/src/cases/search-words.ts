/** Words that InnoDB's full-text index leaves out; asking for one would find nothing. Source: MariaDB's manual, 'Full-Text Index Stopwords'. */
const STOPWORDS = new Set(
  'a about an are as at be by com de en for from how i in is it la of on or that the this to was what when where who will with und www'.split(' '),
);
const SHORTEST_WORD = 3;
const MOST_WORDS = 12;

/**
 * A search as people type it, as an expression of MariaDB's boolean mode: every word must be there, at least as
 * the beginning of one. Signs that mean something in that mode are separators here, so nothing needs escaping.
 * Null where no word is left that the index knows.
 */
export function searchExpression(typed: string): string | null {
  const words = typed
    .normalize('NFC')
    .toLowerCase()
    .split(/[^\p{L}\p{M}\p{N}_]+/u)
    .filter((word) => [...word].length >= SHORTEST_WORD && !STOPWORDS.has(word));
  const distinct = [...new Set(words)].slice(0, MOST_WORDS);
  return distinct.length ? distinct.map((word) => `+${word}*`).join(' ') : null;
}
