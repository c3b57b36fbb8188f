import { apiEnvironment, createLocalServices, runMigrations, runSeed, wantedPorts } from './app.mjs';
import { BUILDS, buildWorkspace, isBuilt } from './builds.mjs';
import { withCheckoutLock } from './checkout-lock.mjs';
import { createFirstStart } from './first-start.mjs';
import { checkNodeVersion, installMissing } from './install.mjs';
import { checkPortsFree } from './ports.mjs';
import { createRunningFile } from './running.mjs';
import { readSecrets } from './secrets.mjs';
import { readSettings } from './settings.mjs';
import { step } from './steps.mjs';
import { createSupervisor } from './supervisor.mjs';

/**
 * What `npm start` and `npm run dev` have in common, up to the API: checks first, then what is
 * missing, the builds of `workspaces`, the local services, migrations and demo. Answers what the rest needs.
 */
export async function bringUpStack({ root, lifecycle, workspaces }) {
  checkNodeVersion();
  const settings = readSettings(root);
  const running = createRunningFile(settings.KERFSIDE_DATA);
  const check = async () => {
    await checkPortsFree(wantedPorts(settings));
    running.checkUnused();
  };
  const left = await running.clearLeftovers();
  if (left.length > 0) process.stdout.write(`Ended ${left.length} processes that an earlier start had left.\n`);
  await check();

  const purpose = settings.KERFSIDE_DB_URL ? 'run-without-database' : 'run';
  const say = (line) => process.stdout.write(`${line}\n`);
  await withCheckoutLock(root, () => installAndBuild({ root, lifecycle, settings, workspaces, purpose }), { say, check: lifecycle.check });

  const secrets = readSecrets(settings.KERFSIDE_DATA);
  const services = createLocalServices({ settings, secrets });
  // Installing and building can take minutes in which another program may have come.
  await check();
  const firstStart = createFirstStart(settings.KERFSIDE_DATA);
  if (services.database && firstStart.begin()) say('The first start had not come to its end: it begins anew.');
  const startService = await supervise({ lifecycle, running });
  for (const service of [services.database, services.store, services.mail]) if (service) await startService(service);
  const env = apiEnvironment({ settings, secrets, services });
  await fillDatabase({ root, lifecycle, settings, env, firstStart });
  return { settings, services, env, startService };
}

async function fillDatabase({ root, lifecycle, settings, env, firstStart }) {
  await step('Migrations', () => runMigrations(root, env));
  lifecycle.check();
  if (settings.KERFSIDE_DEMO === 'true') {
    const title = firstStart.isUnderWay ? 'Demo, its pictures being drawn' : 'Demo';
    await step(title, () => runSeed(root, env));
    lifecycle.check();
  }
  firstStart.finish();
}

async function installAndBuild({ root, lifecycle, settings, workspaces, purpose }) {
  await installMissing(root, purpose);
  lifecycle.check();
  const needed = BUILDS.filter(
    ({ workspace }) =>
      workspaces.includes(workspace) &&
      !(workspace === 'object-store-fake' && settings.KERFSIDE_S3_ENDPOINT) &&
      !(workspace === 'mail-fake' && settings.KERFSIDE_SMTP_URL),
  );
  for (const each of needed) {
    if (isBuilt(root, each)) continue;
    await step(`Building ${each.workspace}`, async () => {
      await buildWorkspace(root, each);
    });
    lifecycle.check();
  }
}

/** Answers a function that starts a service, keeps it going from then on, and ends it with the rest. */
async function supervise({ lifecycle, running }) {
  const services = [];
  const writeRunning = () => running.write(services.map((service) => service.pid));
  const supervisor = createSupervisor({ say: (line) => process.stdout.write(`${line}\n`), onChange: writeRunning });
  await lifecycle.onStop(() => running.remove());
  await lifecycle.onStop(() => supervisor.stop());
  return async (service) => {
    lifecycle.check();
    services.push(service);
    supervisor.add(service);
    await step(service.title, async () => {
      await service.start();
    });
    supervisor.watch(service);
    writeRunning();
    lifecycle.check();
  };
}
