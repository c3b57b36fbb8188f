// npm run bench: measurements on a demo installation of its own, as JSON lines. Never part of npm test.
import { performance } from 'node:perf_hooks';
import { BUILDS, buildWorkspace, isBuilt } from '../lib/builds.mjs';
import { checkNodeVersion, installMissing } from '../lib/install.mjs';
import { createLifecycle } from '../lib/lifecycle.mjs';
import { projectRoot } from '../lib/root.mjs';
import { createTestServices } from '../lib/test-services.mjs';
import { demoAccounts, measurePages } from './pages.mjs';

const root = projectRoot(import.meta.dirname);
const lifecycle = createLifecycle();
lifecycle.handleSignals(1, () => process.stderr.write('Stopping …\n'));

// standard output holds the measurements alone
const print = (measurement) => process.stdout.write(`${JSON.stringify(measurement)}\n`);
console.log = (...line) => console.error(...line);

checkNodeVersion();
await installMissing(root, 'test');
for (const each of BUILDS) if (!isBuilt(root, each)) await buildWorkspace(root, each);
const services = await createTestServices(root);
await lifecycle.onStop(() => services.remove());
await lifecycle.onStop(() => services.stop());
try {
  await services.start();
  const started = performance.now();
  const address = await services.startApp();
  print({ name: 'demo seeded and API ready', unit: 's', value: (performance.now() - started) / 1000 });
  await measurePages(address, demoAccounts(root), print);
} finally {
  await lifecycle.stop();
}
