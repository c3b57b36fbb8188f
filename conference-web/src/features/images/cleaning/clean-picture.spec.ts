/** @jest-environment node */
import { cleanPicture } from './clean-picture.js';
import { answerCleaning } from './answer-cleaning.js';

const bytesOf = (...parts: (string | number[])[]) =>
  new Uint8Array(Buffer.concat(parts.map((part) => (typeof part === 'string' ? Buffer.from(part, 'latin1') : Buffer.from(part)))));

/** A JPEG of 8 × 8 grey pixels (ITU-T T.81 B.2), whose EXIF data say `orientation` and an artist. */
function jpeg(orientation: number): Uint8Array {
  const entry = (tag: number, type: number, count: number, value: number[]) => [tag & 255, tag >> 8, type, 0, count, 0, 0, 0, ...value];
  const exif = bytesOf(
    'Exif\0\0',
    'II*\0',
    [8, 0, 0, 0, 2, 0],
    entry(0x0112, 3, 1, [orientation, 0, 0, 0]),
    entry(0x013b, 2, 4, [68, 111, 101, 0]),
    [0, 0, 0, 0],
  );
  return bytesOf(
    [0xff, 0xd8, 0xff, 0xe1, 0, exif.length + 2],
    [...exif],
    [0xff, 0xc0, 0, 11, 8, 0, 8, 0, 8, 1, 1, 0x11, 0],
    [0xff, 0xda, 0, 8, 1, 1, 0, 0, 63, 0, 0x12, 0x34],
    [0xff, 0xd9],
  );
}

it('leaves an upright picture as it is, and names what it removed', async () => {
  const turned: unknown[] = [];
  const { bytes, removed } = await cleanPicture(jpeg(1), async ({ bytes }) => (turned.push(bytes), bytes));
  expect(turned).toEqual([]);
  expect(Buffer.from(bytes).includes('Doe')).toBe(false);
  expect(removed).toContainEqual({ place: 'EXIF Artist', name: 'data of the camera', action: 'removed', was: 'Doe' });
});

it('has a picture that lies on its side turned first, and says so', async () => {
  const asked: number[] = [];
  const { removed } = await cleanPicture(jpeg(6), async (picture) => (asked.push(picture.orientation), picture.bytes));
  expect(asked).toEqual([6]);
  expect(removed).toContainEqual(expect.objectContaining({ place: 'EXIF Orientation', action: 'applied', was: '6' }));
});

it('cleans what the turned picture came with', async () => {
  const { bytes } = await cleanPicture(jpeg(8), async () => jpeg(1));
  expect(Buffer.from(bytes).includes('Doe')).toBe(false);
});

it('refuses a picture that lies on its side where the browser can not turn it', async () => {
  await expect(cleanPicture(jpeg(3), null)).rejects.toThrow(/lies on its side/);
});

describe('a file of another kind is refused by what it is', () => {
  it.each([
    ['an empty file', '', /is empty/],
    ['a PDF with the name of a picture', '%PDF-1.7\n', /a PDF document/],
    ['an archive', 'PK\x03\x04abcdefgh', /an archive: unpack it first/],
    ['a HEIC picture', '\0\0\0\x18ftypheic\0\0\0\0', /save it as JPEG/],
    ['text', 'Patient: Doe', /of no kind known here/],
  ])('%s', async (_, content, reason) => {
    const answer = await answerCleaning({ id: 7, file: new Blob([bytesOf(content)]), options: { pixelsConfirmed: true }, uids: [] });
    expect(answer).toEqual({ id: 7, refusal: expect.objectContaining({ message: expect.stringMatching(reason) }) });
  });
});
