import type { DicomDataSet } from './dicom-file.js';
import { tagText } from './dicom-elements.js';
import { valuesOf } from './dicom-values.js';
import { FileRefusal } from './file-refusal.js';
import { KEPT } from './kept-attributes.js';
import { MOST_FRAMES, MOST_PIXELS } from './limits.js';

/** What a picture's own attributes say of its samples (PS3.3 C.7.6.3, C.7.6.6). */
export interface PictureFacts {
  rows: number;
  columns: number;
  samples: number;
  photometric: string;
  bitsAllocated: number;
  frames: number;
}

const ROWS = 0x00280010;
const COLUMNS = 0x00280011;
const SAMPLES = 0x00280002;
const PHOTOMETRIC = 0x00280004;
const BITS = 0x00280100;
const FRAMES = 0x00280008;

/** Throws FileRefusal where one is missing or beyond what is taken. */
export function pictureFacts(dataSet: DicomDataSet): PictureFacts {
  const facts = {
    rows: needed(dataSet, ROWS),
    columns: needed(dataSet, COLUMNS),
    samples: Number(valueOf(dataSet, SAMPLES) ?? 1),
    photometric: String(valueOf(dataSet, PHOTOMETRIC) ?? ''),
    bitsAllocated: needed(dataSet, BITS),
    frames: Number(valueOf(dataSet, FRAMES) ?? 1),
  };
  const { rows, columns, samples, photometric, bitsAllocated, frames } = facts;
  if (rows * columns > MOST_PIXELS)
    throw new FileRefusal('too-large', `The picture has more than ${MOST_PIXELS / 1e6} million pixels. Export it smaller.`);
  if (!Number.isInteger(frames) || frames < 1)
    throw new FileRefusal('broken', `The DICOM file is broken: ${tagText(FRAMES)} names no number of pictures.`);
  if (frames > MOST_FRAMES) throw new FileRefusal('too-large', `The DICOM file says that it holds ${frames} pictures; ${MOST_FRAMES} are the most.`);
  if (!isKnown(BITS, bitsAllocated) || !isKnown(SAMPLES, samples))
    throw new FileRefusal('not-read', `Pictures with ${samples} samples of ${bitsAllocated} bits are not read here.`);
  if (!isKnown(PHOTOMETRIC, photometric))
    throw new FileRefusal(
      'not-read',
      `Pictures of this kind are not read here: ${tagText(PHOTOMETRIC)} Photometric Interpretation names one that is not known.`,
    );
  return facts;
}

/** Bytes of all pictures together where they are not packed. */
export function plainLength({ rows, columns, samples, photometric, bitsAllocated, frames }: PictureFacts): number {
  // PS3.3 C.7.6.3.1.2: two pixels share their two colours
  const perPixel = photometric === 'YBR_FULL_422' ? 2 : samples;
  return (rows * columns * perPixel * bitsAllocated * frames) / 8;
}

function valueOf({ bytes, elements, encoding }: DicomDataSet, tag: number): string | number | undefined {
  const element = elements.find((other) => other.tag === tag);
  const vr = KEPT.get(tag)!.vrs[0]!;
  return element && valuesOf(bytes, element, vr, encoding)[0];
}

function needed(dataSet: DicomDataSet, tag: number): number {
  const value = Number(valueOf(dataSet, tag) ?? 0);
  if (value > 0) return value;
  throw new FileRefusal('no-picture', `The DICOM file holds no picture: ${tagText(tag)} ${KEPT.get(tag)!.name} is missing.`);
}

const isKnown = (tag: number, value: string | number) => KEPT.get(tag)!.rule([value] as string[]) !== null;
