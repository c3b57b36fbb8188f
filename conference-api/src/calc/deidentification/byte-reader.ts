import { FileRefusal } from './file-refusal.js';

/** Reads numbers and text out of bytes that may end anywhere: whatever lies outside is 'cut off'. */
export class ByteReader {
  /** Never Node's Buffer, whose slices are no copies. */
  readonly bytes: Uint8Array;
  private readonly view: DataView;

  constructor(
    bytes: Uint8Array,
    readonly bigEndian = false,
  ) {
    this.bytes = new Uint8Array(bytes.buffer, bytes.byteOffset, bytes.byteLength);
    this.view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  }

  get length(): number {
    return this.bytes.length;
  }

  /** Throws FileRefusal unless `length` bytes are there from `at`. */
  need(at: number, length: number): void {
    if (at < 0 || length < 0 || at + length > this.bytes.length) throw new FileRefusal('cut-off', 'The file is cut off: a part of it is missing.');
  }

  u8(at: number): number {
    this.need(at, 1);
    return this.view.getUint8(at);
  }

  u16(at: number): number {
    this.need(at, 2);
    return this.view.getUint16(at, !this.bigEndian);
  }

  /** Whatever the order of this reader. */
  u16be(at: number): number {
    this.need(at, 2);
    return this.view.getUint16(at);
  }

  u32be(at: number): number {
    this.need(at, 4);
    return this.view.getUint32(at);
  }

  s16(at: number): number {
    this.need(at, 2);
    return this.view.getInt16(at, !this.bigEndian);
  }

  u32(at: number): number {
    this.need(at, 4);
    return this.view.getUint32(at, !this.bigEndian);
  }

  /** One character a byte. */
  latin(at: number, end: number): string {
    this.need(at, end - at);
    let text = '';
    for (let i = at; i < end; i++) text += String.fromCharCode(this.bytes[i]!);
    return text;
  }

  /** A view of the bytes, not a copy. */
  span(at: number, end: number): Uint8Array {
    this.need(at, end - at);
    return this.bytes.subarray(at, end);
  }
}
