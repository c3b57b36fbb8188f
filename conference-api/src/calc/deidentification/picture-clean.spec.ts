import fc from 'fast-check';
import sharp from 'sharp';
import { deflateSync } from 'node:zlib';
import { FileRefusal } from './file-refusal.js';
import { cleanPictureBytes } from './picture-clean.js';

/** The reader and writer from outside: sharp (libvips), which knows nothing of this code. */
const WIDTH = 40;
const HEIGHT = 24;
const PIXELS = Buffer.from(Array.from({ length: WIDTH * HEIGHT * 3 }, (_, i) => (i * 37 + (i >> 5) * 11) % 256));
const EXIF = {
  IFD0: { Artist: 'Planted Person', Copyright: 'Planted Hospital' },
  IFD2: { UserComment: 'Planted' },
  IFD3: { GPSLatitudeRef: 'N', GPSLatitude: '51/1 30/1 0/1' },
};
const XMP =
  '<x:xmpmeta xmlns:x="adobe:ns:meta/"><rdf:RDF xmlns:rdf="http://www.w3.org/1999/02/22-rdf-syntax-ns#"><rdf:Description>Planted</rdf:Description></rdf:RDF></x:xmpmeta>';

const full = () =>
  sharp(PIXELS, { raw: { width: WIDTH, height: HEIGHT, channels: 3 } })
    .withExif(EXIF)
    .withXmp(XMP)
    .withIccProfile('p3');
const written: Record<string, () => Promise<Buffer>> = {
  jpeg: () => full().jpeg({ quality: 90 }).toBuffer(),
  'progressive jpeg': () => full().jpeg({ progressive: true }).toBuffer(),
  png: () => full().png().toBuffer(),
  'palette png': () => full().png({ palette: true }).toBuffer(),
  webp: () => full().webp({ quality: 90 }).toBuffer(),
  'lossless webp': () => full().webp({ lossless: true }).toBuffer(),
  'webp with alpha': () => full().ensureAlpha(0.5).webp().toBuffer(),
  'tiff of strips': () => full().tiff({ compression: 'lzw' }).toBuffer(),
  'tiff of tiles': () => full().tiff({ compression: 'deflate', tile: true, tileWidth: 16, tileHeight: 16 }).toBuffer(),
};
const KINDS = Object.keys(written);

// the numbers themselves, not the colours that a profile makes of them
const pixelsOf = async (bytes: Uint8Array) => {
  const { data, info } = await sharp(bytes, { ignoreIcc: true }).raw().toBuffer({ resolveWithObject: true });
  return [info.width, info.height, info.channels, data.toString('base64')];
};

describe.each(KINDS)('%s', (kind) => {
  it('is left with its pixels and without EXIF, XMP and profile, as sharp reads it', async () => {
    const before = await written[kind]!();
    const clean = cleanPictureBytes(before);
    const { exif, xmp, icc, iptc } = await sharp(clean.bytes).metadata();
    expect([exif, xmp, icc, iptc]).toEqual([undefined, undefined, undefined, undefined]);
    expect(Buffer.from(clean.bytes).includes('Planted')).toBe(false);
    expect(await pixelsOf(clean.bytes)).toEqual(await pixelsOf(before));
    expect([clean.width, clean.height, clean.wasClean]).toEqual([WIDTH, HEIGHT, false]);
  });

  it('names what it removed', async () => {
    const { removed } = cleanPictureBytes(await written[kind]!());
    // sharp puts no EXIF into TIFF
    const expected = kind.startsWith('tiff') ? ['TIFF XMP'] : ['EXIF Artist', 'EXIF GPS 0x0002', 'EXIF Exif UserComment'];
    expect(removed.map(({ name }) => name)).toEqual(expect.arrayContaining(expected));
  });

  it('is clean once cleaned, byte for byte', async () => {
    const once = cleanPictureBytes(await written[kind]!()).bytes;
    const again = cleanPictureBytes(once);
    expect([again.wasClean, again.removed, Buffer.from(again.bytes).equals(once)]).toEqual([true, [], true]);
  });

  it('loses what stands after its end', async () => {
    const once = cleanPictureBytes(await written[kind]!()).bytes;
    const again = cleanPictureBytes(Buffer.concat([once, Buffer.from('PK\x03\x04 Planted archive')]));
    expect([again.wasClean, Buffer.from(again.bytes).equals(once)]).toEqual([false, true]);
    expect(again.removed).toHaveLength(1);
  });
});

/** ITU-T T.81 B.2.4: a segment after the start of the picture. */
const withSegment = (jpeg: Uint8Array, code: number, content: string) => {
  const segment = Buffer.from([0xff, code, (content.length + 2) >> 8, (content.length + 2) & 255, ...Buffer.from(content, 'latin1')]);
  return Buffer.concat([jpeg.subarray(0, 2), segment, jpeg.subarray(2)]);
};

it.each([
  ['COM (comment)', 0xfe, 'Planted'],
  ['APP13 (IPTC)', 0xed, 'Photoshop 3.0\x008BIM\x04\x04Planted'],
  ['APP1 (XMP)', 0xe1, 'http://ns.adobe.com/xmp/extension/\0Planted'],
  ['APP2 (more pictures)', 0xe2, 'MPF\0Planted'],
  ['APP0 (JFIF with a thumbnail)', 0xe0, 'JFIF\0\x01\x01\0\0\x01\0\x01\x01\x01Pl.'],
  ['APP0 (thumbnail)', 0xe0, 'JFXX\0\x10Planted'],
  ['APP14', 0xee, 'Adobe\0Planted in the place of a transform'],
  ['APP8', 0xe8, 'mrfx and Planted'],
  ['APP11', 0xeb, 'JP  Planted'],
])('a JPEG loses %s', async (name, code, content) => {
  const once = cleanPictureBytes(await written.jpeg!()).bytes;
  const { bytes, removed } = cleanPictureBytes(withSegment(once, code, content));
  expect(removed.map((item) => item.name)).toEqual([name]);
  expect(Buffer.from(bytes).equals(once)).toBe(true);
});

/** PNG third edition 5.3; the checksum is not looked at here, so that none is needed. */
const withChunk = (png: Uint8Array, type: string, content: Buffer) => {
  const length = Buffer.alloc(4);
  length.writeUInt32BE(content.length);
  return Buffer.concat([png.subarray(0, 33), length, Buffer.from(type), content, Buffer.alloc(4), png.subarray(33)]);
};

it.each([
  ['tEXt (text)', 'tEXt', Buffer.from('Author\0Planted')],
  ['zTXt (packed text)', 'zTXt', Buffer.concat([Buffer.from('Comment\0\0'), deflateSync(Buffer.from('Planted'))])],
  ['iTXt (text, also XMP)', 'iTXt', Buffer.from('XML:com.adobe.xmp\0\0\0\0\0Planted')],
  ['tIME (time of change)', 'tIME', Buffer.from([7, 208, 1, 2, 3, 4, 5])],
  ['sPLT', 'sPLT', Buffer.from('Planted palette')],
  ['prIv', 'prIv', Buffer.from('Planted')],
  ['bKGD', 'bKGD', Buffer.alloc(5000, 'Planted')],
])('a PNG loses %s', async (name, type, content) => {
  const once = cleanPictureBytes(await written.png!()).bytes;
  const { bytes, removed } = cleanPictureBytes(withChunk(once, type, content));
  expect(removed.map((item) => item.name)).toEqual([name]);
  expect(Buffer.from(bytes).equals(once)).toBe(true);
});

describe('is refused with the reason', () => {
  it('that a file holds several pictures', async () => {
    const film = await sharp(PIXELS, { raw: { width: WIDTH, height: HEIGHT, channels: 3, pageHeight: HEIGHT / 2 } })
      .webp({ loop: 1, delay: 100 })
      .toBuffer();
    expect(() => cleanPictureBytes(film)).toThrow(/WebP file holds several pictures/);
    const pages = await sharp([await full().png().toBuffer(), await full().png().toBuffer()], { join: { animated: true } })
      .tiff()
      .toBuffer();
    expect(() => cleanPictureBytes(pages)).toThrow(/TIFF file holds several pictures/);
  });

  it('that it has too many pixels', async () => {
    const png = Buffer.from(await written.png!());
    png.writeUInt32BE(60_000, 16);
    png.writeUInt32BE(60_000, 20);
    expect(() => cleanPictureBytes(png)).toThrow(/60 million pixels/);
  });

  it.each([
    ['nothing', '', /is empty/],
    ['text', 'Planted', /no JPEG, PNG, WebP or TIFF/],
    ['a JPEG that ends', '\xff\xd8\xff\xe0\0\x10', /cut off/],
    ['a TIFF whose directory lies outside', 'II*\0\xff\xff\xff\x7f', /cut off/],
  ])('%s', (_, text, reason) => {
    expect(() => cleanPictureBytes(Buffer.from(text, 'latin1'))).toThrow(reason);
  });
});

describe('hostile pictures', () => {
  const samples: Buffer[] = [];
  beforeAll(async () => {
    for (const kind of KINDS) samples.push(await written[kind]!());
  });

  const cleanedOrRefused = (bytes: Uint8Array) => {
    const began = performance.now();
    try {
      expect(cleanPictureBytes(bytes).bytes.length).toBeLessThanOrEqual(bytes.length + 64);
    } catch (error) {
      if (!(error instanceof FileRefusal)) throw error;
    }
    expect(performance.now() - began).toBeLessThan(5000);
  };

  it('are borne, wherever bytes are changed', () => {
    const change = fc.record({ place: fc.double({ min: 0, max: 1, noNaN: true }), byte: fc.constantFrom(0, 1, 0x7f, 0x80, 0xff, 0x45) });
    fc.assert(
      fc.property(fc.nat({ max: KINDS.length - 1 }), fc.array(change, { minLength: 1, maxLength: 10 }), (which, changes) => {
        const bytes = Buffer.from(samples[which]!);
        for (const { place, byte } of changes) bytes[Math.min(bytes.length - 1, Math.floor(place * bytes.length))] = byte;
        cleanedOrRefused(bytes);
      }),
      { numRuns: 2000, seed: 20240604 },
    );
  });

  it('are borne, wherever they end', () => {
    for (const sample of samples)
      for (let length = 0; length < sample.length; length += 1 + (length >> 6)) cleanedOrRefused(sample.subarray(0, length));
  });

  it('do not grow by strips that lie over one another', () => {
    // TIFF 6.0: 100 000 strips, each the whole file
    const count = 100_000;
    const head = Buffer.from('49492a0008000000', 'hex');
    const entries = [
      [256, 3, 1, 8],
      [257, 3, 1, 8],
      [273, 4, count, 100],
      [279, 4, count, 100],
    ].map(([tag, type, n, value]) => {
      const entry = Buffer.alloc(12);
      entry.writeUInt16LE(tag!, 0);
      entry.writeUInt16LE(type!, 2);
      entry.writeUInt32LE(n!, 4);
      entry.writeUInt32LE(value!, 8);
      return entry;
    });
    const lengths = Buffer.alloc(count * 4);
    for (let i = 0; i < count; i++) lengths.writeUInt32LE(400_000, i * 4);
    const file = Buffer.concat([head, Buffer.from([4, 0]), ...entries, Buffer.alloc(4), Buffer.alloc(100 - 8 - 2 - 48 - 4), lengths]);
    expect(() => cleanPictureBytes(file)).toThrow(/cut off/);
  });
});
