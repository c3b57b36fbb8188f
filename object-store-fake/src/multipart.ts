import { createHash, randomBytes } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { mkdir, readdir, readFile, rename, rm, writeFile, type FileHandle } from 'node:fs/promises';
import { join } from 'node:path';
import { startChecksum, type ChecksumAlgorithm, type Checksums } from './checksums.js';
import { S3Error } from './errors.js';
import { KeyedLock } from './keyed-lock.js';
import { readMetaAt, writeWhole } from './object-file.js';
import { checkKey, type ObjectMeta, type ObjectStore, type WriteConditions } from './store.js';

export interface Upload {
  id: string;
  key: string;
  initiated: string;
  headers: Record<string, string>;
  checksumAlgorithm?: ChecksumAlgorithm;
  checksumType?: 'FULL_OBJECT' | 'COMPOSITE';
}

export interface Part {
  number: number;
  size: number;
  etag: string;
  lastModified: string;
  checksums: Checksums;
}

/** A part as the request to complete names it. */
export interface NamedPart {
  number: number;
  etag: string;
  checksums: Checksums;
}

/** What the request to complete asks for; the checksums are those of the whole object. */
export interface Completion {
  parts: readonly NamedPart[];
  checksums: Checksums;
  conditions: WriteConditions;
}

/** Multipart uploads under way, each a folder beside its bucket's objects. */
export class MultipartUploads {
  private readonly lock = new KeyedLock();

  constructor(
    private readonly store: ObjectStore,
    private readonly minPartBytes: number,
  ) {}

  async create(bucket: string, upload: Omit<Upload, 'id' | 'initiated'>): Promise<Upload> {
    this.store.requireBucket(bucket);
    checkKey(upload.key);
    const begun: Upload = { ...upload, id: randomBytes(24).toString('hex'), initiated: new Date().toISOString() };
    // Filled before it gets its name, so that a folder with a name is always whole.
    const temporary = join(this.store.temporaryFolder, begun.id);
    await mkdir(temporary);
    await writeFile(join(temporary, 'upload.json'), JSON.stringify(begun));
    await mkdir(this.folder(bucket), { recursive: true });
    await rename(temporary, this.folder(bucket, begun.id));
    return begun;
  }

  async find(bucket: string, key: string, id: string): Promise<Upload> {
    this.store.requireBucket(bucket);
    const upload = /^[0-9a-f]{48}$/.test(id) ? await this.read(bucket, id) : undefined;
    if (upload === undefined || upload.key !== key) throw new S3Error('NoSuchUpload', undefined, { UploadId: id });
    return upload;
  }

  async list(bucket: string): Promise<Upload[]> {
    this.store.requireBucket(bucket);
    const ids = await readdir(this.folder(bucket)).catch(() => []);
    const uploads = await Promise.all(ids.map((id) => this.read(bucket, id)));
    return uploads
      .filter((upload) => upload !== undefined)
      .sort((left, right) => Buffer.compare(Buffer.from(left.key + left.initiated), Buffer.from(right.key + right.initiated)));
  }

  async writePart(
    bucket: string,
    upload: Upload,
    number: number,
    fill: (file: FileHandle) => Promise<Part>,
  ): Promise<Part> {
    const target = join(this.folder(bucket, upload.id), `${number}.part`);
    return writeWhole(this.store.temporaryFolder, target, fill, (publish) =>
      this.lock.run(upload.id, async () => {
        // Completed or given up while the part was on its way: the folder must not come back.
        await this.find(bucket, upload.key, upload.id);
        await publish();
      }),
    );
  }

  async parts(bucket: string, id: string): Promise<Part[]> {
    const names = (await readdir(this.folder(bucket, id))).filter((name) => name.endsWith('.part'));
    const parts = await Promise.all(names.map((name) => readMetaAt<Part>(join(this.folder(bucket, id), name))));
    return parts.filter((part) => part !== undefined).sort((left, right) => left.number - right.number);
  }

  async abort(bucket: string, key: string, id: string): Promise<void> {
    await this.lock.run(id, async () => {
      await this.find(bucket, key, id);
      await this.remove(bucket, id);
    });
  }

  async complete(bucket: string, key: string, id: string, wanted: Completion): Promise<ObjectMeta> {
    return this.lock.run(id, async () => {
      const upload = await this.find(bucket, key, id);
      const parts = this.chosenParts(await this.parts(bucket, id), wanted.parts);
      const meta = await this.store.write(bucket, key, wanted.conditions, async (file) => {
        const joined = await joinParts(this.folder(bucket, id), upload, parts, file);
        checkWhole(wanted.checksums, joined.checksums);
        return joined;
      });
      await this.remove(bucket, id);
      return meta;
    });
  }

  private chosenParts(present: readonly Part[], named: readonly NamedPart[]): Part[] {
    const byNumber = new Map(present.map((part) => [part.number, part]));
    if (named.some((part, index) => part.number <= (named[index - 1]?.number ?? 0))) throw new S3Error('InvalidPartOrder');
    return named.map((wanted, index) => {
      const part = byNumber.get(wanted.number);
      const details = { PartNumber: String(wanted.number), ETag: wanted.etag };
      if (part === undefined || part.etag !== wanted.etag) throw new S3Error('InvalidPart', undefined, details);
      for (const [algorithm, value] of Object.entries(wanted.checksums)) {
        const kept = part.checksums[algorithm as ChecksumAlgorithm];
        if (kept !== undefined && kept !== value) throw new S3Error('InvalidPart', undefined, details);
      }
      if (index < named.length - 1 && part.size < this.minPartBytes) {
        throw new S3Error('EntityTooSmall', undefined, {
          ...details,
          ProposedSize: String(part.size),
          MinSizeAllowed: String(this.minPartBytes),
        });
      }
      return part;
    });
  }

  // Out of the way by one rename first, so that a crash can't leave half a folder.
  private async remove(bucket: string, id: string): Promise<void> {
    const temporary = join(this.store.temporaryFolder, `${id}-removed`);
    await rename(this.folder(bucket, id), temporary);
    await rm(temporary, { recursive: true, force: true });
  }

  private async read(bucket: string, id: string): Promise<Upload | undefined> {
    const text = await readFile(join(this.folder(bucket, id), 'upload.json'), 'utf8').catch(() => undefined);
    return text === undefined ? undefined : (JSON.parse(text) as Upload);
  }

  private folder(bucket: string, id = ''): string {
    return join(this.store.bucketFolder(bucket), 'uploads', id);
  }
}

async function joinParts(
  folder: string,
  upload: Upload,
  parts: readonly Part[],
  file: FileHandle,
): Promise<ObjectMeta> {
  const whole =
    upload.checksumType === 'FULL_OBJECT' && upload.checksumAlgorithm !== undefined
      ? startChecksum(upload.checksumAlgorithm)
      : undefined;
  let size = 0;
  for (const part of parts) {
    if (part.size === 0) continue;
    const source = createReadStream(join(folder, `${part.number}.part`), { end: part.size - 1 });
    for await (const piece of source as AsyncIterable<Buffer>) {
      whole?.update(piece);
      await file.write(piece, 0, piece.length, size);
      size += piece.length;
    }
  }
  const digests = createHash('md5').update(Buffer.concat(parts.map((part) => Buffer.from(part.etag, 'hex'))));
  return {
    key: upload.key,
    size,
    etag: `${digests.digest('hex')}-${parts.length}`,
    lastModified: new Date().toISOString(),
    headers: upload.headers,
    checksums:
      whole !== undefined && upload.checksumAlgorithm !== undefined
        ? { [upload.checksumAlgorithm]: whole.digest().toString('base64') }
        : compositeChecksum(upload.checksumAlgorithm, parts),
    ...(upload.checksumType === undefined ? {} : { checksumType: upload.checksumType }),
  };
}

function checkWhole(expected: Checksums, computed: Checksums): void {
  for (const [name, value] of Object.entries(expected)) {
    const algorithm = name as ChecksumAlgorithm;
    // Not computed when the upload was begun with another algorithm, or with none.
    if (computed[algorithm] === undefined) {
      throw new S3Error('InvalidRequest', `The upload was not created with a complete ${name.toUpperCase()} checksum.`);
    }
    if (computed[algorithm] !== value) {
      throw new S3Error('BadDigest', `The ${name.toUpperCase()} you specified did not match the calculated checksum.`);
    }
  }
}

/** The checksum of the parts' checksums; none unless every part has one. */
function compositeChecksum(algorithm: ChecksumAlgorithm | undefined, parts: readonly Part[]): Checksums {
  if (algorithm === undefined) return {};
  const values = parts.map((part) => part.checksums[algorithm]);
  if (!values.every((value) => value !== undefined)) return {};
  const checksum = startChecksum(algorithm);
  for (const value of values) checksum.update(Buffer.from(value, 'base64'));
  return { [algorithm]: `${checksum.digest().toString('base64')}-${parts.length}` };
}
