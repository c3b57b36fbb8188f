import { execFile, execFileSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { mkdtempSync, readdirSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { promisify } from 'node:util';

export interface DumpedLine {
  /** '0010,0010'. */
  tag: string;
  vr: string;
  value: string;
}

const EMPTY = '(no value available)';
const run = promisify(execFile);

/** What dcmtk's dcmdump finds in files, on all levels. */
export function dcmdump(...paths: string[]): DumpedLine[][] {
  const text = execFileSync('dcmdump', ['--quiet', '--print-all', '--load-short', '--print-filename', ...paths], {
    encoding: 'latin1',
    maxBuffer: 256 * 1024 * 1024,
  });
  const files = text.split(/^# .*dcmdump \(\d+\/\d+\).*$/m).slice(1);
  if (files.length !== paths.length) throw new Error(`dcmdump read ${files.length} of ${paths.length} files`);
  return files.map((file) => file.split('\n').flatMap(dumpedLine));
}

function dumpedLine(line: string): DumpedLine[] {
  const match = /^\s*\(([0-9a-f]{4},[0-9a-f]{4})\) (\S\S) (.*?)\s+#\s/.exec(line);
  return match ? [{ tag: match[1]!, vr: match[2]!, value: match[3] === EMPTY ? '' : match[3]! }] : [];
}

/** Hashes of all pictures of each file as dcmtk draws them; null for those that it does not read. */
export async function drawnByDcmtk(paths: string[]): Promise<(string | null)[]> {
  const drawn: (string | null)[] = [];
  const waiting = paths.entries();
  const drawRest = async () => {
    for (const [i, path] of waiting) drawn[i] = (await drawnBy('dcmj2pnm', path)) ?? (await drawnBy('dcml2pnm', path));
  };
  await Promise.all([drawRest(), drawRest()]);
  return drawn;
}

async function drawnBy(tool: string, path: string): Promise<string | null> {
  const folder = mkdtempSync(join(tmpdir(), 'drawn-'));
  try {
    await run(tool, ['--quiet', '--all-frames', '--write-raw-pnm', path, join(folder, 'frame')], { timeout: 30_000 });
    const hash = createHash('sha256');
    for (const name of readdirSync(folder).sort()) hash.update(readFileSync(join(folder, name)));
    return hash.digest('hex');
  } catch {
    return null;
  } finally {
    rmSync(folder, { recursive: true });
  }
}

/** The script runs beside the test, since the decoders are WebAssembly that the test's own loader does not read. */
const DRAW = `
const { createHash } = require('node:crypto');
const { readFileSync } = require('node:fs');
const load = require('node:module').createRequire(process.cwd() + '/package.json');
load('dcmjs').log.disableAll();
const write = process.stdout.write.bind(process.stdout);
for (const name of ['log', 'info', 'warn', 'error', 'debug']) console[name] = () => {};
const { DicomImage, NativePixelDecoder } = load('dcmjs-imaging');
const hashOf = (path) => {
  const file = readFileSync(path);
  const image = new DicomImage(file.buffer.slice(file.byteOffset, file.byteOffset + file.length));
  const hash = createHash('sha256');
  for (let frame = 0; frame < image.getNumberOfFrames(); frame++) hash.update(Buffer.from(image.render({ frame, renderOverlays: false }).pixels));
  return hash.digest('hex');
};
NativePixelDecoder.initializeAsync().then(() => {
  const hashes = JSON.parse(readFileSync(0, 'utf8')).map((path) => { try { return hashOf(path); } catch { return null; } });
  write(JSON.stringify(hashes));
});
`;

/** A hash of all pictures of each file as dcmjs-imaging draws them; null for those that it does not read. */
export async function drawnByDcmjs(paths: string[]): Promise<(string | null)[]> {
  const running = run(process.execPath, ['-e', DRAW], { maxBuffer: 16 * 1024 * 1024, timeout: 120_000 });
  running.child.stdin!.end(JSON.stringify(paths));
  return JSON.parse((await running).stdout) as (string | null)[];
}
