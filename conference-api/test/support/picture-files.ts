import { randomBytes } from 'node:crypto';
import { crc32 } from 'node:zlib';
import sharp from 'sharp';

/** Pixels that no encoder can make small, and no two pictures of which are the same. */
export const noise = (width: number, height: number, channels: 1 | 3 = 3) => sharp(randomBytes(width * height * channels), { raw: { width, height, channels } });

export const plainPng = (width = 64, height = 48): Promise<Buffer> => noise(width, height).png().toBuffer();

/** The four quarters of a picture: red and green above, blue and white below. */
export function quarters(width: number, height: number) {
  const part = (background: string) => ({ create: { width: width / 2, height: height / 2, channels: 3 as const, background } });
  return sharp({ create: { width, height, channels: 3, background: '#ffffff' } }).composite([
    { input: part('#ff0000'), left: 0, top: 0 },
    { input: part('#00ff00'), left: width / 2, top: 0 },
    { input: part('#0000ff'), left: 0, top: height / 2 },
  ]);
}

/** A segment of a JPEG (ITU-T T.81 B.1.1.4). */
function segment(marker: number, payload: Buffer): Buffer {
  const head = Buffer.from([0xff, marker, 0, 0]);
  head.writeUInt16BE(payload.length + 2, 2);
  return Buffer.concat([head, payload]);
}

/** IPTC in its Photoshop wrapper (APP13), a comment, and bytes after the end. */
export function jpegWith(jpeg: Buffer, planted: { iptc: string; comment: string; trailing: string }): Buffer {
  const dataSet = Buffer.concat([Buffer.from([0x1c, 2, 120, 0, planted.iptc.length]), Buffer.from(planted.iptc)]);
  const resource = Buffer.concat([Buffer.from('8BIM\x04\x04\0\0\0\0\0', 'latin1'), Buffer.from([dataSet.length]), dataSet, Buffer.alloc(dataSet.length % 2)]);
  return Buffer.concat([
    jpeg.subarray(0, 2),
    segment(0xed, Buffer.concat([Buffer.from('Photoshop 3.0\0', 'latin1'), resource])),
    segment(0xfe, Buffer.from(planted.comment)),
    jpeg.subarray(2),
    Buffer.from(planted.trailing),
  ]);
}

/** A chunk of a PNG (PNG specification, third edition, 5.3). */
export function pngChunk(type: string, payload: Buffer): Buffer {
  const body = Buffer.concat([Buffer.from(type, 'latin1'), payload]);
  const [length, check] = [Buffer.alloc(4), Buffer.alloc(4)];
  length.writeUInt32BE(payload.length);
  check.writeUInt32BE(crc32(body));
  return Buffer.concat([length, body, check]);
}

const PNG_HEAD = 33; // signature and IHDR

export function pngWithText(png: Buffer, text: string): Buffer {
  const chunks = [pngChunk('tEXt', Buffer.from(`Author\0${text}`, 'latin1')), pngChunk('iTXt', Buffer.from(`Title\0\0\0\0\0${text}`, 'latin1'))];
  return Buffer.concat([png.subarray(0, PNG_HEAD), ...chunks, png.subarray(PNG_HEAD), Buffer.from(text)]);
}

/** A PNG that says it has so many pixels; `data` is its compressed picture. */
export function pngOfSize(width: number, height: number, data: Buffer): Buffer {
  const head = Buffer.alloc(13);
  head.writeUInt32BE(width, 0);
  head.writeUInt32BE(height, 4);
  head.set([8, 0, 0, 0, 0], 8); // 8-bit grey
  return Buffer.concat([Buffer.from('\x89PNG\r\n\x1a\n', 'latin1'), pngChunk('IHDR', head), pngChunk('IDAT', data), pngChunk('IEND', Buffer.alloc(0))]);
}
