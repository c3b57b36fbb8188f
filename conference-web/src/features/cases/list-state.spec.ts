import { JOINTS, STAGES, URGENCIES } from '@kerfside/calc/vocabulary/case.js';
import fc from 'fast-check';
import { countFilters, readListState, SORTS, writeListState } from './list-state';

const flag = fc.constantFrom(true as const, undefined);
const filters = fc.record(
  {
    conferenceId: fc.uuid(),
    stage: fc.uniqueArray(fc.constantFrom(...STAGES), { minLength: 1 }),
    joint: fc.constantFrom(...JOINTS),
    urgency: fc.constantFrom(...URGENCIES),
    mine: flag,
    awaitingMyRating: flag,
    query: fc.string({ minLength: 1, maxLength: 60 }).filter((text) => text.trim() === text && text !== ''),
  },
  { requiredKeys: [] },
);
const sorting = fc.record({ sort: fc.constantFrom(...SORTS), order: fc.constantFrom('asc' as const, 'desc' as const) });

it('comes back from the address as it went in', () => {
  fc.assert(
    fc.property(filters, sorting, (filter, sort) => {
      const state = { ...filter, ...sort };
      const known = Object.fromEntries(Object.entries(state).filter(([, value]) => value !== undefined));
      expect(readListState(new URLSearchParams(writeListState(state).toString()))).toEqual(known);
    }),
  );
});

it('keeps the address empty for the plain list', () => {
  expect(writeListState(readListState(new URLSearchParams())).toString()).toBe('');
});

it('writes addresses that a person can read', () => {
  const address = writeListState({ stage: ['open', 'listed'], awaitingMyRating: true, query: 'loose shell', sort: 'urgency', order: 'desc' });
  expect(decodeURIComponent(address.toString())).toBe('query=loose+shell&stage=open,listed&awaiting=true&sort=urgency');
});

it('leaves out what an address can not mean', () => {
  const state = readListState(new URLSearchParams('stage=open,nonsense,open&joint=elbow&urgency=&mine=1&conference=x&sort=title&order=up&query=%20'));
  expect(state).toEqual({ stage: ['open'], sort: 'updated', order: 'desc' });
});

it('counts what narrows the list, not how it is sorted or searched', () => {
  expect(countFilters({ sort: 'code', order: 'asc', query: 'x' })).toBe(0);
  expect(countFilters({ stage: ['open'], mine: true })).toBe(2);
});
