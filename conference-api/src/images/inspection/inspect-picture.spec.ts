import sharp from 'sharp';
import { inspectionWords } from './inspection.js';
import { inspectPicture } from './inspect-picture.js';

const picture = () => sharp({ create: { width: 16, height: 16, channels: 3, background: '#406080' } });

// sharp writes nothing but pixels unless it is asked to
it.each(['jpeg', 'png', 'webp'] as const)('finds nothing in a %s of nothing but pixels', async (format) => {
  expect(inspectPicture(await picture()[format]().toBuffer())).toEqual({ faults: [] });
});

it('names the parts that tell of somebody, and never what they say', async () => {
  const jpeg = await picture()
    .withExif({ IFD0: { Artist: 'Planted Person' } })
    .jpeg()
    .toBuffer();
  const inspection = inspectPicture(Buffer.concat([jpeg, Buffer.from('Planted')]));
  expect(inspection.faults.map(({ place }) => place)).toEqual(
    expect.arrayContaining(['APP1 (EXIF)', 'EXIF Artist', 'bytes after the end of the picture']),
  );
  expect(JSON.stringify(inspection)).not.toContain('Planted');
  expect(inspectionWords(inspection)).toMatch(/^The file is not clean: APP1 \(EXIF\) is not needed to show the picture; .*\.$/);
});

it('names the fault of a file that is none', () => {
  expect(inspectPicture(Buffer.from('%PDF-1.7'))).toEqual({
    faults: [{ place: 'file', name: '', why: expect.stringMatching(/no JPEG, PNG, WebP or TIFF/) }],
  });
});
