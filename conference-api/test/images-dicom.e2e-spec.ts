import { CaseImage } from '../src/images/entities/case-image.entity.js';
import { makeCase } from './factories/case-rows.js';
import { makeWorld, type World } from './factories/world.js';
import { dicomFile, dicomPicture, dicomSamples, element, renderedByDcmtk } from './support/dicom-files.js';
import { type ObjectStore, startObjectStore } from './support/object-store.js';
import { keysInStore, objectOf, pixelsOf, upload } from './support/stored-pictures.js';
import { startTestApp, type TestApp } from './support/test-app.js';

const samples = dicomSamples();
const sample = (name: string) => {
  const file = samples.get(name);
  if (!file) throw new Error(`python3-pydicom has no sample ${name}`);
  return file;
};

/** What each sample that is not shown is refused for; their README says what they are. */
const REFUSED: [number, RegExp, string[]][] = [
  [415, /DICOM are read/, ['ExplVR_BigEndNoMeta.dcm', 'ExplVR_LitEndNoMeta.dcm', 'no_meta.dcm', 'rtstruct.dcm']],
  [422, /holds no picture/, ['UN_sequence.dcm', 'empty_charset_LEI.dcm', 'nested_priv_SQ.dcm', 'no_meta_group_length.dcm', 'priv_SQ.dcm', 'reportsi.dcm', 'reportsi_with_empty_number_tags.dcm', 'rtplan.dcm', 'test-SR.dcm', 'waveform_ecg.dcm']],
  [422, /holds (2|15) pictures/, ['SC_rgb_rle_16bit_2frame.dcm', 'SC_rgb_rle_2frame.dcm', 'SC_rgb_rle_32bit_2frame.dcm', 'rtdose.dcm', 'rtdose_expb.dcm', 'rtdose_rle.dcm']],
  [422, /cut off/, ['MR_truncated.dcm', 'rtplan_truncated.dcm']],
  [422, /is broken/, ['JPEG2000-embedded-sequence-delimiter.dcm', 'SC_rgb_jpeg.dcm', 'meta_missing_tsyntax.dcm']],
  [422, /shown wrongly here/, ['SC_rgb_rle.dcm', 'SC_rgb_rle_16bit.dcm', 'SC_rgb_rle_32bit.dcm', 'rtdose_expb_1frame.dcm']],
];

describe('DICOM', () => {
  let store: ObjectStore;
  let test: TestApp;
  let world: World;
  let caseId: string;

  beforeAll(async () => {
    store = await startObjectStore();
    test = await startTestApp(store.environment);
    world = await makeWorld(test);
  });

  afterAll(async () => {
    await test?.close();
    await store?.remove();
  });

  beforeEach(async () => {
    ({ id: caseId } = await makeCase(test, world));
  });

  const send = (file: Buffer) => upload(test, world.people.surgeon, caseId, file, 'film.dcm');
  const taken = async (file: Buffer) => {
    const { status, body } = await send(file);
    expect([status, body.detail]).toEqual([201, undefined]);
    return body as { id: string; width: number; height: number; pixelSpacingMm: number | null };
  };

  it('each sample of python3-pydicom is shown, or refused for what is wrong with it', async () => {
    const answers = new Map<string, string>();
    const wanted = new Map([...samples.keys()].map((name) => [name, '201 ']));
    for (const [status, words, names] of REFUSED) for (const name of names) wanted.set(name, `${status} ${words.source}`);
    for (const [name, file] of samples) {
      // some are the same bytes under two names, so each gets a case of its own
      ({ id: caseId } = await makeCase(test, world));
      const { status, body } = await send(file);
      const words = REFUSED.find(([, expected]) => expected.test(body.detail))?.[1];
      answers.set(name, `${status} ${words?.source ?? body.detail ?? ''}`);
      expect(await test.dataSource.manager.countBy(CaseImage, { caseId })).toBe(status === 201 ? 1 : 0);
      if (status === 422) expect(body.errors[0]).toMatchObject({ field: 'file', code: 'unreadable-image' });
    }
    expect(Object.fromEntries(answers)).toEqual(Object.fromEntries(wanted));
    expect([...wanted.values()].filter((answer) => answer === '201 ').length).toBeGreaterThan(30);
  }, 120_000);

  // Oracle: dcmj2pnm of Debian's dcmtk 3.6.7, on the same file. One grey level is rounding; the 12-bit lossy JPEG
  // differs with the way its cosines are rounded, stretched over few grey levels.
  it.each<[string, 'first-in-file' | 'min-max', number]>([
    ['MR_small.dcm', 'first-in-file', 0],
    ['MR_small_RLE.dcm', 'first-in-file', 0],
    ['MR_small_bigendian.dcm', 'first-in-file', 0],
    ['MR_small_implicit.dcm', 'first-in-file', 0],
    ['MR_small_padded.dcm', 'first-in-file', 0],
    ['CT_small.dcm', 'min-max', 1],
    ['image_dfl.dcm', 'min-max', 0],
    ['liver_1frame.dcm', 'min-max', 0],
    ['rtdose_1frame.dcm', 'min-max', 0],
    ['ExplVR_BigEnd.dcm', 'min-max', 0],
    ['SC_rgb_small_odd.dcm', 'min-max', 0],
    ['SC_rgb_jpeg_dcmd.dcm', 'min-max', 0],
    ['SC_rgb_jpeg_gdcm.dcm', 'min-max', 0],
    ['SC_rgb_jpeg_app14_dcmd.dcm', 'min-max', 0],
    ['SC_rgb_dcmtk_+eb+cr.dcm', 'min-max', 0],
    ['SC_rgb_dcmtk_+eb+cy+n1.dcm', 'min-max', 0],
    ['SC_rgb_dcmtk_+eb+cy+s4.dcm', 'min-max', 0],
    ['SC_ybr_full_422_uncompressed.dcm', 'min-max', 1],
    ['JPEG-lossy.dcm', 'min-max', 12],
  ])('%s looks as dcmtk shows it, window %s, within %i of 255', async (name, window, tolerance) => {
    const { id } = await taken(sample(name));
    expectSame(await pixelsOf(test, id), renderedByDcmtk(sample(name), window), tolerance);
  });

  // the README of the samples: made from MR_small.dcm without loss; dcmtk reads no JPEG 2000
  it.each(['MR_small_jp2klossless.dcm', 'MR_small_jpeg_ls_lossless.dcm'])('%s looks as dcmtk shows the file it was made from', async (name) => {
    const { id } = await taken(sample(name));
    expectSame(await pixelsOf(test, id), renderedByDcmtk(sample('MR_small.dcm'), 'first-in-file'), 0);
  });

  // the file's own ImageComments list its bands of ten rows
  it('SC_rgb_gdcm_KY.dcm, JPEG 2000 in colour, has the colours that it says it has', async () => {
    const { at } = await pixelsOf(test, (await taken(sample('SC_rgb_gdcm_KY.dcm'))).id);
    expect([5, 15, 25, 35, 45, 55].map((y) => at(50, y))).toEqual([[255, 0, 0], [255, 128, 128], [0, 255, 0], [128, 255, 128], [0, 0, 255], [128, 128, 255]]);
  });

  // spacing and size as dcmdump 3.6.7 prints (0028,0030), (0028,0011), (0028,0010)
  it.each([
    ['CT_small.dcm', 128, 128, 0.661468],
    ['MR_small.dcm', 64, 64, 0.3125],
    ['JPEG-lossy.dcm', 256, 1024, 2.26],
    ['image_dfl.dcm', 512, 512, null],
  ])('%s: %i by %i, %f mm a pixel', async (name, width, height, spacing) => {
    expect(await taken(sample(name))).toMatchObject({ width, height, pixelSpacingMm: spacing });
  });

  const ramp = Array.from({ length: 64 * 64 }, (_, index) => index);
  /** PS3.3 C.11.2.1.2.1, for outputs 0 to 255. */
  const linear = (x: number, c: number, w: number) => Math.min(255, Math.max(0, ((x - (c - 0.5)) / (w - 1) + 0.5) * 255));
  const expectGreys = async (id: string, grey: (value: number) => number) => {
    const { data, channels } = await pixelsOf(test, id);
    expect(channels).toBe(1);
    const worst = Math.max(...ramp.map((value) => Math.abs(data[value]! - grey(value))));
    expect(worst).toBeLessThanOrEqual(1);
  };

  it.each([
    ['a narrow window', { centre: 2000, width: 800 }],
    ['a window wider than the values', { centre: 1000, width: 6000 }],
  ])("the file's window, %s, is applied as the standard's formula says", async (_, window) => {
    const { id } = await taken(dicomPicture({ rows: 64, columns: 64, pixels: ramp, window }));
    await expectGreys(id, (value) => linear(value, window.centre, window.width));
  });

  it('without a window the full range is shown', async () => {
    const { id } = await taken(dicomPicture({ rows: 64, columns: 64, pixels: ramp }));
    await expectGreys(id, (value) => (value / 4095) * 255);
  });

  it('MONOCHROME1 is shown inverted: its lowest value is white', async () => {
    const { id } = await taken(dicomPicture({ rows: 64, columns: 64, pixels: ramp, photometric: 'MONOCHROME1', window: { centre: 2048, width: 4096 } }));
    await expectGreys(id, (value) => 255 - linear(value, 2048, 4096));
  });

  it('pixels that are not square have no one scale', async () => {
    expect((await taken(dicomPicture({ rows: 64, columns: 64, pixels: ramp, spacing: '0.2\\0.4' }))).pixelSpacingMm).toBeNull();
    expect((await taken(dicomPicture({ rows: 64, columns: 64, pixels: ramp, spacing: '0.143\\0.143' }))).pixelSpacingMm).toBe(0.143);
  });

  it('nothing of the header is stored', async () => {
    const before = [element(0x08, 0x80, 'LO', 'PLANTED^HOSPITAL'), element(0x10, 0x10, 'PN', 'PLANTED^NAME'), element(0x10, 0x30, 'DA', '19511231')];
    const file = dicomPicture({ rows: 64, columns: 64, pixels: ramp, before });
    expect(file.includes('PLANTED^NAME')).toBe(true);
    const { id } = await taken(file);
    expect(await keysInStore(test, id)).toHaveLength(3);
    for (const key of await keysInStore(test, id)) {
      const object = await objectOf(test, key);
      for (const text of ['PLANTED', '19511231', 'DICM']) expect(object.includes(text)).toBe(false);
    }
  });

  it('a document inside DICOM holds no picture', async () => {
    const { status, body } = await send(dicomFile(Buffer.concat([element(0x08, 0x60, 'CS', 'DOC'), element(0x42, 0x11, 'OB', Buffer.from('%PDF-1.7\n'))])));
    expect([status, body.detail]).toEqual([422, 'The DICOM file holds no picture.']);
  });
});

function expectSame(stored: Awaited<ReturnType<typeof pixelsOf>>, oracle: ReturnType<typeof renderedByDcmtk>, tolerance: number) {
  expect([stored.width, stored.height]).toEqual([oracle.width, oracle.height]);
  // a picture that is grey throughout is stored as grey, whatever dcmtk writes
  const of = (raster: { data: Buffer; channels: number }, index: number, channel: number) => raster.data[index * raster.channels + (raster.channels === 1 ? 0 : channel)]!;
  let worst = 0;
  for (let index = 0; index < stored.width * stored.height; index++)
    for (let channel = 0; channel < 3; channel++) worst = Math.max(worst, Math.abs(of(stored, index, channel) - of(oracle, index, channel)));
  expect(worst).toBeLessThanOrEqual(tolerance);
}
