import { randomUUID } from 'node:crypto';
import { mkdir, open, rename, rm, type FileHandle } from 'node:fs/promises';
import { dirname, join } from 'node:path';

/*
 * One file holds the data, then what is known of it as JSON, then the JSON's length and a mark.
 * With both in one file a single rename makes an object appear, whole, or not at all.
 */
const MARK = Buffer.from('kfobj001', 'latin1');
const TAIL_BYTES = 4 + MARK.length;

/** Writes a file under a temporary name; it gets its own name only after `publish`, and nothing is left of a failure. */
export async function writeWhole<T extends { size: number }>(
  temporaryFolder: string,
  target: string,
  fill: (file: FileHandle) => Promise<T>,
  publish: (rename: () => Promise<void>, meta: T) => Promise<void>,
): Promise<T> {
  const temporary = join(temporaryFolder, randomUUID());
  const file = await open(temporary, 'wx');
  try {
    const meta = await fill(file);
    await appendMeta(file, meta);
    await file.datasync();
    await file.close();
    await publish(async () => {
      await mkdir(dirname(target), { recursive: true });
      await rename(temporary, target);
    }, meta);
    return meta;
  } catch (error) {
    await file.close().catch(() => undefined);
    await rm(temporary, { force: true });
    throw error;
  }
}

async function appendMeta(file: FileHandle, meta: { size: number }): Promise<void> {
  const json = Buffer.from(JSON.stringify(meta));
  const length = Buffer.alloc(4);
  length.writeUInt32BE(json.length);
  await file.write(Buffer.concat([json, length, MARK]), 0, undefined, meta.size);
}

/** What is known of the data in the file; undefined when the file isn't one of ours. */
export async function readMeta<T extends { size: number }>(file: FileHandle): Promise<T | undefined> {
  const { size } = await file.stat();
  if (size < TAIL_BYTES) return undefined;
  const tail = Buffer.alloc(TAIL_BYTES);
  await file.read(tail, 0, TAIL_BYTES, size - TAIL_BYTES);
  const length = tail.readUInt32BE(0);
  if (!tail.subarray(4).equals(MARK) || length > size - TAIL_BYTES) return undefined;
  const json = Buffer.alloc(length);
  await file.read(json, 0, length, size - TAIL_BYTES - length);
  const meta = JSON.parse(json.toString('utf8')) as T;
  return meta.size === size - TAIL_BYTES - length ? meta : undefined;
}

export async function readMetaAt<T extends { size: number }>(path: string): Promise<T | undefined> {
  const file = await open(path, 'r');
  try {
    return await readMeta<T>(file);
  } finally {
    await file.close();
  }
}
