// npm start: everything from a bare checkout to the running application, on Node's own modules.
import { apiEnvironment, createApi, createLocalServices, demoAccounts, runMigrations, runSeed, wantedPorts } from './lib/app.mjs';
import { BUILDS, buildWorkspace, isBuilt } from './lib/builds.mjs';
import { checkNodeVersion, installMissing } from './lib/install.mjs';
import { createLifecycle } from './lib/lifecycle.mjs';
import { checkPortsFree } from './lib/ports.mjs';
import { projectRoot } from './lib/root.mjs';
import { createRunningFile } from './lib/running.mjs';
import { readSecrets } from './lib/secrets.mjs';
import { localAddress, readSettings } from './lib/settings.mjs';
import { printError, step } from './lib/steps.mjs';
import { createSupervisor } from './lib/supervisor.mjs';

const root = projectRoot(import.meta.dirname);
const lifecycle = createLifecycle();
lifecycle.handleSignals(0, () => process.stdout.write('\nStopping …\n'));

async function start() {
  checkNodeVersion();
  const settings = readSettings(root);
  const running = createRunningFile(settings.KERFSIDE_DATA);
  await clearLeftovers(running);
  await checkPortsFree(wantedPorts(settings));
  running.checkUnused();

  await installMissing(root, settings.KERFSIDE_DB_URL ? 'run-without-database' : 'run');
  lifecycle.check();
  await build(settings);

  const secrets = readSecrets(settings.KERFSIDE_DATA);
  const services = createLocalServices({ settings, secrets });
  const env = apiEnvironment({ settings, secrets, services });
  const api = createApi({ settings, env });
  await checkPortsFree(wantedPorts(settings));
  running.checkUnused();

  const local = [services.database, services.store, services.mail].filter(Boolean);
  const writeRunning = () => running.write([...local, api].map((service) => service.pid));
  const supervisor = createSupervisor({ say: (line) => process.stdout.write(`${line}\n`), onChange: writeRunning });
  await lifecycle.onStop(() => running.remove());
  await lifecycle.onStop(() => supervisor.stop());
  writeRunning();

  for (const service of local) await startService(service, supervisor, writeRunning);
  await step('Migrations', () => runMigrations(root, env));
  lifecycle.check();
  if (settings.KERFSIDE_DEMO === 'true') await step('Demo', () => runSeed(root, env));
  lifecycle.check();
  await startService(api, supervisor, writeRunning);
  printReady(settings, services);
}

async function clearLeftovers(running) {
  const left = await running.clearLeftovers();
  if (left.length > 0) process.stdout.write(`Ended ${left.length} processes that an earlier start had left.\n`);
}

async function build(settings) {
  const needed = BUILDS.filter(
    ({ workspace }) =>
      !(workspace === 'object-store-fake' && settings.KERFSIDE_S3_ENDPOINT) &&
      !(workspace === 'mail-fake' && settings.KERFSIDE_SMTP_URL),
  );
  for (const each of needed) {
    if (isBuilt(root, each)) continue;
    await step(`Building ${each.workspace}`, () => buildWorkspace(root, each));
    lifecycle.check();
  }
}

async function startService(service, supervisor, writeRunning) {
  // Registered first: a stop while it starts must find it.
  supervisor.add(service);
  await step(service.title, () => service.start());
  supervisor.watch(service);
  writeRunning();
  lifecycle.check();
}

function printReady(settings, services) {
  const lines = [`Kerfside is ready at ${localAddress(settings)}`];
  if (settings.KERFSIDE_DEMO === 'true') {
    const { password, accounts } = demoAccounts(root);
    lines.push('', `Demo accounts, all with the password ${password}`);
    for (const { email, what } of accounts) lines.push(`  ${email.padEnd(33)}${what}`);
  }
  if (services.mail) lines.push('', `Mail that Kerfside sends: ${services.mail.url}`);
  lines.push('', 'Ctrl-C stops everything and keeps all data.');
  process.stdout.write(`${lines.join('\n')}\n`);
}

try {
  await start();
} catch (error) {
  if (!lifecycle.isStopping) {
    printError(error);
    await lifecycle.stop();
    process.exit(1);
  }
}
