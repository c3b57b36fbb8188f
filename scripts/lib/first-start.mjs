import { existsSync, mkdirSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';

const MARK = 'first-start-unfinished';
const MADE_BY_IT = ['mariadb', 'objects', 'mail', 'demo-images'];

/**
 * The first start makes the database, runs all migrations and writes the demo. Interrupted in the middle
 * it would leave half a demo for good, so it begins anew: nobody can have worked on that database, since
 * the mark is set only where there was none and is gone before the API first runs.
 */
export function createFirstStart(dataDir) {
  const mark = join(dataDir, MARK);
  return {
    /** Answers whether an unfinished one was cleared away. Call it before any service runs. */
    begin() {
      const unfinished = existsSync(mark);
      if (unfinished) for (const name of MADE_BY_IT) rmSync(join(dataDir, name), { recursive: true, force: true });
      if (!existsSync(join(dataDir, 'mariadb'))) {
        mkdirSync(dataDir, { recursive: true, mode: 0o700 });
        writeFileSync(mark, '');
      }
      return unfinished;
    },
    get isUnderWay() {
      return existsSync(mark);
    },
    finish() {
      rmSync(mark, { force: true });
    },
  };
}
