/** Why a DICOM file is not read, decided before any decoder sees it. */
export type DicomFault = 'cut-off' | 'broken' | 'too-large' | 'no-picture' | 'frames' | 'not-read';

export class DicomRefusal extends Error {
  constructor(
    readonly fault: DicomFault,
    /** Pictures in the file, where that is the fault. */
    readonly frames = 0,
  ) {
    super(fault);
  }
}

export interface DicomElement {
  /** Group and element in one number. */
  tag: number;
  vr: string;
  /** Where its value begins. */
  value: number;
  /** UNDEFINED where a delimiter ends it. */
  length: number;
}

export interface Encoding {
  explicit: boolean;
  bigEndian: boolean;
}

export const UNDEFINED = 0xffffffff;
export const ITEM = 0xfffee000;
const ITEM_END = 0xfffee00d;
export const SEQUENCE_END = 0xfffee0dd;
// PS3.5 table 7.1-1: two reserved bytes and a length of four bytes
const LONG_VRS = new Set(['OB', 'OD', 'OF', 'OL', 'OV', 'OW', 'SQ', 'SV', 'UC', 'UN', 'UR', 'UT', 'UV']);
const DEEPEST = 64;
// a file of nothing but empty elements must not hold everybody up
const MOST_ELEMENTS = 200_000;

/**
 * Walks the elements of a data set (PS3.5 section 7) without reading their values. Each must lie within the
 * bytes that are there: decoders show what they have, so a film cut off half-way would look like one with a
 * black half.
 */
export class DicomElements {
  constructor(
    readonly bytes: Buffer,
    private readonly encoding: Encoding,
    private readonly budget = { left: MOST_ELEMENTS },
  ) {}

  /** The element at `at`; throws where its head or its value overruns the bytes. */
  read(at: number): DicomElement {
    if (this.budget.left-- <= 0) throw new DicomRefusal('broken');
    const tag = this.u16(at) * 0x10000 + this.u16(at + 2);
    // items and delimiters have no VR in any encoding
    if (!this.encoding.explicit || tag >= ITEM) return this.checked({ tag, vr: '', value: at + 8, length: this.u32(at + 4) });
    this.need(at, 8);
    const vr = this.bytes.toString('latin1', at + 4, at + 6);
    if (!/^[A-Z]{2}$/.test(vr)) throw new DicomRefusal('broken');
    if (LONG_VRS.has(vr)) return this.checked({ tag, vr, value: at + 12, length: this.u32(at + 8) });
    return this.checked({ tag, vr, value: at + 8, length: this.u16(at + 6) });
  }

  /** Where the element after this one begins. */
  after(element: DicomElement, depth = 0): number {
    if (element.length !== UNDEFINED) return element.value + element.length;
    if (depth > DEEPEST) throw new DicomRefusal('broken');
    // PS3.5 6.2.2: unknown contents of undefined length are implicit little endian
    const inside = element.vr === 'UN' ? new DicomElements(this.bytes, { explicit: false, bigEndian: false }, this.budget) : this;
    return inside.afterItems(element.value, depth);
  }

  number(element: DicomElement): number {
    return element.length >= 2 ? this.u16(element.value) : 0;
  }

  text(element: DicomElement): string {
    return this.bytes.toString('latin1', element.value, element.value + element.length).replace(/[\0 ]+$/, '').trim();
  }

  private afterItems(start: number, depth: number): number {
    let at = start;
    for (;;) {
      const item = this.read(at);
      if (item.tag === SEQUENCE_END) return item.value;
      if (item.tag !== ITEM) throw new DicomRefusal('broken');
      at = item.length === UNDEFINED ? this.afterItem(item.value, depth) : item.value + item.length;
    }
  }

  private afterItem(start: number, depth: number): number {
    let at = start;
    for (;;) {
      const element = this.read(at);
      if (element.tag === ITEM_END) return element.value;
      at = this.after(element, depth + 1);
    }
  }

  private checked(element: DicomElement): DicomElement {
    if (element.length !== UNDEFINED) this.need(element.value, element.length);
    return element;
  }

  private need(at: number, length: number): void {
    if (at + length > this.bytes.length) throw new DicomRefusal('cut-off');
  }

  private u16(at: number): number {
    this.need(at, 2);
    return this.encoding.bigEndian ? this.bytes.readUInt16BE(at) : this.bytes.readUInt16LE(at);
  }

  private u32(at: number): number {
    this.need(at, 4);
    return this.encoding.bigEndian ? this.bytes.readUInt32BE(at) : this.bytes.readUInt32LE(at);
  }
}
