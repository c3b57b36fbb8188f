import { queryOptions } from '@tanstack/react-query';
import { api, call } from '@/lib/api/client';
import type { Schemas } from '@/lib/api/types';
import { keys } from '@/lib/query-keys';

export type CaseImage = Schemas['ImageDto'];

const HALF_HOUR_MS = 30 * 60_000;

/** The images of a case, in their order. Their addresses end after an hour or two, so they are asked for anew in time. */
export const imagesQuery = (caseId: string) =>
  queryOptions({
    queryKey: keys.cases.images(caseId),
    queryFn: ({ signal }) => call(api.GET('/api/cases/{caseId}/images', { params: { path: { caseId } }, signal })),
    refetchInterval: HALF_HOUR_MS,
  });
