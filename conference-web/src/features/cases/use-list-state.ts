import { useCallback, useMemo } from 'react';
import { useSearchParams } from 'react-router-dom';
import type { CaseListFilter } from './api/list-cases';
import { type CaseSort, firstOrder, readListState, writeListState } from './list-state';

/** The list's filter, kept in the address; going back undoes a filter. */
export function useListState() {
  const [address, setAddress] = useSearchParams();
  const filter = useMemo(() => readListState(address), [address]);
  const change = useCallback(
    (changes: Partial<CaseListFilter>, options?: { replace?: boolean }) =>
      // at once, or the box that was ticked would first jump back
      setAddress((now) => writeListState({ ...readListState(now), ...changes }), { flushSync: true, ...options }),
    [setAddress],
  );
  const sortBy = useCallback(
    (sort: string) => {
      const by = sort as CaseSort;
      const isSame = filter.sort === by;
      change({ sort: by, order: isSame ? (filter.order === 'asc' ? 'desc' : 'asc') : firstOrder(by) });
    },
    [change, filter.sort, filter.order],
  );
  const clear = useCallback(() => setAddress(new URLSearchParams()), [setAddress]);
  return { filter, change, sortBy, clear };
}
