import { CleaningClient } from './cleaning-client.js';

/** The client that pages use; it starts its worker with the first file. */
export const createCleaningClient = (): CleaningClient =>
  new CleaningClient(() => new Worker(new URL('./cleaning-worker.ts', import.meta.url), { type: 'module' }));
