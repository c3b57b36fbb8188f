import { DataSource } from 'typeorm';
import { dataSourceOptions } from '../src/database/data-source.js';
import { makeDatabase } from './support/test-app.js';

describe('migrations', () => {
  it('make every table on an empty database, and leave nothing to generate', async () => {
    const database = await makeDatabase();
    const dataSource = await new DataSource(dataSourceOptions(database.url)).initialize();
    try {
      const done = await dataSource.runMigrations({ transaction: 'none' });
      expect(done.length).toBeGreaterThan(0);
      const { upQueries } = await dataSource.driver.createSchemaBuilder().log();
      expect(upQueries.map(({ query }) => query)).toEqual([]);
    } finally {
      await dataSource.destroy();
      await database.drop();
    }
  });

  it('can be taken back one by one to an empty database', async () => {
    const database = await makeDatabase();
    const dataSource = await new DataSource(dataSourceOptions(database.url)).initialize();
    try {
      const done = await dataSource.runMigrations({ transaction: 'none' });
      for (const _ of done) await dataSource.undoLastMigration({ transaction: 'none' });
      const tables: { name: string }[] = await dataSource.query('SELECT table_name AS name FROM information_schema.tables WHERE table_schema = DATABASE()');
      expect(tables.map(({ name }) => name)).toEqual(['migrations']);
    } finally {
      await dataSource.destroy();
      await database.drop();
    }
  });
});
