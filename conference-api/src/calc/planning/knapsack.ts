/** One thing to pack; size and worth are whole, non-negative, and add up to safe integers. */
export interface KnapsackItem {
  size: number;
  worth: number;
}

export interface KnapsackOptimum {
  /** Indices of the chosen items, ascending. */
  chosen: number[];
  size: number;
  worth: number;
}

/** Ways to pack the items looked at so far, ascending in size and in worth. */
interface Front {
  sizes: number[];
  worths: number[];
  /** Where each way's choices begin in the trail; 0 for nothing chosen. */
  trails: number[];
}

/** Choices as linked lists: an item, and the entry that lists the later ones. */
interface Trail {
  item: number[];
  next: number[];
}

interface Prepared {
  items: readonly KnapsackItem[];
  capacity: number;
  /** Indices of the items that fit at all, densest first. */
  dense: readonly number[];
}

const MOST_STATES = 1_500_000;

/**
 * The exact optimum of the 0/1 knapsack: most worth; then least size; then the
 * earlier items (at the first index where two answers differ, the one that has
 * that item). Null when the search would need more than 1.5 million states.
 *
 * Works on the Pareto front of size and worth, from the last item to the first so
 * that ties fall to earlier items, and drops ways that cannot reach a worth known
 * to be reachable (Nemhauser GL, Ullmann Z. Manage Sci 1969;15:494, with the bound
 * of Dantzig GB. Oper Res 1957;5:266).
 */
export function solveKnapsack(items: readonly KnapsackItem[], capacity: number): KnapsackOptimum | null {
  const fitting = items.map((_, index) => index).filter((index) => sizeOf(items, index) <= capacity);
  const dense = [...fitting].sort((a, b) => byDensity(items[a] as KnapsackItem, items[b] as KnapsackItem));
  const prepared: Prepared = { items, capacity, dense };
  const reachable = greedyWorth(prepared);
  const trail: Trail = { item: [-1], next: [0] };
  let front: Front = { sizes: [0], worths: [0], trails: [0] };
  let states = 0;
  for (const index of fitting.reverse()) {
    front = dropHopeless(merge(prepared, index, front, trail), prepared, index, reachable);
    states += front.sizes.length;
    if (states > MOST_STATES) return null;
  }
  const last = front.sizes.length - 1;
  return {
    chosen: follow(trail, front.trails[last] as number),
    size: front.sizes[last] as number,
    worth: front.worths[last] as number,
  };
}

/** The front with and without one more item; of ways alike in both, the one with the item. */
function merge({ items, capacity }: Prepared, index: number, front: Front, trail: Trail): Front {
  const { size, worth } = items[index] as KnapsackItem;
  const merged: Front = { sizes: [], worths: [], trails: [] };
  let best = -1;
  let without = 0;
  const keepSmaller = (withSize: number, withWorth: number) => {
    for (; without < front.sizes.length; without += 1) {
      const ownSize = front.sizes[without] as number;
      const ownWorth = front.worths[without] as number;
      if (ownSize > withSize || (ownSize === withSize && ownWorth <= withWorth)) return;
      if (ownWorth > best) best = push(merged, ownSize, ownWorth, front.trails[without] as number);
    }
  };
  for (let at = 0; at < front.sizes.length; at += 1) {
    const withSize = (front.sizes[at] as number) + size;
    if (withSize > capacity) break;
    const withWorth = (front.worths[at] as number) + worth;
    keepSmaller(withSize, withWorth);
    if (withWorth > best) {
      trail.item.push(index);
      trail.next.push(front.trails[at] as number);
      best = push(merged, withSize, withWorth, trail.item.length - 1);
    }
  }
  keepSmaller(Infinity, Infinity);
  return merged;
}

function push(front: Front, size: number, worth: number, trail: number): number {
  front.sizes.push(size);
  front.worths.push(worth);
  front.trails.push(trail);
  return worth;
}

/**
 * Drops the ways that could not reach `reachable` even if the items before `index`
 * were divisible. Those that could just reach it stay, since ties are still open.
 */
function dropHopeless(front: Front, { items, capacity, dense }: Prepared, index: number, reachable: number): Front {
  const earlier = dense.filter((other) => other < index).map((other) => items[other] as KnapsackItem);
  const kept: Front = { sizes: [], worths: [], trails: [] };
  // Room shrinks along the front, so the first item that no longer fits moves back only.
  let filled = earlier.length;
  let fillSize = earlier.reduce((sum, item) => sum + item.size, 0);
  let fillWorth = earlier.reduce((sum, item) => sum + item.worth, 0);
  for (let at = 0; at < front.sizes.length; at += 1) {
    const room = capacity - (front.sizes[at] as number);
    while (fillSize > room) {
      filled -= 1;
      fillSize -= (earlier[filled] as KnapsackItem).size;
      fillWorth -= (earlier[filled] as KnapsackItem).worth;
    }
    const part = earlier[filled];
    const rest = part === undefined ? 0 : ((room - fillSize) * part.worth) / part.size;
    const worth = front.worths[at] as number;
    // The slack covers rounding in the division.
    if ((worth + fillWorth + rest) * (1 + 1e-12) >= reachable) {
      push(kept, front.sizes[at] as number, worth, front.trails[at] as number);
    }
  }
  return kept;
}

/** A worth that is surely reachable, to drop hopeless ways early. */
function greedyWorth({ items, capacity, dense }: Prepared): number {
  let room = capacity;
  let worth = 0;
  for (const index of dense) {
    const item = items[index] as KnapsackItem;
    if (item.size > room) continue;
    room -= item.size;
    worth += item.worth;
  }
  return worth;
}

/** Most worth per size first (things without size before all), then smaller first. */
function byDensity(a: KnapsackItem, b: KnapsackItem): number {
  const density = ({ size, worth }: KnapsackItem) => (size === 0 ? Infinity : worth / size);
  if (density(a) !== density(b)) return density(b) > density(a) ? 1 : -1;
  return a.size - b.size;
}

function follow(trail: Trail, start: number): number[] {
  const indices: number[] = [];
  for (let at = start; at > 0; at = trail.next[at] as number) indices.push(trail.item[at] as number);
  return indices;
}

function sizeOf(items: readonly KnapsackItem[], index: number): number {
  return (items[index] as KnapsackItem).size;
}
