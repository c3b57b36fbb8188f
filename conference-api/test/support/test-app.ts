import 'reflect-metadata';
import type { NestExpressApplication } from '@nestjs/platform-express';
import { Test } from '@nestjs/testing';
import { randomBytes } from 'node:crypto';
import { createConnection } from 'mysql2/promise';
import request from 'supertest';
import { DataSource } from 'typeorm';
import { AppModule } from '../../src/app.module.js';
import { setUp } from '../../src/app.setup.js';
import { readSettings, Settings } from '../../src/config/settings.js';

export interface TestApp {
  app: NestExpressApplication;
  dataSource: DataSource;
  settings: Settings;
  databaseUrl: string;
  /** Base address of the listening server. */
  url: string;
  http: () => ReturnType<typeof request>;
  close: () => Promise<void>;
}

const required = (name: string): string => {
  const value = process.env[name];
  if (!value) throw new Error(`${name} is not set: run the tests through npm test, which starts the services`);
  return value;
};

/** A database of its own on the running MariaDB; `drop` removes it. */
export async function makeDatabase(): Promise<{ url: string; drop: () => Promise<void> }> {
  const server = required('KERFSIDE_TEST_DB_URL');
  const name = `kerfside_test_${randomBytes(6).toString('hex')}`;
  const url = new URL(server);
  url.pathname = '';
  const run = async (sql: string) => {
    const connection = await createConnection(url.toString());
    await connection.query(sql);
    await connection.end();
  };
  await run(`CREATE DATABASE ${name}`);
  url.pathname = `/${name}`;
  const root = new URL(url);
  return {
    url: root.toString(),
    drop: async () => {
      url.pathname = '';
      await run(`DROP DATABASE IF EXISTS ${name}`);
    },
  };
}

/**
 * The whole application as it runs, listening on a free port, on a migrated database of its own and on
 * real services. `environment` overrides settings by their names; a given `databaseUrl` is shared and kept.
 */
export async function startTestApp(environment: Record<string, string> = {}, databaseUrl?: string): Promise<TestApp> {
  const database = databaseUrl ? { url: databaseUrl, drop: async () => {} } : await makeDatabase();
  const settings = readSettings({
    KERFSIDE_S3_ENDPOINT: process.env['KERFSIDE_S3_ENDPOINT'],
    KERFSIDE_SMTP_URL: process.env['KERFSIDE_SMTP_URL'],
    KERFSIDE_TOKEN_SECRET: randomBytes(32).toString('hex'),
    KERFSIDE_ADDRESS_SECRET: randomBytes(32).toString('hex'),
    KERFSIDE_PUBLIC_URL: 'http://kerfside.test',
    KERFSIDE_JOBS: 'false',
    KERFSIDE_WEB: '/nonexistent',
    ...environment,
    KERFSIDE_DB_URL: database.url,
  });
  const saved = { ...process.env };
  // the configuration module reads the environment itself, as in production
  Object.assign(process.env, {
    KERFSIDE_DB_URL: database.url,
    KERFSIDE_S3_ENDPOINT: settings.s3.endpoint,
    KERFSIDE_SMTP_URL: settings.smtpUrl,
    KERFSIDE_TOKEN_SECRET: settings.tokenSecret,
    KERFSIDE_ADDRESS_SECRET: settings.addressSecret,
  });
  const module = await Test.createTestingModule({ imports: [AppModule] })
    .overrideProvider(Settings)
    .useValue(settings)
    .compile();
  Object.assign(process.env, saved);
  const app = module.createNestApplication<NestExpressApplication>({ bodyParser: false, logger: process.env['KERFSIDE_TEST_LOG'] ? undefined : false });
  setUp(app);
  const dataSource = app.get(DataSource);
  if (!databaseUrl) await dataSource.runMigrations({ transaction: 'none' });
  await app.init();
  await app.listen(0, '127.0.0.1');
  const url = await app.getUrl();
  return {
    app,
    dataSource,
    settings,
    databaseUrl: database.url,
    url,
    http: () => request(url),
    close: async () => {
      await app.close();
      await database.drop();
    },
  };
}
