import type { DataSourceOptions } from 'typeorm';
import { ENTITIES } from './entities.js';
import { MIGRATIONS } from './migrations.js';

/** How every process reaches MariaDB: times in UTC, sorted and compared as Unicode says. */
export function dataSourceOptions(url: string): DataSourceOptions {
  return {
    type: 'mariadb',
    url,
    entities: ENTITIES,
    migrations: MIGRATIONS,
    migrationsTransactionMode: 'none',
    synchronize: false,
    // a logged query would carry what people wrote
    logging: false,
    timezone: 'Z',
    charset: 'utf8mb4_unicode_ci',
    poolSize: 20,
    connectTimeout: 4000,
    extra: { waitForConnections: true, queueLimit: 200, enableKeepAlive: true },
  };
}
