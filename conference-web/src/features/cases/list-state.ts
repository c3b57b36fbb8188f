import { JOINTS, STAGES, URGENCIES } from '@kerfside/calc/vocabulary/case.js';
import type { CaseListFilter } from './api/list-cases';

export const SORTS = ['updated', 'released', 'urgency', 'code'] as const;
export type CaseSort = (typeof SORTS)[number];
export type Order = 'asc' | 'desc';

/** What the list is asked for unless the address says otherwise. */
export const DEFAULT_SORT: CaseSort = 'updated';

/** The order in which a column is first wanted: newest, most urgent, but codes from the first. */
export const firstOrder = (sort: CaseSort): Order => (sort === 'code' ? 'asc' : 'desc');

const oneOf = <T extends string>(allowed: readonly T[], value: string | null): T | undefined => allowed.find((name) => name === value);

/** The list's filter as the address has it. What an address can't mean is left out, so an old bookmark still opens. */
export function readListState(address: URLSearchParams): CaseListFilter {
  const stage = (address.get('stage') ?? '').split(',').flatMap((name) => oneOf(STAGES, name) ?? []);
  const query = address.get('query')?.trim().slice(0, 200);
  const sort = oneOf(SORTS, address.get('sort')) ?? DEFAULT_SORT;
  const filter: CaseListFilter = { sort, order: oneOf(['asc', 'desc'] as const, address.get('order')) ?? firstOrder(sort) };
  const conferenceId = address.get('conference');
  if (conferenceId && /^[0-9a-f-]{36}$/i.test(conferenceId)) filter.conferenceId = conferenceId;
  if (stage.length > 0) filter.stage = [...new Set(stage)];
  const joint = oneOf(JOINTS, address.get('joint'));
  if (joint) filter.joint = joint;
  const urgency = oneOf(URGENCIES, address.get('urgency'));
  if (urgency) filter.urgency = urgency;
  if (address.get('mine') === 'true') filter.mine = true;
  if (address.get('awaiting') === 'true') filter.awaitingMyRating = true;
  if (query) filter.query = query;
  return filter;
}

/** The shortest address for a filter: defaults are left out. */
export function writeListState(filter: CaseListFilter): URLSearchParams {
  const address = new URLSearchParams();
  const set = (name: string, value: string | undefined) => value && address.set(name, value);
  set('query', filter.query?.trim());
  set('conference', filter.conferenceId);
  set('stage', filter.stage?.join(','));
  set('joint', filter.joint);
  set('urgency', filter.urgency);
  set('awaiting', filter.awaitingMyRating ? 'true' : undefined);
  set('mine', filter.mine ? 'true' : undefined);
  const sort = filter.sort ?? DEFAULT_SORT;
  if (sort !== DEFAULT_SORT) address.set('sort', sort);
  if (filter.order && filter.order !== firstOrder(sort)) address.set('order', filter.order);
  return address;
}

/** How many filters narrow the list; search and sorting are not among them. */
export const countFilters = ({ conferenceId, stage, joint, urgency, mine, awaitingMyRating }: CaseListFilter): number =>
  [conferenceId, stage, joint, urgency, mine, awaitingMyRating].filter(Boolean).length;
