/** The most bytes of a file that is cleaned; cleaning holds about four times as much. */
export const MOST_BYTES = 256 * 1024 * 1024;
/** The most pixels of one picture. */
export const MOST_PIXELS = 60_000_000;
/** The most pictures in one file; the largest CT series known to us has some 2000. */
export const MOST_FRAMES = 4096;
/** The most attributes of one file, nested ones too: enough for MOST_FRAMES with their own positions. */
export const MOST_ELEMENTS = 500_000;
/** Sequences in sequences; the deepest in common use is 6. */
export const DEEPEST = 16;
/** The most parts (segments, chunks) of a photograph. */
export const MOST_PARTS = 100_000;
/** The most text of a removed value that is shown. */
export const LONGEST_SHOWN = 80;
/** The longest look-up table or palette: 65 536 entries of two bytes. */
export const LONGEST_TABLE = 131_072;
/** The most that a deflated file may unpack to: the largest picture of 16 bits. */
export const MOST_INFLATED = 128 * 1024 * 1024;
