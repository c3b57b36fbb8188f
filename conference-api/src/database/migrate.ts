import 'reflect-metadata';
import { DataSource } from 'typeorm';
import { readSettings, withEnvFile } from '../config/settings.js';
import { dataSourceOptions } from './data-source.js';

const settings = readSettings(withEnvFile(process.env, '.env'));
const dataSource = await new DataSource(dataSourceOptions(settings.databaseUrl)).initialize();
try {
  const done = await dataSource.runMigrations({ transaction: 'none' });
  console.log(`${done.length} migrations run`);
} finally {
  await dataSource.destroy();
}
