/** A canvas's transform: x' = a·x + c·y + e, y' = b·x + d·y + f. */
export type Turn = readonly [a: number, b: number, c: number, d: number, e: number, f: number];

/**
 * The transform that shows a picture upright, and the size of what it shows.
 * @param orientation 1 to 8; anything else counts as 1, upright.
 * @param width Stored pixels across. @param height Stored pixels down.
 * Source: EXIF 2.32, 4.6.4 A (tag 0112); TIFF 6.0 section 8.
 */
export function uprightTurn(orientation: number, width: number, height: number): { turn: Turn; width: number; height: number } {
  const turns: Record<number, Turn> = {
    2: [-1, 0, 0, 1, width, 0],
    3: [-1, 0, 0, -1, width, height],
    4: [1, 0, 0, -1, 0, height],
    5: [0, 1, 1, 0, 0, 0],
    6: [0, 1, -1, 0, height, 0],
    7: [0, -1, -1, 0, height, width],
    8: [0, -1, 1, 0, 0, width],
  };
  const isLying = orientation >= 5 && orientation <= 8;
  return { turn: turns[orientation] ?? [1, 0, 0, 1, 0, 0], width: isLying ? height : width, height: isLying ? width : height };
}
