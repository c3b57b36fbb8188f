import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import type { Schemas } from '@/lib/api/types';
import { keys } from '@/lib/query-keys';

export function useEditRemark(caseId: string, remarkId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: Schemas['UpdateRemarkDto']) => call(api.PATCH('/api/remarks/{id}', { params: { path: { id: remarkId } }, body })),
    // also after a refusal: an edit made on an older text needs the newer one beside it
    onSettled: () =>
      Promise.all([
        client.invalidateQueries({ queryKey: keys.cases.threads(caseId) }),
        client.invalidateQueries({ queryKey: keys.remarkVersions(remarkId) }),
      ]),
  });
}
