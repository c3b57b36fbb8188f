import { ByteReader } from './byte-reader.js';
import { type DicomElement, type DicomEncoding, tagText } from './dicom-elements.js';
import { FileRefusal } from './file-refusal.js';
import { DEEPEST, MOST_ELEMENTS } from './limits.js';

const UNDEFINED = 0xffffffff;
const ITEM = 0xfffee000;
const ITEM_END = 0xfffee00d;
const SEQUENCE_END = 0xfffee0dd;
// PS3.5 table 7.1-1: two reserved bytes and a length of four bytes
const LONG_VRS = new Set(['OB', 'OD', 'OF', 'OL', 'OV', 'OW', 'SQ', 'SV', 'UC', 'UN', 'UR', 'UT', 'UV']);
const SHORT_VRS = new Set([
  'AE',
  'AS',
  'AT',
  'CS',
  'DA',
  'DS',
  'DT',
  'FD',
  'FL',
  'IS',
  'LO',
  'LT',
  'PN',
  'SH',
  'SL',
  'SS',
  'ST',
  'TM',
  'UI',
  'UL',
  'US',
]);
const PIXEL_VRS = new Set(['OB', 'OW']);

export interface WalkedElements {
  elements: DicomElement[];
  /** The first byte that belongs to no attribute. */
  end: number;
}

export interface WalkLimits {
  /** Attributes that may still be read, over all levels. */
  left: number;
}

/** Tells of an implicitly encoded attribute with a length whether it is a sequence. */
export type IsSequence = (tag: number) => boolean;

/**
 * Walks a DICOM data set (PS3.5 section 7) without reading values: every attribute must lie within the bytes
 * that are there, and in the one that holds it. The work is bounded by MOST_ELEMENTS and DEEPEST.
 * Throws FileRefusal with the tag at fault.
 */
export class DicomWalk {
  private readonly reader: ByteReader;

  constructor(
    bytes: Uint8Array,
    private readonly encoding: DicomEncoding,
    private readonly isSequence: IsSequence = () => false,
    private readonly limits: WalkLimits = { left: MOST_ELEMENTS },
  ) {
    this.reader = new ByteReader(bytes, encoding.bigEndian);
  }

  /**
   * The attributes from `start` to `end`, or to the first that `goesOn` does not want.
   * @param lenientAfter Once this tag was read, what can't be read any more is left over instead of refused.
   */
  elements(start: number, end: number, goesOn: (tag: number) => boolean = () => true, lenientAfter = UNDEFINED): WalkedElements {
    const elements: DicomElement[] = [];
    let at = start;
    let lenient = false;
    while (at < end && (at + 8 > end || goesOn(this.tagAt(at)))) {
      try {
        const element = this.element(at, end, 0);
        elements.push(element);
        at = element.end;
        lenient ||= element.tag === lenientAfter;
      } catch (error) {
        if (lenient && error instanceof FileRefusal) break;
        throw error;
      }
    }
    return { elements, end: at };
  }

  private tagAt(at: number): number {
    return this.reader.u16(at) * 0x10000 + this.reader.u16(at + 2);
  }

  private element(at: number, end: number, depth: number): DicomElement {
    if (this.limits.left-- <= 0) throw new FileRefusal('too-large', `The DICOM file holds more than ${MOST_ELEMENTS} attributes.`);
    const head = this.head(at, end);
    if (head.length !== UNDEFINED) {
      if (head.value + head.length > end) throw cutOff(head.tag);
      const element = { tag: head.tag, vr: head.vr, at, value: head.value, end: head.value + head.length };
      const nested = head.vr === 'SQ' || (head.vr === '' && this.isSequence(head.tag));
      return nested ? { ...element, items: this.items(head.value, element.end, depth + 1, head.tag, false).items } : element;
    }
    if (PIXEL_VRS.has(head.vr)) return { ...head, at, ...this.pieces(head.value, end, head.tag) };
    // PS3.5 6.2.2: unknown contents of undefined length are implicit little endian
    const inside = head.vr === 'UN' ? new DicomWalk(this.reader.bytes, { explicit: false, bigEndian: false }, this.isSequence, this.limits) : this;
    if (head.vr !== 'SQ' && head.vr !== 'UN' && head.vr !== '') throw broken(head.tag, 'has no length');
    const { items, end: after } = inside.items(head.value, end, depth + 1, head.tag, true);
    return { tag: head.tag, vr: head.vr, at, value: head.value, end: after, items };
  }

  private head(at: number, end: number): { tag: number; vr: string; value: number; length: number } {
    if (at + 8 > end) throw cutOff();
    const tag = this.tagAt(at);
    if (tag >= ITEM && tag <= SEQUENCE_END) throw broken(tag, 'stands where an attribute belongs');
    if (!this.encoding.explicit) return { tag, vr: '', value: at + 8, length: this.reader.u32(at + 4) };
    const vr = this.reader.latin(at + 4, at + 6);
    if (SHORT_VRS.has(vr)) return { tag, vr, value: at + 8, length: this.reader.u16(at + 6) };
    if (!LONG_VRS.has(vr)) throw broken(tag, 'has a value representation that the standard does not know');
    if (at + 12 > end) throw cutOff(tag);
    return { tag, vr, value: at + 12, length: this.reader.u32(at + 8) };
  }

  private items(start: number, end: number, depth: number, tag: number, delimited: boolean): { items: DicomElement[][]; end: number } {
    if (depth > DEEPEST) throw new FileRefusal('broken', `The attribute ${tagText(tag)} nests more than ${DEEPEST} sequences.`);
    const items: DicomElement[][] = [];
    let at = start;
    for (;;) {
      if (at === end && !delimited) return { items, end: at };
      const mark = this.mark(at, end, tag);
      if (mark.tag === SEQUENCE_END && delimited) return { items, end: at + 8 };
      if (mark.tag !== ITEM) throw broken(tag, 'holds something that is no item');
      const item = this.item(at + 8, mark.length, end, depth, tag);
      items.push(item.elements);
      at = item.end;
    }
  }

  private item(start: number, length: number, end: number, depth: number, tag: number): WalkedElements {
    const stop = length === UNDEFINED ? end : start + length;
    if (stop > end) throw cutOff(tag);
    const elements: DicomElement[] = [];
    let at = start;
    for (;;) {
      if (length !== UNDEFINED && at === stop) return { elements, end: at };
      if (length === UNDEFINED && at + 8 <= stop && this.tagAt(at) === ITEM_END) return { elements, end: at + 8 };
      const element = this.element(at, stop, depth);
      elements.push(element);
      at = element.end;
    }
  }

  /** PS3.5 A.4: the pieces of a compressed picture, each whole, then the end of the sequence. */
  private pieces(start: number, end: number, tag: number): Pick<DicomElement, 'pieces' | 'end'> {
    const pieces: { at: number; end: number }[] = [];
    let at = start;
    for (;;) {
      const mark = this.mark(at, end, tag);
      if (mark.tag === SEQUENCE_END) return { pieces, end: at + 8 };
      if (mark.tag !== ITEM || mark.length === UNDEFINED) throw broken(tag, 'holds a picture whose pieces can not be told apart');
      if (at + 8 + mark.length > end) throw cutOff(tag);
      pieces.push({ at: at + 8, end: at + 8 + mark.length });
      at += 8 + mark.length;
    }
  }

  private mark(at: number, end: number, tag: number): { tag: number; length: number } {
    if (this.limits.left-- <= 0) throw new FileRefusal('too-large', `The DICOM file holds more than ${MOST_ELEMENTS} attributes.`);
    if (at + 8 > end) throw cutOff(tag);
    return { tag: this.tagAt(at), length: this.reader.u32(at + 4) };
  }
}

function cutOff(tag?: number): FileRefusal {
  const where = tag === undefined ? 'between two attributes' : `in the attribute ${tagText(tag)}`;
  return new FileRefusal('cut-off', `The DICOM file is cut off ${where}: a part of it is missing.`);
}

const broken = (tag: number, what: string) => new FileRefusal('broken', `The DICOM file is broken: ${tagText(tag)} ${what}.`);
