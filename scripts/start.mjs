// npm start: everything from a bare checkout to the running application, on Node's own modules.
import { createApi, demoAccounts } from './lib/app.mjs';
import { BUILDS } from './lib/builds.mjs';
import { createLifecycle } from './lib/lifecycle.mjs';
import { projectRoot } from './lib/root.mjs';
import { localAddress } from './lib/settings.mjs';
import { bringUpStack } from './lib/stack.mjs';
import { printError } from './lib/steps.mjs';

const root = projectRoot(import.meta.dirname);
const lifecycle = createLifecycle();
lifecycle.handleSignals(0, () => process.stdout.write('\nStopping …\n'));

async function start() {
  const workspaces = BUILDS.map(({ workspace }) => workspace);
  const { settings, services, env, startService } = await bringUpStack({ root, lifecycle, workspaces });
  await startService(createApi({ settings, env }));
  printReady(settings, services);
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
