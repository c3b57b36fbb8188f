/** @jest-environment node */
import { FileRefusal } from '@kerfside/calc/deidentification/file-refusal';
import { UidMap } from '@kerfside/calc/deidentification/uid-map';
import fc from 'fast-check';
import { cleanDicom } from './clean-dicom.js';
import { dicomSample } from './testing/dicom-samples.js';

// one of each way of writing: implicit, deflated, big endian, RLE, JPEG, JPEG-LS, JPEG 2000, several frames, sequences, private ones
const NAMES = [
  ...['MR_small_implicit', 'image_dfl', 'MR_small_bigendian', 'MR_small_RLE', 'SC_rgb_rle_2frame', 'SC_rgb_small_odd_jpeg', 'JPEG-lossy'],
  ...['MR_small_jpeg_ls_lossless', '693_J2KI', 'JPEG2000', 'CT_small', 'SC_ybr_full_422_uncompressed', 'nested_priv_SQ', 'reportsi', 'UN_sequence'],
];
const SAMPLES = NAMES.map((name) => dicomSample(`test_files/${name}.dcm`));
const LONGEST_MS = 5000;

/** Cleaned, or refused in words; anything else fails. */
async function cleanedOrRefused(bytes: Uint8Array<ArrayBuffer>): Promise<void> {
  const began = performance.now();
  try {
    const { bytes: clean } = await cleanDicom(bytes, new UidMap([], () => crypto.getRandomValues(new Uint8Array(16))), { pixelsConfirmed: true });
    expect(clean.length).toBeLessThan(bytes.length * 64 + 1024 * 1024);
  } catch (error) {
    if (!(error instanceof FileRefusal)) throw error;
    expect(error.message.length).toBeGreaterThan(10);
  }
  expect(performance.now() - began).toBeLessThan(LONGEST_MS);
}

const anySample = fc.integer({ min: 0, max: SAMPLES.length - 1 });
// most faults are in the head and the attributes, which lie in front
const anyPlace = fc.oneof(
  { weight: 3, arbitrary: fc.double({ min: 0, max: 0.1, noNaN: true }) },
  { weight: 1, arbitrary: fc.double({ min: 0, max: 1, noNaN: true }) },
);
const anyChange = fc.record({ place: anyPlace, byte: fc.constantFrom(0x00, 0xff, 0x7f, 0x80, 0x01, 0x10, 0x53, 0xfe) });

it('bears bytes that are changed anywhere', async () => {
  await fc.assert(
    fc.asyncProperty(anySample, fc.array(anyChange, { minLength: 1, maxLength: 12 }), async (which, changes) => {
      const bytes = SAMPLES[which]!.slice();
      for (const { place, byte } of changes) bytes[Math.min(bytes.length - 1, Math.floor(place * bytes.length))] = byte;
      await cleanedOrRefused(bytes);
    }),
    { numRuns: 400, seed: 20240601 },
  );
}, 120_000);

it('bears lengths of four bytes that are anything', async () => {
  await fc.assert(
    fc.asyncProperty(anySample, anyPlace, fc.constantFrom(0xffffffff, 0xfffffffe, 0x7fffffff, 0x80000000, 0), async (which, place, length) => {
      const bytes = SAMPLES[which]!.slice();
      new DataView(bytes.buffer).setUint32(Math.floor(place * (bytes.length - 4)), length, true);
      await cleanedOrRefused(bytes);
    }),
    { numRuns: 300, seed: 20240602 },
  );
}, 120_000);

it('bears files that end anywhere', async () => {
  for (const sample of SAMPLES) {
    const step = Math.max(1, Math.floor(sample.length / 40));
    for (let length = 0; length < sample.length; length += step) await cleanedOrRefused(sample.slice(0, length));
  }
}, 120_000);

it('bears bytes that are nothing', async () => {
  await fc.assert(
    fc.asyncProperty(fc.uint8Array({ maxLength: 2000 }), async (noise) => {
      const head = SAMPLES[0]!.subarray(0, 132);
      await cleanedOrRefused(new Uint8Array([...head, ...noise]));
    }),
    { numRuns: 200, seed: 20240603 },
  );
}, 60_000);
