// Characters that look like a plain one but would hide an identifier from a pattern. Each is
// replaced by exactly one code unit, so that offsets stay those of the text as written.
const LOOKALIKES: readonly (readonly [RegExp, string])[] = [
  [/[\u00a0\u1680\u2000-\u200a\u202f\u205f\u3000\t]/g, ' '],
  [/[\u2010-\u2015\u2212\ufe63\uff0d]/g, '-'],
  [/[\u2018\u2019\u02bc\uff07]/g, "'"],
  [/[\uff0f\u2044\u2215]/g, '/'],
  [/\uff20/g, '@'],
  [/[\uff0e\u2024]/g, '.'],
  [/\uff1a/g, ':'],
];

// First code points of decimal digits in other scripts, all in the basic plane.
const OTHER_ZEROS = [0x0660, 0x06f0, 0x0966, 0xff10] as const;

/** The text with plain spaces, hyphens, quotes and digits, of the same length in code units. */
export function plainText(text: string): string {
  let plain = text.replace(/[\u0660-\u0669\u06f0-\u06f9\u0966-\u096f\uff10-\uff19]/g, plainDigit);
  for (const [pattern, character] of LOOKALIKES) plain = plain.replace(pattern, character);
  return plain;
}

function plainDigit(digit: string): string {
  const code = digit.charCodeAt(0);
  const zero = OTHER_ZEROS.find((first) => code >= first && code < first + 10) ?? code;
  return String(code - zero);
}
