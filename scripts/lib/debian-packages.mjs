import { accessSync, constants, existsSync } from 'node:fs';
import { delimiter, join } from 'node:path';
import { Problem } from './problem.mjs';
import { runCommand } from './processes.mjs';

/** What shows that a Debian package is there: all of its `files`, a bare name being a program in the PATH. */
const SIGNS = {
  'mariadb-server': ['mariadbd', 'mariadb-install-db', 'mariadb'],
  chromium: ['/usr/bin/chromium'],
  'python3-pydicom': ['/usr/bin/python3', '/usr/lib/python3/dist-packages/pydicom/__init__.py'],
  dcmtk: ['dcmdump'],
  'poppler-utils': ['pdftotext', 'pdfinfo'],
  swaks: ['swaks'],
  'python3-icalendar': ['/usr/bin/python3', '/usr/lib/python3/dist-packages/icalendar/__init__.py'],
};

export const DATABASE_PACKAGES = ['mariadb-server'];
export const TEST_PACKAGES = Object.keys(SIGNS);

const ENVIRONMENT = { ...process.env, DEBIAN_FRONTEND: 'noninteractive', LC_ALL: 'C.UTF-8' };

export function missingPackages(names) {
  return names.filter((name) => !SIGNS[name].every(isThere));
}

function isThere(file) {
  if (file.startsWith('/')) return existsSync(file);
  const folders = [...(process.env.PATH ?? '').split(delimiter), '/usr/sbin', '/usr/bin'];
  return folders.some((folder) => {
    try {
      accessSync(join(folder, file), constants.X_OK);
      return true;
    } catch {
      return false;
    }
  });
}

/** The one command that puts `names` on this machine. */
export function installCommand(names) {
  return `apt-get update && apt-get install -y --no-install-recommends ${names.join(' ')}`;
}

/** Installs those of `names` that are missing and answers which they were. Needs root only when some are. */
export async function installPackages(names) {
  const missing = missingPackages(names);
  if (missing.length === 0) return missing;
  if (process.getuid?.() !== 0) {
    throw new Problem(`Missing on this machine: ${missing.join(', ')}. Run this once as root, then try again:\n  ${installCommand(missing)}`);
  }
  const update = await apt(['update']);
  let install = await apt(['install', '-y', '--no-install-recommends', ...missing]);
  if (install.code !== 0) {
    // An installation that was interrupted earlier has to be finished first.
    await runCommand('dpkg', ['--configure', '-a'], { env: ENVIRONMENT });
    install = await apt(['install', '-y', '--no-install-recommends', ...missing]);
  }
  if (install.code !== 0) {
    const output = [update, install].map((step) => tail(step.output)).join('\n');
    throw new Problem(`Could not install ${missing.join(', ')}. Run this by hand, then try again:\n  ${installCommand(missing)}`, { output });
  }
  const still = missingPackages(missing);
  if (still.length > 0) throw new Problem(`Installed, but not found afterwards: ${still.join(', ')}.`, { output: tail(install.output) });
  return missing;
}

async function apt(args) {
  try {
    return await runCommand('apt-get', ['-o', 'DPkg::Lock::Timeout=300', '-o', 'Acquire::Retries=3', ...args], { env: ENVIRONMENT });
  } catch (error) {
    return { code: 1, output: `apt-get can't be run: ${error.message}` };
  }
}

function tail(output) {
  return output.trimEnd().split('\n').slice(-20).join('\n');
}
