import type { CaseContent } from '@kerfside/calc/vocabulary/case-content.js';
import { api, call } from '@/lib/api/client';
import type { Schemas } from '@/lib/api/types';

/** Saves the sections that changed. Not a mutation hook: the draft sends these one at a time by itself. */
export const saveCase = (id: string, baseVersion: number, changes: Partial<CaseContent>): Promise<Schemas['SavedCaseDto']> =>
  call(api.PATCH('/api/cases/{id}', { params: { path: { id } }, body: { baseVersion, changes: changes as Schemas['CaseChangesDto'] } }));
