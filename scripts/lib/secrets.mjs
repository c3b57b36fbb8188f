import { randomBytes } from 'node:crypto';
import { chmodSync, existsSync, mkdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { Problem } from './problem.mjs';

const NAMES = ['databasePassword', 'tokenSecret', 'addressSecret'];

/** The secrets of the local services: made once, kept in secrets.json that only its owner can read. */
export function readSecrets(dataDir) {
  mkdirSync(dataDir, { recursive: true, mode: 0o700 });
  const file = join(dataDir, 'secrets.json');
  const secrets = existsSync(file) ? parse(file) : {};
  const missing = NAMES.filter((name) => typeof secrets[name] !== 'string' || secrets[name] === '');
  if (missing.length > 0) {
    for (const name of missing) secrets[name] = randomBytes(32).toString('base64url');
    const draft = `${file}.new`;
    writeFileSync(draft, `${JSON.stringify(secrets, null, 2)}\n`, { mode: 0o600 });
    renameSync(draft, file);
  }
  chmodSync(file, 0o600);
  return secrets;
}

function parse(file) {
  try {
    return JSON.parse(readFileSync(file, 'utf8'));
  } catch {
    // New secrets would lock the person out of the database, so this is left to them.
    throw new Problem(`${file} can't be read as JSON. Put it right from a backup; delete it only with the whole data folder.`);
  }
}
