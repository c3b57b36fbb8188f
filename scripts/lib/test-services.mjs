import { mkdtempSync, mkdirSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { apiEnvironment, createApi, createLocalServices, runMigrations, runSeed } from './app.mjs';
import { freePorts } from './ports.mjs';
import { readSecrets } from './secrets.mjs';
import { readSettings, withoutSettings } from './settings.mjs';

/**
 * The services of one test run, all on free ports and in a throw-away folder: `start()`, `environment()`
 * for the suites, `startApp()` for the browser tests, `stop()`, `remove()`.
 */
export async function createTestServices(root) {
  const folder = mkdtempSync(join(tmpdir(), 'kerfside-test-'));
  const [port, dbPort, storePort, smtpPort, mailPort] = await freePorts(5);
  const settings = readSettings(root, {
    KERFSIDE_HOST: '127.0.0.1',
    KERFSIDE_PORT: String(port),
    KERFSIDE_PUBLIC_URL: `http://127.0.0.1:${port}`,
    KERFSIDE_DB_PORT: String(dbPort),
    KERFSIDE_OBJECT_STORE_PORT: String(storePort),
    KERFSIDE_SMTP_PORT: String(smtpPort),
    KERFSIDE_MAIL_PORT: String(mailPort),
    KERFSIDE_DATA: folder,
  });
  for (const name of ['KERFSIDE_DB_URL', 'KERFSIDE_S3_ENDPOINT', 'KERFSIDE_SMTP_URL']) settings[name] = '';
  mkdirSync(join(folder, 'logs'), { recursive: true });
  const secrets = readSecrets(folder);
  const services = createLocalServices({ settings, secrets, databases: ['kerfside_test_browser', 'kerfside_test_%'], durable: false });
  const started = [];

  async function start(service) {
    started.push(service);
    await service.start();
  }

  return {
    folder,
    async start() {
      for (const service of [services.database, services.store, services.mail]) await start(service);
    },
    /** What the suites find in their environment. */
    environment() {
      return {
        ...withoutSettings(),
        KERFSIDE_TEST_DB_URL: services.database.urlOf(''),
        KERFSIDE_S3_ENDPOINT: services.store.url,
        KERFSIDE_S3_REGION: settings.KERFSIDE_S3_REGION,
        KERFSIDE_S3_ACCESS_KEY_ID: settings.KERFSIDE_S3_ACCESS_KEY_ID,
        KERFSIDE_S3_SECRET_ACCESS_KEY: settings.KERFSIDE_S3_SECRET_ACCESS_KEY,
        KERFSIDE_SMTP_URL: services.mail.smtpUrl,
        KERFSIDE_TEST_MAIL_URL: services.mail.url,
        KERFSIDE_TEST_FOLDER: folder,
      };
    },
    /** Migrations, demo and API with the built web; answers its address. */
    async startApp() {
      const env = apiEnvironment({ settings, secrets, services, databaseName: 'kerfside_test_browser' });
      await runMigrations(root, env);
      await runSeed(root, env);
      const api = createApi({ settings, env });
      await start(api);
      return api.url;
    },
    async stop() {
      for (const service of started.reverse()) await service.stop();
    },
    remove() {
      rmSync(folder, { recursive: true, force: true });
    },
  };
}
