import type { MixedList } from 'typeorm';

// Written by `npm run migrations:generate`: every migration, in the order they run.
export const MIGRATIONS: MixedList<Function> = [];
