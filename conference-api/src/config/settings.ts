import { readFileSync } from 'node:fs';
import { resolve } from 'node:path';

/** Everything that may differ between two installations. */
export class Settings {
  constructor(
    readonly host: string,
    readonly port: number,
    readonly publicUrl: string,
    readonly dataFolder: string,
    readonly webFolder: string,
    readonly databaseUrl: string,
    readonly s3: { endpoint: string; region: string; bucket: string; accessKeyId: string; secretAccessKey: string },
    readonly smtpUrl: string,
    readonly mailFrom: string,
    readonly tokenSecret: string,
    readonly addressSecret: string,
    readonly log: string,
    readonly jobs: boolean,
    readonly demo: boolean,
    readonly accessTokenSeconds: number,
    readonly sessionDays: number,
    readonly retentionDays: number,
    readonly uploadMaxBytes: number,
    readonly secureCookies: boolean,
  ) {}
}

type Environment = Record<string, string | undefined>;

/** Reads the settings; throws one error that names every bad setting, never a value. */
export function readSettings(environment: Environment): Settings {
  const bad: string[] = [];
  const text = (name: string, fallback?: string) => {
    const value = environment[name];
    if (value) return value;
    if (fallback === undefined) bad.push(`${name} is missing`);
    return fallback ?? '';
  };
  const number = (name: string, fallback: number, low: number, high: number) => {
    const raw = environment[name];
    const value = raw ? Number(raw) : fallback;
    if (!Number.isFinite(value) || value < low || value > high) bad.push(`${name} must be a number from ${low} to ${high}`);
    return value;
  };
  const flag = (name: string, fallback: boolean) => {
    const raw = environment[name];
    if (!raw) return fallback;
    if (raw !== 'true' && raw !== 'false') bad.push(`${name} must be true or false`);
    return raw === 'true';
  };
  const url = (name: string, schemes: string[], fallback?: string) => {
    const value = text(name, fallback);
    if (value && !schemes.some((scheme) => URL.canParse(value) && new URL(value).protocol === `${scheme}:`))
      bad.push(`${name} must be an address that begins with ${schemes.join(':// or ')}://`);
    return value;
  };
  const secret = (name: string) => {
    const value = text(name);
    if (value && value.length < 32) bad.push(`${name} must have at least 32 characters`);
    return value;
  };
  const port = number('KERFSIDE_PORT', 4300, 0, 65535);
  const settings = new Settings(
    text('KERFSIDE_HOST', '127.0.0.1'),
    port,
    url('KERFSIDE_PUBLIC_URL', ['http', 'https'], `http://127.0.0.1:${port}`).replace(/\/$/, ''),
    resolve(text('KERFSIDE_DATA', '.data')),
    resolve(text('KERFSIDE_WEB', 'conference-web/dist')),
    url('KERFSIDE_DB_URL', ['mysql', 'mariadb']),
    {
      endpoint: url('KERFSIDE_S3_ENDPOINT', ['http', 'https']),
      region: text('KERFSIDE_S3_REGION', 'eu-west-1'),
      bucket: text('KERFSIDE_S3_BUCKET', 'kerfside'),
      accessKeyId: text('KERFSIDE_S3_ACCESS_KEY_ID', 'kerfside'),
      secretAccessKey: text('KERFSIDE_S3_SECRET_ACCESS_KEY', 'kerfside-local-secret'),
    },
    url('KERFSIDE_SMTP_URL', ['smtp', 'smtps']),
    text('KERFSIDE_MAIL_FROM', 'Kerfside <no-reply@kerfside.example>'),
    secret('KERFSIDE_TOKEN_SECRET'),
    secret('KERFSIDE_ADDRESS_SECRET'),
    text('KERFSIDE_LOG', 'info'),
    flag('KERFSIDE_JOBS', true),
    flag('KERFSIDE_DEMO', true),
    number('KERFSIDE_ACCESS_TOKEN_SECONDS', 600, 1, 3600),
    number('KERFSIDE_SESSION_DAYS', 30, 1, 365),
    number('KERFSIDE_RETENTION_DAYS', 30, 0, 3650),
    number('KERFSIDE_UPLOAD_MAX_MB', 60, 1, 300) * 1024 * 1024,
    flag('KERFSIDE_SECURE_COOKIES', false),
  );
  if (bad.length) throw new Error(`Settings that must be mended: ${bad.join('; ')}`);
  return settings;
}

/** The environment with the lines of a `.env` file below it; a variable of the environment wins. */
export function withEnvFile(environment: Environment, file: string): Environment {
  let lines: string[] = [];
  try {
    lines = readFileSync(file, 'utf8').split('\n');
  } catch {
    return environment;
  }
  const fromFile = lines
    .map((line) => /^\s*([A-Z0-9_]+)\s*=\s*(.*?)\s*$/.exec(line))
    .filter((match) => match !== null)
    .map((match) => [match[1], match[2]]);
  return { ...Object.fromEntries(fromFile), ...environment };
}
