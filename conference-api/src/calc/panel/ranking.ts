import { CalcInputError } from '../common/calc-input-error.js';
import type { FieldSpec } from '../common/field-spec.js';
import {
  requireArray,
  requireInteger,
  requireObject,
  requireOnlyKnown,
  requireString,
} from '../common/input-checks.js';

export interface Ballot {
  /** How many members handed in this ballot. */
  count: number;
  /** Best first; options tied with one another share a group. */
  order: string[][];
}

export interface RankingInput {
  ballots: Ballot[];
}

/** `table[a][b]`: a figure for a over b. */
export type PairTable = Record<string, Record<string, number>>;

export interface RankingAnswer {
  condorcetWinner: string | null;
  /** Best first; tied options share a group, in alphabetical order. */
  ranking: string[][];
  /** How many prefer a to b. */
  pairwise: PairTable;
  /** Strength of the strongest path from a to b; 0 where there is none. */
  strongestPaths: PairTable;
  definition: string;
  cautions: string[];
}

export const RANKING_FIELDS: readonly FieldSpec[] = [{ name: 'ballots', type: 'array' }];

const MOST_OPTIONS = 100;
const MOST_VOTES = 1_000_000;

/** The strict preferences of one pair of options, by index. */
type Matrix = number[][];

/**
 * Order of options by Schulze's method with winning votes. Options are those named
 * on any ballot; one that a ballot leaves out counts as tied last there; ties count
 * for neither; ballots that name nobody are ignored.
 *
 * Source: Schulze M. Soc Choice Welf 2011;36:267–303.
 *
 * @throws CalcInputError for a count that is not a whole number 0–1000000, an option
 * named twice on a ballot, or more than 100 options.
 */
export function ranking(input: RankingInput): RankingAnswer {
  const ballots = requireArray(input.ballots, 'ballots', 10_000).map(readBallot);
  const options = [...new Set(ballots.flatMap(({ order }) => order.flat()))].sort();
  if (options.length > MOST_OPTIONS) {
    throw new CalcInputError('ballots', 'too-many', `At most ${MOST_OPTIONS} options can be ranked.`);
  }
  const pairwise = countPreferences(options, ballots);
  const paths = strongestPaths(pairwise);
  const groups = rankByPaths(paths);
  const winner = pairwise.findIndex((row, a) => row.every((votes, b) => a === b || votes > get(pairwise, b, a)));
  return {
    condorcetWinner: options[winner] ?? null,
    ranking: groups.map((group) => group.map((index) => options[index] as string)),
    pairwise: toTable(options, pairwise),
    strongestPaths: toTable(options, paths),
    definition:
      'Schulze method, winning votes (Schulze M. Soc Choice Welf 2011;36:267); options left off a ' +
      'ballot are tied last on it, ties count for neither.',
    cautions: cautionsOf(options, pairwise, paths, groups, winner),
  };
}

function readBallot(value: unknown, i: number): Ballot {
  const path = `ballots[${i}]`;
  const ballot = requireObject(value, path);
  requireOnlyKnown(ballot, path, ['count', 'order']);
  const count = requireInteger(ballot.count, `${path}.count`, 0, MOST_VOTES);
  const order = requireArray(ballot.order, `${path}.order`, 1000).map((group, g) =>
    requireArray(group, `${path}.order[${g}]`, 1000).map((option, o) =>
      requireString(option, `${path}.order[${g}][${o}]`),
    ),
  );
  const named = order.flat();
  if (new Set(named).size !== named.length) {
    throw new CalcInputError(`${path}.order`, 'duplicate', 'An option may stand on a ballot once only.');
  }
  return { count, order };
}

function countPreferences(options: readonly string[], ballots: readonly Ballot[]): Matrix {
  const votes = options.map(() => options.map(() => 0));
  for (const { count, order } of ballots) {
    const place = new Map(order.flatMap((group, g) => group.map((option) => [option, g] as const)));
    const places = options.map((option) => place.get(option) ?? Infinity);
    for (const [a, placeA] of places.entries()) {
      for (const [b, placeB] of places.entries()) {
        if (placeA < placeB) (votes[a] as number[])[b] = get(votes, a, b) + count;
      }
    }
  }
  return votes;
}

/** Widest paths over winning edges only (Floyd–Warshall). */
function strongestPaths(votes: Matrix): Matrix {
  const paths = votes.map((row, a) => row.map((count, b) => (count > get(votes, b, a) ? count : 0)));
  for (let via = 0; via < paths.length; via += 1) {
    for (let a = 0; a < paths.length; a += 1) {
      for (let b = 0; b < paths.length; b += 1) {
        if (a === b || a === via || b === via) continue;
        const detour = Math.min(get(paths, a, via), get(paths, via, b));
        if (detour > get(paths, a, b)) (paths[a] as number[])[b] = detour;
      }
    }
  }
  return paths;
}

/** Takes away, again and again, everything that nothing left over beats. */
function rankByPaths(paths: Matrix): number[][] {
  const groups: number[][] = [];
  let left = paths.map((_, index) => index);
  while (left.length > 0) {
    const from = left;
    const group = from.filter((a) => from.every((b) => get(paths, b, a) <= get(paths, a, b)));
    groups.push(group);
    left = from.filter((index) => !group.includes(index));
  }
  return groups;
}

function cautionsOf(
  options: readonly string[],
  pairwise: Matrix,
  paths: Matrix,
  groups: readonly number[][],
  winner: number,
): string[] {
  if (options.length === 0) return ['No ballot names an option: there is nothing to rank.'];
  const cautions: string[] = [];
  if (winner < 0) {
    const names = smithSet(pairwise).map((index) => options[index] as string);
    cautions.push(`No option beats every other. The smallest set that beats all the rest: ${names.join(', ')}.`);
  }
  if (groups.some((group) => group.length > 1)) {
    cautions.push('Some options are tied: the chair’s rule is needed to order them.');
  }
  const level = new Map(groups.flatMap((group, g) => group.map((index) => [index, g] as const)));
  const unsettled = paths.some((row, a) =>
    row.some((strength, b) => level.get(a) !== level.get(b) && strength === get(paths, b, a)),
  );
  if (unsettled) cautions.push('Two options in different places are not ordered directly by the method.');
  return cautions;
}

/** The smallest group whose members each beat everyone outside it. */
function smithSet(votes: Matrix): number[] {
  const wins = votes.map((row, a) => row.filter((count, b) => count > get(votes, b, a)).length);
  const order = votes.map((_, index) => index).sort((a, b) => (wins[b] as number) - (wins[a] as number));
  for (let size = 1; size < order.length; size += 1) {
    const inside = order.slice(0, size);
    const outside = order.slice(size);
    if (inside.every((a) => outside.every((b) => get(votes, a, b) > get(votes, b, a)))) {
      return inside.sort((a, b) => a - b);
    }
  }
  return order.sort((a, b) => a - b);
}

/** Own properties throughout, so an option may bear any name. */
function toTable(options: readonly string[], matrix: Matrix): PairTable {
  return Object.fromEntries(
    options.map((a, i) => [
      a,
      Object.fromEntries(options.flatMap((b, j) => (i === j ? [] : [[b, get(matrix, i, j)] as const]))),
    ]),
  );
}

function get(matrix: Matrix, row: number, column: number): number {
  return (matrix[row] as number[])[column] as number;
}
