/** Months by name and short name, without accents, in the languages notes are likely to hold. */
const MONTH_NAMES: readonly (readonly string[])[] = [
  ['january', 'jan', 'janvier', 'janv', 'januar', 'jaenner', 'enero', 'gennaio', 'januari', 'janeiro'],
  ['february', 'feb', 'fevrier', 'fevr', 'februar', 'febrero', 'febbraio', 'februari', 'fevereiro'],
  ['march', 'mar', 'mars', 'marz', 'maerz', 'marzo', 'maart', 'marco'],
  ['april', 'apr', 'avril', 'avr', 'abril', 'aprile'],
  ['may', 'mai', 'mayo', 'maggio', 'mei', 'maio', 'maj'],
  ['june', 'jun', 'juin', 'juni', 'junio', 'giugno', 'junho'],
  ['july', 'jul', 'juillet', 'juil', 'juli', 'julio', 'luglio', 'julho'],
  ['august', 'aug', 'aout', 'agosto', 'augustus', 'augusti'],
  ['september', 'sept', 'sep', 'septembre', 'septiembre', 'settembre', 'setembro'],
  ['october', 'oct', 'octobre', 'oktober', 'okt', 'octubre', 'ottobre', 'outubro'],
  ['november', 'nov', 'novembre', 'noviembre', 'novembro'],
  ['december', 'dec', 'decembre', 'dezember', 'dez', 'diciembre', 'dicembre', 'dezembro'],
];

const MONTH_OF_NAME = new Map(
  MONTH_NAMES.flatMap((names, i) => names.map((name) => [name, i + 1] as const)),
);

/** Words that are also something else when not capitalised. */
const AMBIGUOUS = new Set(['may', 'march', 'mar', 'mai', 'mars', 'dec', 'sept', 'jan', 'maj', 'mei']);

/** The month (1 to 12) that a word names, or null. */
export function monthOfWord(word: string): number | null {
  const plain = word.normalize('NFD').replace(/[\u0300-\u036f.]/g, '').toLowerCase();
  return MONTH_OF_NAME.get(plain) ?? null;
}

/** Whether the word could be a verb or an abbreviation rather than the month. */
export function isAmbiguousMonth(word: string): boolean {
  const plain = word.replace('.', '');
  return AMBIGUOUS.has(plain.toLowerCase()) && plain === plain.toLowerCase();
}

const DAYS_IN_MONTH = [31, 29, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31] as const;

/** Whether the day exists in the month; 29 February always does, since the year may be unsure. */
export function isDayOfMonth(day: number, month: number): boolean {
  return Number.isInteger(day) && day >= 1 && day <= (DAYS_IN_MONTH[month - 1] ?? 0);
}

/** Years that a clinical text can mean. */
export const isLikelyYear = (year: number): boolean => year >= 1890 && year <= 2099;

/** Day and month in either order; which is which is not decided. */
export const isDayAndMonth = (a: number, b: number): boolean => isDayOfMonth(a, b) || isDayOfMonth(b, a);
