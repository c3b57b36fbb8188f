import { ByteReader } from './byte-reader.js';
import { type DicomElement, type DicomEncoding, tagText } from './dicom-elements.js';
import { DicomWalk } from './dicom-walk.js';
import { FileRefusal } from './file-refusal.js';
import { KEPT } from './kept-attributes.js';
import { MOST_BYTES } from './limits.js';
import { TRANSFER_SYNTAXES, type TransferSyntax } from './transfer-syntaxes.js';
import { METHOD_CODES, PIXEL_DATA } from './written-attributes.js';

const PREAMBLE = 128;
const META_START = 132;
const TRANSFER_SYNTAX = 0x00020010;

export interface DicomMeta {
  elements: DicomElement[];
  syntax: TransferSyntax;
  syntaxUid: string;
  /** Where the data set begins. */
  end: number;
}

export interface DicomDataSet {
  /** Where its attributes lie: the file itself, or what it unpacked to. */
  bytes: Uint8Array;
  encoding: DicomEncoding;
  elements: DicomElement[];
  /** The first byte after the last attribute. */
  end: number;
}

/** Whether the bytes say that they are DICOM (PS3.10 7.1). */
export const isDicom = (bytes: Uint8Array): boolean => bytes.length >= META_START && new ByteReader(bytes).latin(PREAMBLE, META_START) === 'DICM';

/**
 * The file meta information: explicit little endian whatever follows (PS3.10 7.1).
 * Throws FileRefusal where it is missing, broken, or names an encoding that is not read.
 */
export function readMeta(bytes: Uint8Array): DicomMeta {
  if (bytes.length === 0) throw new FileRefusal('empty', 'The file is empty.');
  if (bytes.length > MOST_BYTES) throw new FileRefusal('too-large', `The file is larger than ${MOST_BYTES / 1024 / 1024} MB.`);
  if (!isDicom(bytes))
    throw new FileRefusal('not-read', 'The file has no DICOM head, so nothing says how it is written. Export it again as a DICOM file.');
  const walk = new DicomWalk(bytes, { explicit: true, bigEndian: false });
  const { elements, end } = walk.elements(META_START, bytes.length, (tag) => Math.floor(tag / 0x10000) === 2);
  const element = elements.find(({ tag }) => tag === TRANSFER_SYNTAX);
  const syntaxUid = element ? textOf(bytes, element) : '';
  if (!syntaxUid) throw new FileRefusal('broken', `The DICOM file does not say how its picture is written: ${tagText(TRANSFER_SYNTAX)} is missing.`);
  const syntax = TRANSFER_SYNTAXES.get(syntaxUid);
  if (!syntax)
    throw new FileRefusal(
      'not-read',
      `The picture is written in a way that is not read here (transfer syntax ${/^[\d.]{1,64}$/.test(syntaxUid) ? syntaxUid : 'unknown'}). Export it without compression.`,
    );
  return { elements, syntax, syntaxUid, end };
}

/**
 * All attributes of a file.
 * @param bytes The data set's bytes: the file's, or what a deflated file unpacked to.
 * @param start Where the data set begins in them.
 * Throws FileRefusal where one of them can't be read; after the picture, what can't be read is left over.
 */
export function readDataSet(bytes: Uint8Array, start: number, syntax: TransferSyntax): DicomDataSet {
  const encoding = { explicit: syntax.explicit, bigEndian: syntax.bigEndian };
  const walk = new DicomWalk(bytes, encoding, isKeptSequence);
  return { bytes, encoding, ...walk.elements(start, bytes.length, () => true, PIXEL_DATA) };
}

const isKeptSequence = (tag: number) => tag === METHOD_CODES || [KEPT, ...nested].some((attributes) => attributes.get(tag)?.items !== undefined);

const nested = [...KEPT.values()].flatMap(({ items }) => (items ? [items] : []));

/** Text without the padding that makes its length even. */
export function textOf(bytes: Uint8Array, element: DicomElement): string {
  const reader = new ByteReader(bytes);
  return reader
    .latin(element.value, Math.min(element.end, element.value + 1024))
    .replace(/[\0 ]+$/, '')
    .trim();
}
