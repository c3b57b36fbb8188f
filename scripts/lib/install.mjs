import { DATABASE_PACKAGES, TEST_PACKAGES, installPackages } from './debian-packages.mjs';
import { installNpmPackages } from './npm-packages.mjs';
import { Problem } from './problem.mjs';
import { step } from './steps.mjs';

const NEEDED_NODE = [20, 19];

export function checkNodeVersion(version = process.versions.node) {
  const [major, minor] = version.split('.').map(Number);
  if (major > NEEDED_NODE[0] || (major === NEEDED_NODE[0] && minor >= NEEDED_NODE[1])) return;
  throw new Problem(`Kerfside needs Node.js ${NEEDED_NODE.join('.')} or newer; this is ${version}.`);
}

/** Debian's packages and npm's, only what is missing. `purpose` is 'run', 'test' or 'run-without-database'. */
export async function installMissing(root, purpose) {
  const names = { run: DATABASE_PACKAGES, test: TEST_PACKAGES, 'run-without-database': [] }[purpose];
  if (names.length > 0) {
    await step("Debian's packages", async () => {
      const installed = await installPackages(names);
      return installed.length > 0 ? `installed ${installed.join(', ')}` : 'all there';
    });
  }
  await step("npm's packages", async () => ((await installNpmPackages(root)) ? 'installed' : 'all there'));
}
