import { Problem } from '../problems/problem.js';

const DEEPEST = 100;
const LIMIT = '1mb';

const [QUOTE, BACKSLASH, OPEN_BRACE, CLOSE_BRACE, OPEN_BRACKET, CLOSE_BRACKET] = [...'"\\{}[]'].map((sign) => sign.charCodeAt(0));

/** How deep a JSON text nests, counted over its bytes; strings are skipped. */
export function nestingOf(json: Uint8Array): number {
  let depth = 0;
  let deepest = 0;
  let quoted = false;
  for (let index = 0; index < json.length; index++) {
    const byte = json[index];
    if (quoted) {
      if (byte === BACKSLASH) index++;
      else if (byte === QUOTE) quoted = false;
    } else if (byte === QUOTE) quoted = true;
    else if (byte === OPEN_BRACE || byte === OPEN_BRACKET) deepest = Math.max(deepest, ++depth);
    else if (byte === CLOSE_BRACE || byte === CLOSE_BRACKET) depth--;
  }
  return deepest;
}

/**
 * How bodies are read. Whatever walks a body walks it by recursion, so its depth has a bound; and half of a
 * surrogate pair, which JSON can spell but UTF-8 and the database can not, becomes the replacement character.
 */
export const jsonBody = {
  limit: LIMIT,
  verify: (_request: unknown, _response: unknown, body: Buffer): void => {
    if (nestingOf(body) > DEEPEST) throw new Problem('bad-request', `The body is nested more than ${DEEPEST} deep.`);
  },
  reviver: (_key: string, value: unknown): unknown => (typeof value === 'string' ? value.replace(/\p{Surrogate}/gu, '\ufffd') : value),
};
