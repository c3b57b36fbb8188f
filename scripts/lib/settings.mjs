import { existsSync, readFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { Problem } from './problem.mjs';

export const PORT_SETTINGS = [
  'KERFSIDE_PORT',
  'KERFSIDE_DB_PORT',
  'KERFSIDE_OBJECT_STORE_PORT',
  'KERFSIDE_SMTP_PORT',
  'KERFSIDE_MAIL_PORT',
];

/** Reads `NAME=value` lines; blank lines and lines that begin with # are left out. */
export function parseEnvFile(text) {
  const values = {};
  for (const line of text.split(/\r?\n/)) {
    const match = /^\s*(?:export\s+)?([A-Z][A-Z0-9_]*)\s*=\s*(.*?)\s*$/.exec(line);
    if (match) values[match[1]] = match[2].replace(/^(["'])(.*)\1$/, '$2');
  }
  return values;
}

/**
 * All settings: .env.example holds the defaults, .env changes them, the environment wins.
 * An empty value counts as not set.
 */
export function readSettings(root, environment = process.env) {
  const defaults = parseEnvFile(readFileSync(join(root, '.env.example'), 'utf8'));
  const file = existsSync(join(root, '.env')) ? parseEnvFile(readFileSync(join(root, '.env'), 'utf8')) : {};
  const settings = { ...defaults };
  const given = new Set();
  for (const source of [file, environment]) {
    for (const [name, value] of Object.entries(source)) {
      if (!name.startsWith('KERFSIDE_') || value === undefined || value === '') continue;
      settings[name] = value;
      given.add(name);
    }
  }
  for (const name of PORT_SETTINGS) checkPortSetting(name, settings[name]);
  settings.KERFSIDE_DATA = resolve(root, settings.KERFSIDE_DATA);
  if (!given.has('KERFSIDE_PUBLIC_URL')) settings.KERFSIDE_PUBLIC_URL = localAddress(settings);
  return settings;
}

function checkPortSetting(name, value) {
  if (/^\d+$/.test(value) && Number(value) >= 1 && Number(value) <= 65535) return;
  throw new Problem(`${name} must be a port from 1 to 65535.`);
}

/** Where this machine reaches the application, whatever the host it listens on. */
export function localAddress({ KERFSIDE_HOST: host, KERFSIDE_PORT: port }) {
  const everywhere = host === '0.0.0.0' || host === '::';
  const name = everywhere ? '127.0.0.1' : host;
  return `http://${name.includes(':') ? `[${name}]` : name}:${port}`;
}

/** The environment without this person's own Kerfside settings, so that tests don't depend on them. */
export function withoutSettings(environment = process.env) {
  return Object.fromEntries(Object.entries(environment).filter(([name]) => !name.startsWith('KERFSIDE_')));
}
