import { DicomRefusal } from './dicom-elements.js';

/** What the data set says of its picture. */
export interface StatedPicture {
  rows: number;
  columns: number;
  samples: number;
  bits: number;
}

type Size = { rows: number; columns: number };

const JPEG = /^1\.2\.840\.10008\.1\.2\.4\.(50|51|57|70|80|81)$/;
const JPEG_2000 = /^1\.2\.840\.10008\.1\.2\.4\.(90|91|201|202|203)$/;
const RUN_LENGTHS = '1.2.840.10008.1.2.5';

/**
 * Refuses a compressed picture that ends early, or is of another size than the data set says: decoders fill
 * what is missing with black, and put rows of one width into rows of another.
 * @throws DicomRefusal
 */
export function checkFrame(frame: Buffer, syntax: string, stated: StatedPicture): void {
  if (syntax === RUN_LENGTHS) return checkRunLengths(frame, stated);
  if (!JPEG.test(syntax) && !JPEG_2000.test(syntax)) return;
  const size = JPEG.test(syntax) ? jpegSize(frame) : jpeg2000Size(frame);
  if (size?.rows !== stated.rows || size.columns !== stated.columns) throw new DicomRefusal('broken');
  if (!endsWithMarker(frame)) throw new DicomRefusal('cut-off');
}

/** ITU-T T.81 B.2.2: the frame header; T.87 gives JPEG-LS the marker F7. */
function jpegSize(frame: Buffer): Size | null {
  let at = 2;
  while (at + 9 <= frame.length && frame[at] === 0xff) {
    const marker = frame[at + 1]!;
    const isFrame = (marker >= 0xc0 && marker <= 0xcf && ![0xc4, 0xc8, 0xcc].includes(marker)) || marker === 0xf7;
    if (isFrame) return { rows: frame.readUInt16BE(at + 5), columns: frame.readUInt16BE(at + 7) };
    // FF before a marker fills
    at += marker === 0xff ? 1 : 2 + frame.readUInt16BE(at + 2);
  }
  return null;
}

/** ITU-T T.800 A.5.1: the size of the reference grid less its offset. */
function jpeg2000Size(frame: Buffer): Size | null {
  const at = frame.indexOf(Buffer.from([0xff, 0x4f, 0xff, 0x51]));
  if (at < 0 || at + 24 > frame.length) return null;
  const word = (place: number) => frame.readUInt32BE(at + place);
  return { columns: word(8) - word(16), rows: word(12) - word(20) };
}

/** All these end with FF D9; a DICOM fragment may be padded. */
function endsWithMarker(frame: Buffer): boolean {
  const end = frame.lastIndexOf(0xd9);
  return end > 0 && frame[end - 1] === 0xff && frame.subarray(end + 1).every((byte) => byte === 0 || byte === 0xff);
}

/** PS3.5 Annex G: a header of 64 bytes, then a segment for each byte of each sample. */
function checkRunLengths(frame: Buffer, { rows, columns, samples, bits }: StatedPicture): void {
  if (frame.length < 64) throw new DicomRefusal('cut-off');
  const segments = frame.readUInt32LE(0);
  if (segments !== samples * Math.ceil(bits / 8) || segments > 15) throw new DicomRefusal('broken');
  for (let index = 1; index <= segments; index++) {
    const end = index < segments ? frame.readUInt32LE(4 + 4 * index) : frame.length;
    if (unpackedLength(frame, frame.readUInt32LE(4 * index), end) < rows * columns) throw new DicomRefusal('cut-off');
  }
}

function unpackedLength(frame: Buffer, start: number, end: number): number {
  let length = 0;
  let at = start;
  while (at < end && at < frame.length) {
    const run = frame[at]!;
    if (run < 128 && at + 2 + run > frame.length) break;
    if (run < 128) length += run + 1;
    else if (run > 128) length += 257 - run;
    at += run < 128 ? run + 2 : run > 128 ? 2 : 1;
  }
  return length;
}
