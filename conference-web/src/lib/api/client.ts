import createClient from 'openapi-fetch';
import { authorisedFetch } from './authorised-fetch';
import { readProblem } from './problem';
import type { paths } from './schema.gen';

/** Every route of the API with its types: `call(api.GET('/api/cases/{id}', { params: { path: { id } } }))`. */
export const api = createClient<paths>({
  baseUrl: location.origin,
  fetch: authorisedFetch,
  credentials: 'same-origin',
  // lists go as `stage=open,listed`
  querySerializer: { array: { style: 'form', explode: false } },
});

// A refusal must be read from the response itself, so openapi-fetch is told nothing about it.
api.use({
  async onResponse({ response }) {
    if (!response.ok) throw await readProblem(response);
  },
});

/** The answer's body, or an ApiProblem thrown. */
export async function call<T>(request: Promise<{ data?: T }>): Promise<T> {
  const { data } = await request;
  return data as T;
}
