import { invalid } from '../common/problems/problem.js';
import { COMMON_PASSWORDS } from './common-passwords.js';

/** Whose password it is to be. */
export interface PasswordContext {
  email: string;
  name: string;
}

// NIST SP 800-63B-4, 3.1.1.2: at least 15 characters where the password is the only factor,
// at least 64 accepted, each code point counted as one, nothing asked of its composition
const FEWEST = 15;
const MOST = 256;

/** Fewer characters than this beside a known word, or repeated over and over, add nothing. */
const FEWEST_OWN = 6;
const PRODUCT_WORDS = ['kerfside', 'conference', 'password'];

const fold = (text: string) =>
  text
    .normalize('NFKC')
    .toLowerCase()
    .replace(/[\s\p{P}\p{S}]/gu, '');

const BLOCKED = new Set(COMMON_PASSWORDS.map(fold));

/** Throws 422 for `field` where the password is too short, too long, or among the first that would be guessed. */
export function requireGoodPassword(field: string, password: string, context: PasswordContext): void {
  const length = [...password.normalize('NFKC')].length;
  if (length < FEWEST)
    throw invalid(field, 'too-short', `Use at least ${FEWEST} characters; several words with spaces between them do well. This has ${length}.`);
  if (length > MOST) throw invalid(field, 'too-long', `Use at most ${MOST} characters. This has ${length}.`);
  const folded = fold(password);
  if (BLOCKED.has(folded) || BLOCKED.has(shortestPeriod(folded)))
    throw invalid(field, 'common', 'This password is one of the first that would be tried. Choose another one.');
  if (isRunOrRepeat(folded) || isRunOrRepeat(password.normalize('NFKC').toLowerCase()))
    throw invalid(field, 'repeated', 'This password is a short piece repeated, or a run of the alphabet or keyboard. Choose another one.');
  if (ownPart(folded, context).length < FEWEST_OWN)
    throw invalid(field, 'personal', 'This password is made of your name, your e-mail address or the name of this service. Choose another one.');
}

/** 'abcabcabc' → 'abc'; a text that repeats nothing is its own period. */
function shortestPeriod(text: string): string {
  const period = (text + text).indexOf(text, 1);
  return period > 0 ? text.slice(0, period) : text;
}

const RUNS = ['abcdefghijklmnopqrstuvwxyz', '1234567890', 'qwertyuiopasdfghjklzxcvbnm', 'qwertzuiopasdfghjklyxcvbnm', 'azertyuiopqsdfghjklmwxcvbn'];
const BOTH_WAYS = RUNS.flatMap((run) => [run.repeat(3), [...run].reverse().join('').repeat(3)]);

function isRunOrRepeat(text: string): boolean {
  // what is punctuation alone folds to nothing
  if (text === '') return false;
  const period = [...shortestPeriod(text)].length;
  return (period < FEWEST_OWN && period < [...text].length) || BOTH_WAYS.some((run) => run.includes(text));
}

/** What is left once everything is taken out that others know of the person and the service. */
function ownPart(folded: string, { email, name }: PasswordContext): string {
  if (folded === '') return '?'.repeat(FEWEST_OWN);
  const words = [email, ...email.split(/[@.+_-]/), name, ...name.split(/\s+/)]
    .map(fold)
    .filter((word) => word.length >= 3)
    .concat(PRODUCT_WORDS)
    .sort((a, b) => b.length - a.length);
  return words.reduce((rest, word) => rest.replaceAll(word, ''), folded);
}
