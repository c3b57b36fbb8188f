import canonicalize from 'canonicalize';
import { createHash } from 'node:crypto';

/** SHA-256, as hexadecimal, of the canonical form of a JSON value (RFC 8785). */
export function canonicalHash(value: unknown): string {
  const text = (canonicalize as unknown as (input: unknown) => string | undefined)(value);
  if (text === undefined) throw new TypeError('Only JSON values have a canonical form');
  return createHash('sha256').update(text, 'utf8').digest('hex');
}
