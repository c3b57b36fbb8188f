import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { withDrawnImages } from './drawn-images.mjs';
import { answers } from './http.mjs';
import { createMailServer, createObjectStore, nodeService } from './fakes.mjs';
import { createMariaDB } from './mariadb.mjs';
import { Problem } from './problem.mjs';
import { runCommand } from './processes.mjs';
import { localAddress } from './settings.mjs';

/** The local services that `settings` call for: one with an address of its own set is left out. */
export function createLocalServices({ settings, secrets, databases = ['kerfside'], durable = true }) {
  const dataDir = settings.KERFSIDE_DATA;
  const log = (name) => join(dataDir, 'logs', `${name}.log`);
  const database = settings.KERFSIDE_DB_URL
    ? null
    : createMariaDB({
        dataDir: join(dataDir, 'mariadb'),
        port: Number(settings.KERFSIDE_DB_PORT),
        password: secrets.databasePassword,
        databases,
        durable,
        logFile: log('mariadb'),
      });
  const store = settings.KERFSIDE_S3_ENDPOINT
    ? null
    : createObjectStore({
        dataDir,
        port: Number(settings.KERFSIDE_OBJECT_STORE_PORT),
        bucket: settings.KERFSIDE_S3_BUCKET,
        accessKeyId: settings.KERFSIDE_S3_ACCESS_KEY_ID,
        secretAccessKey: settings.KERFSIDE_S3_SECRET_ACCESS_KEY,
        region: settings.KERFSIDE_S3_REGION,
        logFile: log('object-store'),
      });
  const mail = settings.KERFSIDE_SMTP_URL
    ? null
    : createMailServer({
        dataDir,
        smtpPort: Number(settings.KERFSIDE_SMTP_PORT),
        port: Number(settings.KERFSIDE_MAIL_PORT),
        logFile: log('mail'),
      });
  return { database, store, mail };
}

/** The ports that will be listened on, each with the setting that changes it. */
export function wantedPorts(settings) {
  const local = '127.0.0.1';
  return [
    { setting: 'KERFSIDE_PORT', host: settings.KERFSIDE_HOST },
    !settings.KERFSIDE_DB_URL && { setting: 'KERFSIDE_DB_PORT', host: local },
    !settings.KERFSIDE_S3_ENDPOINT && { setting: 'KERFSIDE_OBJECT_STORE_PORT', host: local },
    !settings.KERFSIDE_SMTP_URL && { setting: 'KERFSIDE_SMTP_PORT', host: local },
    !settings.KERFSIDE_SMTP_URL && { setting: 'KERFSIDE_MAIL_PORT', host: local },
  ]
    .filter(Boolean)
    .map((wanted) => ({ ...wanted, port: Number(settings[wanted.setting]) }));
}

/** What the API, its migrations and its seed get: every setting, with the local services filled in. */
export function apiEnvironment({ settings, secrets, services, databaseName = 'kerfside' }) {
  return {
    ...process.env,
    NODE_ENV: process.env.NODE_ENV || 'production',
    ...settings,
    KERFSIDE_DB_URL: settings.KERFSIDE_DB_URL || services.database.urlOf(databaseName),
    KERFSIDE_S3_ENDPOINT: settings.KERFSIDE_S3_ENDPOINT || services.store.url,
    KERFSIDE_SMTP_URL: settings.KERFSIDE_SMTP_URL || services.mail.smtpUrl,
    KERFSIDE_TOKEN_SECRET: settings.KERFSIDE_TOKEN_SECRET || secrets.tokenSecret,
    KERFSIDE_ADDRESS_SECRET: settings.KERFSIDE_ADDRESS_SECRET || secrets.addressSecret,
  };
}

export async function runMigrations(root, env) {
  await runApiProgram(root, env, 'dist/database/migrate.js', 'The migrations failed.');
}

/** Fills an empty database with the demo; the program itself leaves any other one alone. */
export async function runSeed(root, env) {
  const seed = () => runApiProgram(root, env, 'dist/database/seeds/main.js', 'The demo could not be written.');
  await withDrawnImages(root, env.KERFSIDE_DATA, seed);
}

async function runApiProgram(root, env, program, failure) {
  const file = join(root, 'conference-api', program);
  const { code, output } = await runCommand(process.execPath, [file], { cwd: root, env });
  if (code !== 0) throw new Problem(failure, { output });
}

/** The API with the built web on one origin, not started yet. */
export function createApi({ settings, env }) {
  const url = localAddress(settings);
  const service = nodeService({
    title: 'API',
    workspace: 'conference-api',
    logFile: join(settings.KERFSIDE_DATA, 'logs/api.log'),
    env,
    isReady: () => answers(`${url}/api/health/ready`, (status) => status === 200),
  });
  return Object.assign(service, { url });
}

export function demoAccounts(root) {
  return JSON.parse(readFileSync(join(root, 'conference-api/src/database/seeds/demo-accounts.json'), 'utf8'));
}
