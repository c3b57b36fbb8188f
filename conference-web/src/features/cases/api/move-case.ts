import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import { keys } from '@/lib/query-keys';

/** All that a change of stage makes old. */
function useStageChanged(id: string) {
  const client = useQueryClient();
  return () =>
    Promise.all([keys.cases.all(id), keys.cases.lists, keys.meetings.everything].map((queryKey) => client.invalidateQueries({ queryKey })));
}

const of = (id: string) => ({ path: { id } });

/**
 * draft → being checked. `leave` is called before the case is fetched anew: the form goes from the page as soon as it
 * can no longer be edited, and what hangs on it would never be called.
 */
export function usePostCase(id: string, leave: () => void) {
  const stageChanged = useStageChanged(id);
  return useMutation({
    mutationFn: (baseVersion: number) => call(api.POST('/api/cases/{id}/post', { params: of(id), body: { baseVersion } })),
    onSuccess: () => {
      leave();
      return stageChanged();
    },
  });
}

/** being checked → open */
export function useReleaseCase(id: string) {
  const onSuccess = useStageChanged(id);
  return useMutation({
    mutationFn: (baseVersion: number) => call(api.POST('/api/cases/{id}/release', { params: of(id), body: { baseVersion } })),
    onSuccess,
  });
}

/** being checked → draft, with what to mend. The case is then out of the coordinator's sight. */
export function useReturnCase(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (remark: string) => call(api.POST('/api/cases/{id}/return', { params: of(id), body: { remark } })),
    onSuccess: () => client.invalidateQueries({ queryKey: keys.cases.lists }),
  });
}

export function useWithdrawCase(id: string) {
  const onSuccess = useStageChanged(id);
  return useMutation({
    mutationFn: (reason: string) => call(api.POST('/api/cases/{id}/withdraw', { params: of(id), body: { reason } })),
    onSuccess,
  });
}
