/** A part of a file as it lies there: a segment, a chunk, the bytes after the end. */
export interface FilePart {
  /** 'APP1 (EXIF)', 'tEXt', … */
  name: string;
  at: number;
  end: number;
  /** What a clean file holds in its place: the part as it is, nothing, or other bytes. */
  clean: 'keep' | 'drop' | Uint8Array;
}

/** The bytes of a clean file, out of its parts. */
export function joinParts(bytes: Uint8Array, parts: readonly FilePart[]): Uint8Array {
  const clean = parts.flatMap((part) => (part.clean === 'drop' ? [] : [part.clean === 'keep' ? bytes.subarray(part.at, part.end) : part.clean]));
  const whole = new Uint8Array(clean.reduce((sum, piece) => sum + piece.length, 0));
  let to = 0;
  for (const piece of clean) {
    whole.set(piece, to);
    to += piece.length;
  }
  return whole;
}

export const isClean = (parts: readonly FilePart[]): boolean => parts.every(({ clean }) => clean === 'keep');
