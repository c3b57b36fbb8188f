/** A value as it is read: text in its parts, or numbers. */
export type DicomValues = readonly string[] | readonly number[];

/**
 * Gives back what of a value may stay, or null where nothing may. Only numbers and words of a known list
 * pass, so that no name, date or free text can hide in an attribute that is kept.
 */
export type ValueRule = (values: DicomValues) => DicomValues | null;

const DECIMAL = /^[+-]?(\d+\.?\d*|\.\d+)([eE][+-]?\d{1,3})?$/;
const INTEGER = /^[+-]?\d{1,6}$/;
const LONGEST_DECIMAL = 16;

const text = (values: DicomValues) => values.map(String);
const counted = (values: DicomValues, least: number, most: number) => values.length >= least && values.length <= most;

/** Decimal strings (DS), `least` to `most` of them. */
export const decimals =
  (least: number, most = least): ValueRule =>
  (values) =>
    counted(values, least, most) && text(values).every((value) => value.length <= LONGEST_DECIMAL && DECIMAL.test(value)) ? values : null;

/** Integer strings (IS) of at most six digits: no record number fits that is not a count as well. */
export const integers =
  (least: number, most = least): ValueRule =>
  (values) =>
    counted(values, least, most) && text(values).every((value) => INTEGER.test(value)) ? values : null;

/** Binary numbers; the reader gives nothing else for their representations. */
export const numbers =
  (least: number, most = least): ValueRule =>
  (values) =>
    counted(values, least, most) && values.every((value) => typeof value === 'number' && Number.isFinite(value)) ? values : null;

/** One word of a list. */
export const oneOf = (...words: string[]): ValueRule => {
  const known = new Set(words);
  return (values) => (values.length === 1 && known.has(String(values[0])) ? values : null);
};

/** One of some numbers. */
export const oneNumberOf = (...some: number[]): ValueRule => {
  const known = new Set(some);
  return (values) => (values.length === 1 && known.has(Number(values[0])) ? values : null);
};

/** Words of a list, others left out. */
export const someOf = (...words: string[]): ValueRule => {
  const known = new Set(words);
  return (values) => {
    const kept = text(values).filter((word) => known.has(word));
    return kept.length > 0 ? kept : null;
  };
};

/** Text of a given form. */
export const matching =
  (form: RegExp, least: number, most = least): ValueRule =>
  (values) =>
    counted(values, least, most) && text(values).every((value) => form.test(value)) ? values : null;

/** Image Type (PS3.3 C.7.6.1.1.2): the first two have two values each, the others come from a list. */
export const imageType =
  (...words: string[]): ValueRule =>
  (values) => {
    const [pixels, patient, ...more] = text(values);
    if (pixels === undefined) return null;
    const known = new Set(words);
    return [
      pixels === 'ORIGINAL' ? 'ORIGINAL' : 'DERIVED',
      patient === 'PRIMARY' ? 'PRIMARY' : 'SECONDARY',
      ...more.filter((word) => known.has(word)),
    ];
  };

/** Binary data of the picture itself. */
export const picture: ValueRule = (values) => values;
