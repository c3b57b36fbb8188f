// npm run dev: the local services, the API rebuilt and restarted on a change, and Vite's own server.
import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { answers } from './lib/http.mjs';
import { createLifecycle } from './lib/lifecycle.mjs';
import { freePort } from './lib/ports.mjs';
import { projectRoot } from './lib/root.mjs';
import { createService } from './lib/service.mjs';
import { localAddress } from './lib/settings.mjs';
import { bringUpStack } from './lib/stack.mjs';
import { printError } from './lib/steps.mjs';

const root = projectRoot(import.meta.dirname);
const lifecycle = createLifecycle();
lifecycle.handleSignals(0, () => process.stdout.write('\nStopping …\n'));

/** A package's program, wherever npm has put it. */
function program(workspace, path) {
  const own = join(root, workspace, 'node_modules', path);
  return existsSync(own) ? own : join(root, 'node_modules', path);
}

function createDevService({ title, workspace, args, env, isReady }) {
  return createService({
    title,
    logFile: 'this terminal',
    isReady,
    readyWithinMs: 180_000,
    command: () => ({ file: process.execPath, args, cwd: join(root, workspace), env, toTerminal: true }),
  });
}

async function start() {
  const workspaces = ['object-store-fake', 'mail-fake', 'conference-api'];
  const { settings, env, startService } = await bringUpStack({ root, lifecycle, workspaces });
  const environment = { ...env, NODE_ENV: 'development' };
  // People use Vite's address; it passes /api on to the API on a port of its own.
  const apiPort = await freePort();
  const apiUrl = `http://127.0.0.1:${apiPort}`;
  await startService(
    createDevService({
      title: 'API',
      workspace: 'conference-api',
      args: [program('conference-api', '@nestjs/cli/bin/nest.js'), 'start', '--watch', '--preserveWatchOutput'],
      env: { ...environment, KERFSIDE_HOST: '127.0.0.1', KERFSIDE_PORT: String(apiPort), KERFSIDE_WEB: join(root, 'conference-web/dist') },
      isReady: () => answers(`${apiUrl}/api/health/ready`, (status) => status === 200),
    }),
  );
  const { KERFSIDE_HOST: host, KERFSIDE_PORT: port } = settings;
  await startService(
    createDevService({
      title: 'Web',
      workspace: 'conference-web',
      args: [program('conference-web', 'vite/bin/vite.js'), '--host', host, '--port', port, '--strictPort', '--clearScreen', 'false'],
      env: { ...environment, KERFSIDE_API_URL: apiUrl },
      isReady: () => answers(localAddress(settings)),
    }),
  );
  process.stdout.write(`Kerfside is ready for work at ${localAddress(settings)}\n`);
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
