import type { components } from './schema.gen';

/** The API's own types by name: `Schemas['CaseDto']`. */
export type Schemas = components['schemas'];
