/** The rule's own measure: nine places, evenly, in a drawing 320 wide. */
export const WIDTH = 320;
const EDGE = 18;
const STEP = (WIDTH - 2 * EDGE) / 8;
const STACK = 9.5;
const TALLEST = 76;
export const DOT = 4;

export const BANDS = [
  { word: 'inappropriate', from: 1, to: 3 },
  { word: 'uncertain', from: 4, to: 6 },
  { word: 'appropriate', from: 7, to: 9 },
] as const;

export const SCALE = [1, 2, 3, 4, 5, 6, 7, 8, 9] as const;

/** Where a rating from 1 to 9 stands, halves between. */
export const placeOf = (rating: number): number => EDGE + (rating - 1) * STEP;

/** In which of the three bands a single rating lies. */
export const bandOf = (rating: number): (typeof BANDS)[number] => BANDS.find(({ to }) => rating <= to) ?? BANDS[2];

/** How often each of 1 to 9 was given. */
export const countEach = (values: readonly number[]): number[] => SCALE.map((rating) => values.filter((value) => value === rating).length);

export interface Dot {
  rating: number;
  x: number;
  /** Above the lane's ground. */
  up: number;
}

/** The dots of one round, equal ratings stacked; a tall stack is pressed together so that no lane outgrows the page. */
export function placeDots(values: readonly number[]): { dots: Dot[]; height: number } {
  const counts = countEach(values);
  const tallest = Math.max(1, ...counts);
  const step = Math.min(STACK, TALLEST / tallest);
  const dots = counts.flatMap((count, index) =>
    Array.from({ length: count }, (_, place) => ({ rating: index + 1, x: placeOf(index + 1), up: place * step })),
  );
  return { dots, height: (tallest - 1) * step + 2 * DOT };
}

const LANE_GAP = 14;
export const GROUND = 6;
const TOP = 4;

/** The lanes of the rounds from the top down, and where the ruler stands below them. */
export function placeLanes<T extends { values: readonly number[] }>(rounds: readonly T[]) {
  const lanes: { round: T; dots: Dot[]; top: number; ground: number }[] = [];
  for (const round of rounds) {
    const top = (lanes.at(-1)?.ground ?? TOP - LANE_GAP) + LANE_GAP;
    const { dots, height } = placeDots(round.values);
    lanes.push({ round, dots, top, ground: top + height + GROUND });
  }
  return { lanes, ruler: (lanes.at(-1)?.ground ?? 0) + LANE_GAP };
}
