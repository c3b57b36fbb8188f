import { createHash } from 'node:crypto';
import type { FileHandle } from 'node:fs/promises';
import type { Authenticated } from './authentication.js';
import {
  CHECKSUM_BYTES,
  isChecksumAlgorithm,
  startChecksum,
  type ChecksumAlgorithm,
  type Checksums,
  type RunningChecksum,
} from './checksums.js';
import { ChunkedBodyDecoder } from './chunked-body.js';
import { S3Error } from './errors.js';
import type { S3Call } from './s3-call.js';

export interface ReceivedBody {
  size: number;
  md5: string;
  checksums: Checksums;
}

type Sink = (data: Buffer) => Promise<void> | void;

/** Writes the body to the start of a file and checks it against everything the request says of it. */
export async function receiveIntoFile(call: S3Call, file: FileHandle, maxBytes: number): Promise<ReceivedBody> {
  let position = 0;
  return receive(call, maxBytes, async (data) => {
    await file.write(data, 0, data.length, position);
    position += data.length;
  });
}

/** The body as text, for the operations that take a small XML document. */
export async function receiveText(call: S3Call, maxBytes: number, expected = namedChecksums(call)): Promise<string> {
  const pieces: Buffer[] = [];
  await receive(call, maxBytes, (data) => void pieces.push(data), expected);
  return Buffer.concat(pieces).toString('utf8');
}

async function receive(
  call: S3Call,
  maxBytes: number,
  sink: Sink,
  expected = namedChecksums(call),
): Promise<ReceivedBody> {
  const payloadHash = authenticated(call).payloadHash;
  const decoder = chunkDecoder(call, payloadHash);
  const announced = announcedLength(call, decoder !== undefined);
  if (announced > maxBytes) throw tooLarge(announced, maxBytes);
  const trailerAlgorithm = announcedTrailer(call, decoder);
  const running = startAll([...Object.keys(expected).filter(isChecksumAlgorithm), trailerAlgorithm]);
  const md5 = createHash('md5');
  const sha256 = createHash('sha256');
  let size = 0;
  // The stream must outlive a refusal, or the client would see a broken connection in place of the answer.
  for await (const piece of call.request.iterator({ destroyOnReturn: false }) as AsyncIterable<Buffer>) {
    for (const data of decoder === undefined ? [piece] : decoder.push(piece)) {
      size += data.length;
      if (size > maxBytes) throw tooLarge(size, maxBytes);
      md5.update(data);
      if (decoder === undefined) sha256.update(data);
      for (const checksum of running.values()) checksum.update(data);
      await sink(data);
    }
  }
  decoder?.finish();
  if (size !== announced) throw new S3Error('IncompleteBody');
  if (trailerAlgorithm !== undefined) expected[trailerAlgorithm] = trailerChecksum(decoder, trailerAlgorithm);
  const digest = md5.digest();
  checkContentMd5(call, digest);
  if (decoder === undefined) checkPayloadHash(payloadHash, sha256.digest('hex'));
  return { size, md5: digest.toString('hex'), checksums: checkChecksums(expected, running) };
}

function authenticated(call: S3Call): Authenticated {
  if (call.authenticated === undefined) throw new Error('the signature must be checked before the body');
  return call.authenticated;
}

function chunkDecoder(call: S3Call, payloadHash: string): ChunkedBodyDecoder | undefined {
  if (!payloadHash.startsWith('STREAMING-')) return undefined;
  const { key, timestamp, scope, signature } = authenticated(call);
  const signing = payloadHash.startsWith('STREAMING-AWS4-')
    ? { key, timestamp, scope, seedSignature: signature }
    : undefined;
  return new ChunkedBodyDecoder(signing, payloadHash.endsWith('-TRAILER'));
}

function announcedLength(call: S3Call, chunked: boolean): number {
  const text = chunked ? call.header('x-amz-decoded-content-length') : call.header('content-length');
  if (text === undefined || !/^\d{1,15}$/.test(text)) throw new S3Error('MissingContentLength');
  return Number(text);
}

function tooLarge(size: number, maxBytes: number): S3Error {
  return new S3Error('EntityTooLarge', undefined, { ProposedSize: String(size), MaxSizeAllowed: String(maxBytes) });
}

function announcedTrailer(call: S3Call, decoder: ChunkedBodyDecoder | undefined): ChecksumAlgorithm | undefined {
  const name = call.header('x-amz-trailer');
  if (name === undefined || decoder === undefined) return undefined;
  const algorithm = name.trim().toLowerCase().replace(/^x-amz-checksum-/, '');
  if (!isChecksumAlgorithm(algorithm)) {
    throw new S3Error('InvalidRequest', 'The value specified in the x-amz-trailer header is not supported');
  }
  return algorithm;
}

function trailerChecksum(decoder: ChunkedBodyDecoder | undefined, algorithm: ChecksumAlgorithm): string {
  const name = `x-amz-checksum-${algorithm}`;
  const value = decoder?.trailers.get(name);
  if (value === undefined || decoder?.trailers.size !== 1) throw new S3Error('MalformedTrailerError');
  return checkedValue(algorithm, value);
}

/** The checksums in the request's headers. */
function namedChecksums(call: S3Call): Checksums {
  const expected = checksumHeaders(call);
  for (const [algorithm, value] of Object.entries(expected)) checkedValue(algorithm as ChecksumAlgorithm, value);
  return expected;
}

/** The same as they stand; that of an object put together from parts ends in '-' and their number. */
export function checksumHeaders(call: S3Call): Checksums {
  const found: Checksums = {};
  for (const [name, value] of call.headersStarting('x-amz-checksum-')) {
    const algorithm = name.slice('x-amz-checksum-'.length);
    if (isChecksumAlgorithm(algorithm)) found[algorithm] = value;
  }
  return found;
}

function checkedValue(algorithm: ChecksumAlgorithm, value: string): string {
  const bytes = Buffer.from(value, 'base64');
  if (bytes.length !== CHECKSUM_BYTES[algorithm] || bytes.toString('base64') !== value) {
    throw new S3Error('InvalidRequest', `Value for x-amz-checksum-${algorithm} header is invalid.`);
  }
  return value;
}

function startAll(algorithms: (ChecksumAlgorithm | undefined)[]): Map<ChecksumAlgorithm, RunningChecksum> {
  const named = algorithms.filter((algorithm) => algorithm !== undefined);
  return new Map(named.map((algorithm) => [algorithm, startChecksum(algorithm)]));
}

function checkContentMd5(call: S3Call, digest: Buffer): void {
  const given = call.header('content-md5');
  if (given === undefined) return;
  const bytes = Buffer.from(given, 'base64');
  if (bytes.length !== 16 || bytes.toString('base64') !== given) throw new S3Error('InvalidDigest');
  if (bytes.equals(digest)) return;
  throw new S3Error('BadDigest', 'The Content-MD5 you specified did not match what we received.', {
    ExpectedDigest: given,
    CalculatedDigest: digest.toString('base64'),
  });
}

function checkPayloadHash(given: string, computed: string): void {
  if (given === 'UNSIGNED-PAYLOAD' || given === computed) return;
  throw new S3Error('XAmzContentSHA256Mismatch', undefined, {
    ClientComputedContentSHA256: given,
    S3ComputedContentSHA256: computed,
  });
}

function checkChecksums(expected: Checksums, running: Map<ChecksumAlgorithm, RunningChecksum>): Checksums {
  for (const [algorithm, checksum] of running) {
    if (checksum.digest().toString('base64') !== expected[algorithm]) {
      const name = algorithm.toUpperCase();
      throw new S3Error('BadDigest', `The ${name} you specified did not match the calculated checksum.`);
    }
  }
  return expected;
}
