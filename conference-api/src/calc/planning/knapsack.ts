/** One thing to pack: whole, non-negative size and worth. */
export interface KnapsackItem {
  size: bigint;
  worth: bigint;
}

export interface KnapsackOptimum {
  /** Indices of the chosen items, ascending. */
  chosen: number[];
  size: bigint;
  worth: bigint;
}

/** One way to pack the items looked at so far; items form a linked list. */
interface State {
  size: bigint;
  worth: bigint;
  index: number;
  rest: State | null;
}

const EMPTY: State = { size: 0n, worth: 0n, index: -1, rest: null };
const MOST_STATES = 1_000_000;

/**
 * The exact optimum of the 0/1 knapsack: most worth; then least size; then the
 * earlier items (at the first index where two answers differ, the one that has
 * that item). Null when the search would need more than a million states.
 *
 * Works on the Pareto front of (size, worth), from the last item to the first so
 * that ties fall to earlier items, and drops states that cannot reach the best
 * answer known (Nemhauser GL, Ullmann Z. Manage Sci 1969;15:494, with the bound of
 * Dantzig GB. Oper Res 1957;5:266).
 */
export function solveKnapsack(items: readonly KnapsackItem[], capacity: bigint): KnapsackOptimum | null {
  const fitting = items.map((item) => item.size <= capacity);
  const atLeast = greedyWorth(items.filter((_, i) => fitting[i]), capacity);
  let front: State[] = [EMPTY];
  let states = 0;
  for (let index = items.length - 1; index >= 0; index -= 1) {
    if (!fitting[index]) continue;
    const earlier = items.slice(0, index).filter((_, i) => fitting[i]);
    const bound = upperBound(earlier, capacity);
    const widened = mergeWith(items[index] as KnapsackItem, index, front, capacity);
    front = widened.filter((state) => bound(state) >= Number(atLeast) * (1 - 1e-9));
    states += widened.length;
    if (states > MOST_STATES) return null;
  }
  const best = front.at(-1) as State;
  return { chosen: indicesOf(best), size: best.size, worth: best.worth };
}

/** The front with and without one more item, both ascending in size and in worth. */
function mergeWith(item: KnapsackItem, index: number, front: readonly State[], capacity: bigint): State[] {
  const merged: State[] = [];
  const keep = (state: State) => {
    const last = merged.at(-1);
    if (last === undefined || state.worth > last.worth) merged.push(state);
  };
  let next = 0;
  for (const state of front) {
    const size = state.size + item.size;
    if (size > capacity) break;
    const worth = state.worth + item.worth;
    while (next < front.length && comesFirst(front[next] as State, size, worth)) {
      keep(front[next] as State);
      next += 1;
    }
    keep({ size, worth, index, rest: state });
  }
  for (; next < front.length; next += 1) keep(front[next] as State);
  return merged;
}

/** Smaller first; at one size the worthier; alike in both, the state with the new item. */
function comesFirst(state: State, size: bigint, worth: bigint): boolean {
  return state.size < size || (state.size === size && state.worth > worth);
}

/** Most worth a state could reach with the items not yet looked at, were they divisible. */
function upperBound(items: readonly KnapsackItem[], capacity: bigint): (state: State) => number {
  const sizes = [0];
  const worths = [0];
  for (const item of byDensity(items)) {
    sizes.push((sizes.at(-1) as number) + Number(item.size));
    worths.push((worths.at(-1) as number) + Number(item.worth));
  }
  return (state) => {
    const room = Number(capacity - state.size);
    let low = 0;
    let high = sizes.length - 1;
    while (low < high) {
      const middle = Math.ceil((low + high) / 2);
      if ((sizes[middle] as number) <= room) low = middle;
      else high = middle - 1;
    }
    const full = Number(state.worth) + (worths[low] as number);
    if (low === sizes.length - 1) return full;
    const share = (room - (sizes[low] as number)) / ((sizes[low + 1] as number) - (sizes[low] as number));
    return full + share * ((worths[low + 1] as number) - (worths[low] as number));
  };
}

/** A worth that is surely reachable, to drop hopeless states early. */
function greedyWorth(items: readonly KnapsackItem[], capacity: bigint): bigint {
  let room = capacity;
  let worth = 0n;
  for (const item of byDensity(items)) {
    if (item.size > room) continue;
    room -= item.size;
    worth += item.worth;
  }
  return worth;
}

function byDensity(items: readonly KnapsackItem[]): KnapsackItem[] {
  return [...items].sort((a, b) => {
    const difference = b.worth * a.size - a.worth * b.size;
    if (difference !== 0n) return difference > 0n ? 1 : -1;
    return a.size < b.size ? -1 : Number(a.size > b.size);
  });
}

function indicesOf(state: State): number[] {
  const indices: number[] = [];
  for (let at: State | null = state; at !== null && at.index >= 0; at = at.rest) indices.push(at.index);
  return indices;
}
