import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import { keys } from '@/lib/query-keys';

export function useRemoveRemark(caseId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (id: string) => call(api.DELETE('/api/remarks/{id}', { params: { path: { id } } })),
    onSuccess: () => client.invalidateQueries({ queryKey: keys.cases.threads(caseId) }),
  });
}
