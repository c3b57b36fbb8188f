import { existsSync, readFileSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { countJest } from './counting.mjs';
import { runCommand } from './processes.mjs';

const PART_LIMIT_MS = 40 * 60_000;
const WORKSPACES = ['object-store-fake', 'mail-fake', 'conference-api', 'conference-web'];
const FAKES = ['object-store-fake', 'mail-fake'];
const ALL = WORKSPACES;

/**
 * The parts of `npm test`, in the order they run. `only` are the names that `--only` takes; `builds` the
 * workspaces that must be built before; `services` that MariaDB and both fakes run; `app` that the whole
 * built application runs.
 */
export const PARTS = [
  { title: 'lint', only: ['lint'], check: ['node_modules/eslint/bin/eslint.js', '.', '--max-warnings=0'] },
  ...WORKSPACES.map((workspace) => ({
    title: `types ${workspace}`,
    only: ['types'],
    check: ['node_modules/typescript/bin/tsc', '--noEmit', '-p', `${workspace}/tsconfig.json`],
  })),
  { title: 'size', only: ['size'], builds: ['conference-web'], check: ['scripts/size.mjs'] },
  jest('scripts', 'scripts', { builds: FAKES }),
  jest('store', 'object-store-fake', { builds: ['object-store-fake'] }),
  jest('mail', 'mail-fake', { builds: ['mail-fake'] }),
  jest('unit', 'conference-api', { suffix: '\\.spec\\.ts$' }),
  jest('api-e2e', 'conference-api', { suffix: '\\.e2e-spec\\.ts$', builds: FAKES, services: true }),
  jest('web', 'conference-web', {}),
  jest('browser', 'conference-web', { config: 'jest.e2e.config.mjs', builds: ALL, services: true, app: true, workers: 1 }),
];

function jest(name, folder, { config = 'jest.config.mjs', suffix = '', ...needs }) {
  return { title: name, only: [name], jest: { folder, config, suffix }, ...needs };
}

export function partNames() {
  return [...new Set(PARTS.flatMap((part) => part.only))];
}

/** Runs one part: {passed, failed, notes, output}. `pattern` narrows jest down to some files. */
export async function runPart(part, { root, env, pattern, reportFile }) {
  return part.jest ? runJest(part, { root, env, pattern, reportFile }) : runCheck(part, { root, env });
}

async function runCheck(part, { root, env }) {
  const { code, output } = await runCommand(process.execPath, part.check, { cwd: root, env, timeoutMs: PART_LIMIT_MS });
  return { passed: code === 0 ? 1 : 0, failed: code === 0 ? 0 : 1, notes: [], output };
}

async function runJest(part, { root, env, pattern, reportFile }) {
  const { folder, config, suffix } = part.jest;
  if (!existsSync(join(root, folder, config))) {
    return { passed: 0, failed: 1, notes: [`${folder}/${config} is missing`], output: '' };
  }
  rmSync(reportFile, { force: true });
  const paths = pattern ? `${pattern}.*${suffix}` : suffix;
  const args = [
    join(root, 'node_modules/jest/bin/jest.js'),
    `--config=${config}`,
    '--json',
    `--outputFile=${reportFile}`,
    `--maxWorkers=${part.workers ?? 2}`,
    ...(paths ? [`--testPathPatterns=${paths}`] : []),
  ];
  const { code, output } = await runCommand(process.execPath, args, { cwd: join(root, folder), env, timeoutMs: PART_LIMIT_MS });
  const report = existsSync(reportFile) ? JSON.parse(readFileSync(reportFile, 'utf8')) : null;
  return { ...countJest(report, code), output: readable(output) };
}

/** With --json jest also writes the whole report as one line; people want the rest. */
function readable(output) {
  return output
    .split('\n')
    .filter((line) => !line.startsWith('{"numFailedTestSuites"'))
    .join('\n');
}
