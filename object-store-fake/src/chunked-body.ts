import { createHash, type Hash } from 'node:crypto';
import { signaturesMatch } from './authentication.js';
import { S3Error } from './errors.js';
import { hmac, sha256Hex } from './signature.js';

/** The running start of a chain of chunk signatures; absent for unsigned chunks. */
export interface ChunkSigning {
  key: Buffer;
  timestamp: string;
  scope: string;
  seedSignature: string;
}

const MAX_LINE_BYTES = 4096;
const EMPTY_SHA256 = sha256Hex('');

/**
 * Takes the `aws-chunked` framing off a body, checks each chunk's signature where there is one,
 * and keeps the trailing headers.
 */
export class ChunkedBodyDecoder {
  readonly trailers = new Map<string, string>();
  private state: 'size' | 'data' | 'data-end' | 'trailer' | 'done' = 'size';
  private line: Buffer = Buffer.alloc(0);
  private remaining = 0;
  private announcedSignature = '';
  private previousSignature: string;
  private hash: Hash | undefined;

  constructor(
    private readonly signing: ChunkSigning | undefined,
    private readonly withTrailers: boolean,
  ) {
    this.previousSignature = signing?.seedSignature ?? '';
  }

  /** Yields the pieces of payload found in the next piece of the body. */
  *push(piece: Buffer): Generator<Buffer> {
    let rest = piece;
    while (rest.length > 0) {
      if (this.state === 'data') {
        const data = rest.subarray(0, this.remaining);
        rest = rest.subarray(data.length);
        this.remaining -= data.length;
        this.hash?.update(data);
        yield data;
        if (this.remaining === 0) this.endChunk('data-end');
        continue;
      }
      const end = rest.indexOf(0x0a);
      this.line = Buffer.concat([this.line, end < 0 ? rest : rest.subarray(0, end)]);
      if (this.line.length > MAX_LINE_BYTES) throw new S3Error('IncompleteBody', 'A chunk header is too long');
      if (end < 0) return;
      rest = rest.subarray(end + 1);
      const line = this.line.toString('latin1').replace(/\r$/, '');
      this.line = Buffer.alloc(0);
      this.acceptLine(line);
    }
  }

  /** To be called when the body has ended: refuses one that was cut off. */
  finish(): void {
    if (this.state !== 'done') throw new S3Error('IncompleteBody');
  }

  private acceptLine(line: string): void {
    switch (this.state) {
      case 'size':
        this.startChunk(line);
        return;
      case 'data-end':
        if (line !== '') throw new S3Error('IncompleteBody', 'A chunk is longer than it says');
        this.state = 'size';
        return;
      case 'trailer':
        if (line === '') this.endTrailers();
        else this.acceptTrailer(line);
        return;
      default:
        throw new S3Error('IncompleteBody', 'The body goes on after its last chunk');
    }
  }

  private startChunk(line: string): void {
    const match = /^([0-9a-f]{1,10})(?:;chunk-signature=([0-9a-f]{64}))?$/i.exec(line);
    if (match === null) throw new S3Error('IncompleteBody', 'A chunk does not start with its size');
    this.remaining = Number.parseInt(match[1] ?? '', 16);
    this.announcedSignature = match[2] ?? '';
    this.hash = this.signing === undefined ? undefined : createHash('sha256');
    this.state = 'data';
    if (this.remaining === 0) this.endChunk('trailer');
  }

  private endChunk(next: 'data-end' | 'trailer'): void {
    if (this.hash !== undefined) {
      this.checkLink('AWS4-HMAC-SHA256-PAYLOAD', [EMPTY_SHA256, this.hash.digest('hex')], this.announcedSignature);
    }
    this.state = next;
  }

  private acceptTrailer(line: string): void {
    const at = line.indexOf(':');
    if (!this.withTrailers || at < 1) throw new S3Error('MalformedTrailerError');
    this.trailers.set(line.slice(0, at).trim().toLowerCase(), line.slice(at + 1).trim());
  }

  private endTrailers(): void {
    const given = this.trailers.get('x-amz-trailer-signature');
    this.trailers.delete('x-amz-trailer-signature');
    if (this.signing !== undefined && this.withTrailers) {
      const lines = [...this.trailers].map(([name, value]) => `${name}:${value}\n`).sort();
      this.checkLink('AWS4-HMAC-SHA256-TRAILER', [sha256Hex(lines.join(''))], given ?? '');
    }
    this.state = 'done';
  }

  // Every signature covers the one before, so chunks can't be left out or put in another order.
  private checkLink(kind: string, hashes: string[], given: string): void {
    if (this.signing === undefined) return;
    const { key, timestamp, scope } = this.signing;
    const text = [kind, timestamp, scope, this.previousSignature, ...hashes].join('\n');
    const computed = hmac(key, text).toString('hex');
    if (!signaturesMatch(computed, given)) {
      throw new S3Error('SignatureDoesNotMatch', undefined, { SignatureProvided: given, StringToSign: text });
    }
    this.previousSignature = computed;
  }
}
