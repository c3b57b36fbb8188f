/** Roots of the standard itself: kinds of objects and encodings, which tell nothing of anybody. */
const STANDARD = '1.2.840.10008.';

/**
 * New UIDs for old ones, the same for the same within one upload. They are drawn at random, so nobody who
 * knows an old one can find the new.
 * Form: '2.25.' and a version 4 UUID as one decimal number (PS3.5 B.2), at most 44 characters.
 */
export class UidMap {
  private readonly pairs: Map<string, string>;
  private readonly made: Set<string>;

  /**
   * @param known Pairs of an earlier file of the same upload.
   * @param random Sixteen random bytes at each call.
   */
  constructor(
    known: Iterable<readonly [string, string]>,
    private readonly random: () => Uint8Array,
  ) {
    this.pairs = new Map(known);
    this.made = new Set(this.pairs.values());
  }

  /** The UID that stands for `old`; one of this map stays, and so does one of the standard. */
  replace(old: string): string {
    if (old.startsWith(STANDARD) || this.made.has(old)) return old;
    const known = this.pairs.get(old);
    if (known) return known;
    const made = this.fresh();
    this.pairs.set(old, made);
    return made;
  }

  /** A UID that stands for none. */
  fresh(): string {
    const bytes = this.random();
    // RFC 9562 5.4: version 4, variant 10
    bytes[6] = (bytes[6]! & 0x0f) | 0x40;
    bytes[8] = (bytes[8]! & 0x3f) | 0x80;
    const made = `2.25.${bytes.reduce((sum, byte) => sum * 256n + BigInt(byte), 0n)}`;
    this.made.add(made);
    return made;
  }

  entries(): [string, string][] {
    return [...this.pairs];
  }
}

/** '2.25.' and a number that fits a UUID, without a leading zero. */
export function isMappedUid(uid: string): boolean {
  const digits = /^2\.25\.([1-9]\d{0,38})$/.exec(uid)?.[1];
  return digits !== undefined && BigInt(digits) < 2n ** 128n;
}
