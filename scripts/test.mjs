// npm test: every check and suite, on services of its own. `-- --only <part> [path]` runs one part.
import { join } from 'node:path';
import { BUILDS, buildWorkspace, isBuilt } from './lib/builds.mjs';
import { withCheckoutLock } from './lib/checkout-lock.mjs';
import { lastLine, total } from './lib/counting.mjs';
import { checkNodeVersion, installMissing } from './lib/install.mjs';
import { createLifecycle } from './lib/lifecycle.mjs';
import { projectRoot } from './lib/root.mjs';
import { withoutSettings } from './lib/settings.mjs';
import { printError, seconds, step } from './lib/steps.mjs';
import { PARTS, partNames, runPart } from './lib/test-parts.mjs';
import { createTestServices } from './lib/test-services.mjs';

const root = projectRoot(import.meta.dirname);
const lifecycle = createLifecycle();
const results = [];
lifecycle.handleSignals(1, () => process.stdout.write('\nStopping …\n'));

const withLock = (work) => withCheckoutLock(root, work, { say: (line) => process.stdout.write(`${line}\n`), check: lifecycle.check });

function chosenParts(args) {
  const at = args.indexOf('--only');
  if (at === -1) return { parts: PARTS, pattern: args[0] };
  const name = args[at + 1];
  const parts = PARTS.filter((part) => part.only.includes(name));
  if (parts.length === 0) {
    process.stderr.write(`--only takes one of: ${partNames().join(', ')}\n`);
    process.exit(1);
  }
  return { parts, pattern: args.filter((_, i) => i !== at && i !== at + 1)[0] };
}

function record(title, started, result) {
  results.push(result);
  const notes = result.notes.length > 0 ? ` (${result.notes.join('; ')})` : '';
  if (result.failed > 0) process.stdout.write(`\n${result.output.trimEnd()}\n\n`);
  process.stdout.write(`${title}: ${lastLine(result)}${notes}, ${seconds(started)}\n`);
}

/** Builds what the parts need; a workspace that can't be built counts as one failed test. */
async function buildFor(parts) {
  const wanted = new Set(parts.flatMap((part) => part.builds ?? []));
  const broken = new Set();
  for (const each of BUILDS.filter(({ workspace }) => wanted.has(workspace))) {
    lifecycle.check();
    if (isBuilt(root, each)) continue;
    const started = performance.now();
    try {
      await buildWorkspace(root, each);
      process.stdout.write(`build ${each.workspace}: done, ${seconds(started)}\n`);
    } catch (error) {
      broken.add(each.workspace);
      record(`build ${each.workspace}`, started, { passed: 0, failed: 1, notes: [error.message], output: error.output ?? '' });
    }
  }
  return broken;
}

/** Two at a time: these neither listen nor write. */
async function runChecks(parts, options) {
  const queue = [...parts];
  const worker = async () => {
    for (let part = queue.shift(); part; part = queue.shift()) await runOne(part, options);
  };
  await Promise.all([worker(), worker()]);
}

async function runOne(part, options) {
  lifecycle.check();
  const started = performance.now();
  const reportFile = join(options.folder, `${part.title.replaceAll(' ', '-')}.json`);
  const result = await runPart(part, { root, reportFile, ...options });
  lifecycle.check();
  record(part.title, started, result);
}

function couldNotRun(part, why, error) {
  const output = [error?.output, error?.stack].filter(Boolean).join('\n');
  record(part.title, performance.now(), { passed: 0, failed: 1, notes: [why], output });
}

async function runAll(parts, pattern, services) {
  const base = { folder: services.folder, pattern };
  await runChecks(parts.filter((part) => part.check && !part.builds), { ...base, env: withoutSettings() });
  const broken = await withLock(() => buildFor(parts));
  let down = null;
  if (parts.some((part) => part.services)) {
    await step('Services', () => services.start()).catch((error) => {
      down = error;
    });
  }
  for (const part of parts.filter((each) => !each.check || each.builds)) {
    lifecycle.check();
    const missing = (part.builds ?? []).filter((workspace) => broken.has(workspace));
    if (missing.length > 0) couldNotRun(part, `${missing.join(' and ')} could not be built`);
    else if (part.services && down) couldNotRun(part, 'its services did not start', down);
    else await runWithServices(part, base, services);
  }
}

async function runWithServices(part, base, services) {
  const env = part.services ? services.environment() : withoutSettings();
  if (!part.app) return runOne(part, { ...base, env });
  let address;
  try {
    address = await step('Application for the browser tests', () => services.startApp());
  } catch (error) {
    lifecycle.check();
    return couldNotRun(part, 'the application did not start', error);
  }
  return runOne(part, { ...base, env: { ...env, KERFSIDE_BASE_URL: address } });
}

async function main() {
  const { parts, pattern } = chosenParts(process.argv.slice(2));
  checkNodeVersion();
  await withLock(() => installMissing(root, 'test'));
  lifecycle.check();
  const services = await createTestServices(root);
  await lifecycle.onStop(() => tidy(services));
  await lifecycle.onStop(() => services.stop());
  await runAll(parts, pattern, services);
}

/** Runs last of all: what a failed run left is kept for whoever looks into it. */
function tidy(services) {
  if (lifecycle.wasInterrupted || total(results).ok) services.remove();
  else process.stdout.write(`\nLogs and data of this run are kept in ${services.folder}\n`);
}

try {
  await main();
} catch (error) {
  if (!lifecycle.wasInterrupted) printError(error);
  results.push({ passed: 0, failed: 1 });
}
await lifecycle.stop();
const sum = total(results);
process.stdout.write(`${lastLine(sum)}\n`);
process.exitCode = sum.ok ? 0 : 1;
