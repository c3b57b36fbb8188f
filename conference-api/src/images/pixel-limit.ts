/** The most pixels of a picture that is taken. */
export const MOST_PIXELS = 60_000_000;
