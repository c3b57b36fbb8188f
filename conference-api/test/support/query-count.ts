import type { Logger } from 'typeorm';
import type { TestApp } from './test-app.js';

/** The statements that the application sends to the database while `work` runs. */
export async function queriesOf<T>(test: TestApp, work: () => Promise<T>): Promise<{ result: T; queries: string[] }> {
  const queries: string[] = [];
  const nothing = () => undefined;
  const counting: Logger = {
    logQuery: (query) => {
      queries.push(query);
    },
    logQueryError: nothing,
    logQuerySlow: nothing,
    logSchemaBuild: nothing,
    logMigration: nothing,
    log: nothing,
  };
  const before = test.dataSource.logger;
  test.dataSource.logger = counting;
  try {
    return { result: await work(), queries };
  } finally {
    test.dataSource.logger = before;
  }
}
