import { CalcInputError } from '../common/calc-input-error.js';
import type { FieldSpec } from '../common/field-spec.js';
import {
  requireArray,
  requireNumber,
  requireObject,
  requireOnlyKnown,
  requireString,
} from '../common/input-checks.js';
import { countDecimals, scaleNumbers, unscale } from './decimals.js';
import { solveKnapsack, type KnapsackItem } from './knapsack.js';

export interface AgendaItem {
  id: string;
  /** Minutes asked, 0 or more. */
  minutes: number;
  /** Worth of having it on the agenda, 0 or more. */
  priority: number;
  mustHave?: boolean | null;
}

export interface AgendaFillInput {
  /** Minutes of the meeting, 0 or more. */
  minutes: number;
  /** Minutes added for each item on the agenda; default 0. */
  changeoverMinutes?: number | null;
  items: AgendaItem[];
}

export interface AgendaFillAnswer {
  /** Ids in the given order. */
  chosen: string[];
  /** Minutes of the chosen items with their change-over. */
  usedMinutes: number;
  /** Sum of the chosen items' priorities. */
  priority: number;
  definition: string;
  cautions: string[];
}

export const AGENDA_FILL_FIELDS: readonly FieldSpec[] = [
  { name: 'minutes', type: 'number' },
  { name: 'changeoverMinutes', type: 'number' },
  { name: 'items', type: 'array' },
];

const MOST_ITEMS = 1000;
const LARGEST_NUMBER = 1e9;
const MOST_DECIMALS = 6;

const DEFINITION =
  'Exact 0/1 knapsack: must-haves first, then the most priority that fits; ties go to fewer minutes ' +
  'used, then to earlier-given items. The change-over counts once for every chosen item.';

interface Problem {
  items: { id: string; mustHave: boolean; packed: KnapsackItem }[];
  capacity: number;
  minuteDecimals: number;
  priorityDecimals: number;
}

/**
 * Which items fill a meeting best. Minutes and priorities may have decimals and are
 * added exactly. Must-haves are chosen first and their minutes taken off; when they do
 * not all fit, the best filling of must-haves alone is chosen, and a caution says so.
 *
 * Source: the 0/1 knapsack problem (Martello S, Toth P. Knapsack Problems, 1990).
 *
 * @throws CalcInputError for numbers below 0 or above 1e9, more than six decimals, a repeated
 * id, more than 1000 items, sums too large to be exact (`too-large`), or items that no search
 * settles in time (`too-hard`).
 */
export function agendaFill(input: AgendaFillInput): AgendaFillAnswer {
  const { items, capacity, minuteDecimals, priorityDecimals } = readProblem(input);
  const chosen = new Set<number>();
  let used = 0;
  const choose = (indices: readonly number[], room: number) => {
    const best = solveKnapsack(indices.map((index) => packedAt(items, index)), room);
    if (best === null) {
      throw new CalcInputError(
        'items',
        'too-hard',
        'These minutes and priorities need too long a search: use whole minutes or fewer items.',
      );
    }
    for (const position of best.chosen) chosen.add(indices[position] as number);
    used += best.size;
  };

  const indices = items.map((_, index) => index);
  const must = indices.filter((index) => items[index]?.mustHave);
  const mustSize = must.reduce((sum, index) => sum + packedAt(items, index).size, 0);
  const mustFit = mustSize <= capacity;
  if (mustFit) {
    for (const index of must) chosen.add(index);
    used = mustSize;
    choose(indices.filter((index) => !chosen.has(index)), capacity - used);
  } else {
    choose(must, capacity);
  }

  const order = indices.filter((index) => chosen.has(index));
  const worth = order.reduce((sum, index) => sum + packedAt(items, index).worth, 0);
  return {
    chosen: order.map((index) => items[index]?.id as string),
    usedMinutes: unscale(used, minuteDecimals),
    priority: unscale(worth, priorityDecimals),
    definition: DEFINITION,
    cautions: mustFit ? cautionsOf(items, capacity) : [mustHavesDoNotFit(items, chosen, must)],
  };
}

function readProblem(input: AgendaFillInput): Problem {
  const minutes = requireAmount(input.minutes, 'minutes');
  const changeover = requireAmount(input.changeoverMinutes ?? 0, 'changeoverMinutes');
  const items = requireArray(input.items, 'items', MOST_ITEMS).map(readItem);
  refuseRepeatedIds(items.map(({ id }) => id));
  const time = scaleNumbers([minutes, changeover, ...items.map((item) => item.minutes)]);
  const worth = scaleNumbers(items.map((item) => item.priority));
  const [capacity = 0, extra = 0, ...sizes] = time.units;
  refuseInexact(time.units.reduce((sum, units) => sum + units, extra * items.length), 'minutes');
  refuseInexact(worth.units.reduce((sum, units) => sum + units, 0), 'priority');
  return {
    items: items.map(({ id, mustHave }, i) => ({
      id,
      mustHave,
      packed: { size: (sizes[i] as number) + extra, worth: worth.units[i] as number },
    })),
    capacity,
    minuteDecimals: time.decimals,
    priorityDecimals: worth.decimals,
  };
}

function readItem(value: unknown, i: number) {
  const path = `items[${i}]`;
  const item = requireObject(value, path);
  requireOnlyKnown(item, path, ['id', 'minutes', 'priority', 'mustHave']);
  const mustHave = item.mustHave ?? false;
  if (typeof mustHave !== 'boolean') {
    throw new CalcInputError(`${path}.mustHave`, 'type', `${path}.mustHave must be true or false.`);
  }
  return {
    id: requireString(item.id, `${path}.id`),
    minutes: requireAmount(item.minutes, `${path}.minutes`),
    priority: requireAmount(item.priority, `${path}.priority`),
    mustHave,
  };
}

function requireAmount(value: unknown, field: string): number {
  const amount = requireNumber(value, field, 0, LARGEST_NUMBER);
  if (countDecimals(amount) > MOST_DECIMALS) {
    throw new CalcInputError(field, 'too-precise', `${field} may have ${MOST_DECIMALS} decimals at most.`);
  }
  return amount;
}

/** Sums beyond 2^53 would be rounded, and a rounded optimum is no optimum. */
function refuseInexact(sum: number, name: string): void {
  if (sum > Number.MAX_SAFE_INTEGER) {
    throw new CalcInputError('items', 'too-large', `The ${name} of all items add up to too many digits.`);
  }
}

function refuseRepeatedIds(ids: readonly string[]): void {
  const seen = new Set<string>();
  for (const [i, id] of ids.entries()) {
    if (seen.has(id)) {
      throw new CalcInputError(`items[${i}].id`, 'duplicate', `items[${i}].id is given twice.`);
    }
    seen.add(id);
  }
}

function packedAt(items: Problem['items'], index: number): KnapsackItem {
  return (items[index] as Problem['items'][number]).packed;
}

function cautionsOf(items: Problem['items'], capacity: number): string[] {
  const tooLong = items.filter(({ packed }) => packed.size > capacity).map(({ id }) => id);
  if (tooLong.length === 0) return [];
  return [`Longer than the whole meeting, so never placed: ${tooLong.join(', ')}.`];
}

function mustHavesDoNotFit(items: Problem['items'], chosen: Set<number>, must: number[]): string {
  const left = must.filter((index) => !chosen.has(index)).map((index) => items[index]?.id);
  return (
    'The must-haves alone need more than the meeting’s minutes: the best filling of must-haves is ' +
    `chosen and nothing else. Left out: ${left.join(', ')}.`
  );
}
