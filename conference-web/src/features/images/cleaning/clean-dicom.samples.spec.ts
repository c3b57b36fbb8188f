/** @jest-environment node */
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { FileRefusal } from '@kerfside/calc/deidentification/file-refusal';
import { profileCode } from '@kerfside/calc/deidentification/profile-table';
import { UidMap } from '@kerfside/calc/deidentification/uid-map';
import { inspectDicom } from '../../../../../conference-api/src/images/inspection/inspect-dicom.js';
import { cleanDicom } from './clean-dicom.js';
import type { CleanedFile } from './cleaned-file.js';
import { dicomSamples, type Sample } from './testing/dicom-samples.js';
import { dcmdump, drawnByDcmjs, drawnByDcmtk } from './testing/second-readers.js';

const newMap = () => new UidMap([], () => crypto.getRandomValues(new Uint8Array(16)));

/**
 * Every DICOM file of Debian's python3-pydicom 2.3.1. Readers from outside: dcmtk 3.6.7 (dcmdump, dcmj2pnm,
 * dcml2pnm) and dcmjs-imaging 0.2.5. Samples are not changed by cleaning, so pictures are equal bit for bit,
 * lossy ones too.
 */
describe('the sample files', () => {
  const cleaned: { sample: Sample; file: CleanedFile; path: string }[] = [];
  const refused = new Map<string, string>();
  let folder = '';

  beforeAll(async () => {
    folder = mkdtempSync(join(tmpdir(), 'cleaned-'));
    for (const sample of dicomSamples()) {
      try {
        const file = await cleanDicom(sample.bytes, newMap(), { pixelsConfirmed: true });
        const path = join(folder, `${cleaned.length}.dcm`);
        writeFileSync(path, file.bytes);
        cleaned.push({ sample, file, path });
      } catch (error) {
        if (!(error instanceof FileRefusal)) throw new Error(`${sample.name} crashed`, { cause: error });
        refused.set(sample.name, error.message);
      }
    }
  }, 120_000);

  afterAll(() => rmSync(folder, { recursive: true, force: true }));

  it('are cleaned, but for those that hold no whole picture', () => {
    expect(cleaned.length).toBeGreaterThanOrEqual(83);
    // pydicom's README of its test files says of each what it holds
    const pictures = [
      'CT_small',
      'MR_small',
      'MR_small_bigendian',
      'MR_small_implicit',
      'MR_small_RLE',
      'image_dfl',
      'JPEG2000',
      '693_J2KI',
      'MR_small_jpeg_ls_lossless',
      'SC_rgb_rle_2frame',
    ];
    const names = new Set(cleaned.map(({ sample }) => sample.name));
    expect(pictures.filter((name) => !names.has(`test_files/${name}.dcm`))).toEqual([]);
  });

  it.each([
    ['test_files/test-SR.dcm', /a report \(Structured Report\)/],
    ['test_files/reportsi.dcm', /a report \(Structured Report\)/],
    ['test_files/waveform_ecg.dcm', /a waveform/],
    ['test_files/rtplan.dcm', /a radiotherapy plan/],
    ['test_files/rtdose.dcm', /a radiotherapy dose/],
    ['test_files/liver_1frame.dcm', /segmentation/],
    ['test_files/dicomdirtests/DICOMDIR', /a list of other files \(DICOMDIR\)/],
    ['palettes/hotiron.dcm', /a colour palette/],
    ['test_files/MR_truncated.dcm', /cut off in the attribute \(7FE0,0010\)/],
    ['test_files/rtplan_truncated.dcm', /cut off in the attribute \(300A,00B0\)/],
    ['test_files/badVR.dcm', /a radiotherapy dose/],
    ['test_files/no_meta.dcm', /has no DICOM head/],
    ['test_files/meta_missing_tsyntax.dcm', /\(0002,0010\) is missing/],
    ['test_files/JPEG2000-embedded-sequence-delimiter.dcm', /says 256 × 1024 pixels, and its picture/],
    ['test_files/dicomdirtests/TINY_ALPHA/PT000000/ST000000/SE000000/IM000000', /holds no picture: \(0028,0010\) Rows is missing/],
  ])('%s is refused with a reason that names the fault', (name, reason) => {
    expect(refused.get(name)).toMatch(reason);
  });

  it('are refused in whole sentences', () => {
    expect([...refused.values()].filter((message) => !/^(The|Pictures|Big-endian) .{10,220}\.$/.test(message))).toEqual([]);
  });

  it('keep no attribute of the table, as dcmdump reads them', () => {
    const identifying = (paths: string[]) =>
      dcmdump(...paths).flatMap((lines, i) =>
        lines
          .filter(({ tag }) => profileCode(parseInt(tag.replace(',', ''), 16)) !== null)
          .filter(({ vr, value }) => value !== '' && !(vr === 'UI' && /^\[2\.25\.\d{1,39}\]$/.test(value)))
          .map(({ tag }) => `${paths[i]} ${tag}`),
      );
    // the same look at what they were
    expect(identifying(cleaned.map(({ sample }) => sample.path)).length).toBeGreaterThan(1000);
    expect(identifying(cleaned.map(({ path }) => path))).toEqual([]);
  }, 60_000);

  it('say that they are de-identified, and how, as dcmdump reads them', () => {
    for (const lines of dcmdump(...cleaned.map(({ path }) => path))) {
      const valueOf = (tag: string) => lines.filter((line) => line.tag === tag).map(({ value }) => value);
      expect(valueOf('0012,0062')).toEqual(['[YES]']);
      expect(valueOf('0008,0100')).toEqual(['[113100]', '[113101]']);
      expect(valueOf('0028,0301')).toEqual(['[NO]']);
      expect(valueOf('0002,0003')).toEqual(valueOf('0008,0018'));
    }
  }, 60_000);

  it('are taken by the server, which reads them twice', () => {
    const faults = cleaned.flatMap(({ sample, file }) => inspectDicom(file.bytes).faults.map(({ place, why }) => `${sample.name}: ${place} ${why}`));
    expect(faults).toEqual([]);
  });

  it('hold none of the removed words anywhere in their bytes', () => {
    const left = cleaned.flatMap(({ sample, file }) => {
      const bytes = Buffer.from(file.bytes).toString('latin1');
      const words = file.removed.map(({ was }) => was).filter((was) => /^[ -~]{6,}$/.test(was) && !/^\d+ (bytes?|items?)$/.test(was));
      const kept = new Set(file.kept.map(({ value }) => value.replaceAll(', ', '\\')));
      return words
        .filter((word) => bytes.includes(word) && ![...kept].some((value) => value.includes(word)) && !STANDARD_WORDS.test(word))
        .map((word) => `${sample.name}: ${word}`);
    });
    expect(left).toEqual([]);
  });

  it('look the same bit by bit, as dcmtk draws them', async () => {
    const before = await drawnByDcmtk(cleaned.map(({ sample }) => sample.path));
    const after = await drawnByDcmtk(cleaned.map(({ path }) => path));
    expect(cleaned.filter((_, i) => before[i] !== after[i]).map(({ sample }) => sample.name)).toEqual([]);
    // dcmtk 3.6.7 reads no JPEG 2000
    expect(before.filter(Boolean).length).toBeGreaterThanOrEqual(77);
  }, 240_000);

  it('look the same bit by bit, as dcmjs-imaging draws them', async () => {
    const before = await drawnByDcmjs(cleaned.map(({ sample }) => sample.path));
    const after = await drawnByDcmjs(cleaned.map(({ path }) => path));
    expect(cleaned.filter((_, i) => before[i] === null || before[i] !== after[i]).map(({ sample }) => sample.name)).toEqual([]);
  }, 240_000);
});

/** UIDs and words of the standard itself that stay elsewhere in the file. */
const STANDARD_WORDS = /^(1\.2\.840\.10008\.[\d.]+)$/;
