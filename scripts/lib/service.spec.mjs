import { spawn } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { answers } from './http.mjs';
import { freePort } from './ports.mjs';
import { createRunningFile } from './running.mjs';
import { createService } from './service.mjs';
import { createSupervisor } from './supervisor.mjs';

jest.setTimeout(30_000);

// A small server: its argument is the port; `?end` ends it with code 3.
const SERVER = `
require('node:http').createServer((request, response) => {
  response.end(String(process.pid));
  if (request.url === '/?end') setTimeout(() => process.exit(3), 20);
}).listen(Number(process.argv[1]), '127.0.0.1');
`;

let folder;
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'kerfside-service-'));
});
afterEach(() => rmSync(folder, { recursive: true }));

function service(port, script = SERVER) {
  return createService({
    title: 'Small server',
    logFile: join(folder, 'small.log'),
    command: () => ({ file: process.execPath, args: ['-e', script, String(port)], cwd: folder, env: process.env }),
    isReady: () => answers(`http://127.0.0.1:${port}/`),
  });
}

function isAlive(pid) {
  try {
    process.kill(pid, 0);
    return readFileSync(`/proc/${pid}/stat`, 'utf8').split(') ')[1][0] !== 'Z';
  } catch {
    return false;
  }
}

async function until(condition) {
  const deadline = Date.now() + 15_000;
  while (!(await condition())) {
    if (Date.now() > deadline) throw new Error('waited in vain');
    await new Promise((resolve) => setTimeout(resolve, 20));
  }
}

describe('a service', () => {
  it('shows the end of its log when it does not start', async () => {
    const broken = service(await freePort(), "console.error('no blade in the saw'); process.exit(4)");
    await expect(broken.start()).rejects.toMatchObject({
      message: expect.stringContaining('code 4'),
      output: expect.stringContaining('no blade in the saw'),
    });
  });

  it('is stopped while it starts', async () => {
    const slow = service(await freePort(), 'setInterval(() => {}, 1000)');
    const starting = slow.start();
    const refused = expect(starting).rejects.toThrow(/stopped/);
    await until(() => slow.pid !== null);
    const pid = slow.pid;
    await slow.stop();
    await refused;
    expect(isAlive(pid)).toBe(false);
  });

  it('is started again when it ends by itself, and not when it was stopped', async () => {
    const port = await freePort();
    const said = [];
    const small = service(port);
    const supervisor = createSupervisor({ say: (line) => said.push(line), firstPauseMs: 10 });
    supervisor.add(small);
    await small.start();
    supervisor.watch(small);
    const pid = small.pid;
    await fetch(`http://127.0.0.1:${port}/?end`);
    await until(() => said.some((line) => line.includes('running again')));
    expect(said[0]).toMatch(/ended unexpectedly \(code 3\)/);
    expect(small.pid).not.toBe(pid);
    const second = small.pid;
    await supervisor.stop();
    expect(isAlive(second)).toBe(false);
    expect(said).toHaveLength(2);
  });

  it('does not outlive a parent that is killed outright', async () => {
    const port = await freePort();
    const parent = join(folder, 'parent.mjs');
    writeFileSync(
      parent,
      `import { spawnService } from ${JSON.stringify(join(process.cwd(), 'lib/processes.mjs'))};
       const child = spawnService({ file: process.execPath, args: ['-e', ${JSON.stringify(SERVER)}, '${port}'],
         cwd: ${JSON.stringify(folder)}, env: process.env, logFile: ${JSON.stringify(join(folder, 'child.log'))} });
       console.log(child.pid);
       setInterval(() => {}, 1000);`,
    );
    const killed = spawn(process.execPath, [parent], { stdio: ['ignore', 'pipe', 'inherit'] });
    const pid = Number(await new Promise((resolve) => killed.stdout.once('data', resolve)));
    await until(() => answers(`http://127.0.0.1:${port}/`));
    killed.kill('SIGKILL');
    await until(() => !isAlive(pid));
  });
});

describe('the running file', () => {
  it('refuses a folder in use, and ends what a killed start has left', async () => {
    const other = spawn(process.execPath, ['-e', 'setInterval(() => {}, 1000)'], { stdio: 'ignore' });
    const left = spawn(process.execPath, ['-e', 'setInterval(() => {}, 1000)'], { stdio: 'ignore', detached: true });
    const file = createRunningFile(folder);
    file.write([left.pid]);
    // As another start would have written it.
    const written = JSON.parse(readFileSync(join(folder, 'running.json'), 'utf8'));
    const stat = readFileSync(`/proc/${other.pid}/stat`, 'utf8');
    written.parent = { pid: other.pid, started: stat.slice(stat.lastIndexOf(')') + 2).split(' ')[19] };
    writeFileSync(join(folder, 'running.json'), JSON.stringify(written));

    expect(() => file.checkUnused()).toThrow(/already running/);
    expect(await file.clearLeftovers()).toEqual([]);
    expect(isAlive(left.pid)).toBe(true);

    other.kill('SIGKILL');
    await until(() => !isAlive(other.pid));
    expect(await file.clearLeftovers()).toHaveLength(1);
    expect(isAlive(left.pid)).toBe(false);
    expect(() => file.checkUnused()).not.toThrow();
  });

  it('takes no notice of a damaged file', async () => {
    writeFileSync(join(folder, 'running.json'), '{"parent":');
    const file = createRunningFile(folder);
    expect(await file.clearLeftovers()).toEqual([]);
    expect(() => file.checkUnused()).not.toThrow();
  });
});
