import { type QueryClient, useMutation, useQueryClient } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import type { Schemas } from '@/lib/api/types';
import { keys } from '@/lib/query-keys';

/** All that shows a case's images. */
export const imagesChanged = (client: QueryClient, caseId: string) =>
  Promise.all([keys.cases.images(caseId), keys.cases.one(caseId), keys.cases.readiness(caseId)].map((queryKey) => client.invalidateQueries({ queryKey })));

export function useUpdateImage(caseId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ id, ...body }: Schemas['UpdateImageDto'] & { id: string }) => call(api.PATCH('/api/images/{id}', { params: { path: { id } }, body })),
    onSettled: () => imagesChanged(client, caseId),
  });
}

/** Puts the images in a new order: each that stands elsewhere now is told its place. */
export function useOrderImages(caseId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: async (ordered: readonly Schemas['ImageDto'][]) => {
      for (const [position, image] of ordered.entries())
        if (image.position !== position) await call(api.PATCH('/api/images/{id}', { params: { path: { id: image.id } }, body: { position } }));
    },
    onMutate: (ordered) => {
      client.setQueryData(keys.cases.images(caseId), { items: ordered });
    },
    onSettled: () => imagesChanged(client, caseId),
  });
}

export function useRemoveImage(caseId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (id: string) => call(api.DELETE('/api/images/{id}', { params: { path: { id } } })),
    onSuccess: () => imagesChanged(client, caseId),
  });
}
