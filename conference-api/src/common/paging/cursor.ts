import { invalid } from '../problems/problem.js';

/** One page of a list. */
export interface Page<T> {
  items: T[];
  /** Give it back as `cursor` for the next page; null at the end. */
  nextCursor: string | null;
}

export const encodeCursor = (parts: (string | number | null)[]): string => Buffer.from(JSON.stringify(parts)).toString('base64url');

/** The parts of a cursor that this server gave out; 422 for anything else. */
export function decodeCursor(cursor: string, length: number): (string | number | null)[] {
  try {
    const parts: unknown = JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8'));
    if (Array.isArray(parts) && parts.length === length && parts.every((part) => part === null || ['string', 'number'].includes(typeof part)))
      return parts;
  } catch {
    // falls through to the refusal
  }
  throw invalid('cursor', 'cursor', 'cursor must be one that this list gave: leave it out to start again.');
}

/** Cuts a list that was asked for with one row more than the page holds. */
export function pageOf<T>(rows: T[], limit: number, cursorOf: (row: T) => (string | number | null)[]): Page<T> {
  const items = rows.slice(0, limit);
  const last = items.at(-1);
  return { items, nextCursor: rows.length > limit && last ? encodeCursor(cursorOf(last)) : null };
}
