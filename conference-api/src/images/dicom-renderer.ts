import { createRequire } from 'node:module';
import { join } from 'node:path';
import { Worker } from 'node:worker_threads';
import { Problem } from '../common/problems/problem.js';

export interface RenderedDicom {
  width: number;
  height: number;
  /** Four bytes a pixel. */
  rgba: Buffer;
  /** mm per pixel where the file tells it and pixels are square. */
  pixelSpacingMm: number | null;
}

const TIME_LIMIT_MS = 10_000;
const MOST_PIXELS = 60_000_000;

// A worker of its own, since a hostile file can make a parser run for ever or eat memory:
// then it is ended, and nothing else suffers. Plain CommonJS text, so that it needs no build.
const WORKER = `
const { parentPort, workerData } = require('node:worker_threads');
const load = require('node:module').createRequire(workerData.base);
const dcmjs = load('dcmjs');
dcmjs.log?.disableAll?.();
for (const name of ['log', 'info', 'warn', 'error', 'debug']) console[name] = () => {};
const { DicomImage, NativePixelDecoder } = load('dcmjs-imaging');
const number = (value) => { const n = Number(Array.isArray(value) ? value[0] : value); return Number.isFinite(n) ? n : null; };
(async () => {
  const bytes = workerData.bytes;
  await NativePixelDecoder.initializeAsync();
  const image = new DicomImage(bytes.buffer.slice(bytes.byteOffset, bytes.byteOffset + bytes.byteLength));
  const width = image.getWidth(), height = image.getHeight(), frames = image.getNumberOfFrames();
  if (!(width > 0 && height > 0)) return parentPort.postMessage({ refusal: 'no-picture' });
  if (width * height > workerData.mostPixels) return parentPort.postMessage({ refusal: 'too-large' });
  if (frames > 1) return parentPort.postMessage({ refusal: 'frames', frames });
  const result = image.render({ renderOverlays: false });
  const spacing = image.getElement('PixelSpacing') ?? image.getElement('ImagerPixelSpacing');
  const list = Array.isArray(spacing) ? spacing.map(Number) : typeof spacing === 'string' ? spacing.split('\\\\').map(Number) : [];
  const square = list.length === 2 && list.every((n) => Number.isFinite(n) && n > 0) && Math.abs(list[0] - list[1]) <= list[0] * 1e-3;
  const rgba = new Uint8Array(result.pixels);
  parentPort.postMessage({ width: result.width, height: result.height, rgba, pixelSpacingMm: square ? list[0] : null }, [rgba.buffer]);
})().catch(() => parentPort.postMessage({ refusal: 'unreadable' }));
`;

type Answer = { refusal: string; frames?: number } | (Omit<RenderedDicom, 'rgba'> & { rgba: Uint8Array });

const REFUSALS: Record<string, string> = {
  'no-picture': 'The DICOM file holds no picture.',
  'too-large': 'The picture has more than 60 million pixels.',
  unreadable: 'The DICOM file is broken or cut off, or written in a way that is not read here. Export it again.',
  time: 'Reading the DICOM file took too long. Export it again, without compression.',
};

export const unreadable = (detail: string) => new Problem('invalid', detail, [{ field: 'file', code: 'unreadable-image', message: detail }]);

/** Pixels for viewing of a single-frame DICOM file; problem 422 naming the fault otherwise. */
export async function renderDicom(bytes: Buffer): Promise<RenderedDicom> {
  const answer = await ask(bytes);
  if (!('refusal' in answer)) return { ...answer, rgba: Buffer.from(answer.rgba.buffer) };
  if (answer.refusal === 'frames')
    throw unreadable(`The DICOM file holds ${answer.frames} pictures; export the one that is needed as a single picture.`);
  throw unreadable(REFUSALS[answer.refusal] ?? REFUSALS['unreadable']!);
}

function ask(bytes: Buffer): Promise<Answer> {
  const worker = new Worker(WORKER, {
    eval: true,
    workerData: { bytes, base: createRequire(join(process.cwd(), 'package.json')).resolve('dcmjs-imaging'), mostPixels: MOST_PIXELS },
    resourceLimits: { maxOldGenerationSizeMb: 1024 },
    stdout: true,
    stderr: true,
  });
  return new Promise<Answer>((resolve) => {
    const timer = setTimeout(() => resolve({ refusal: 'time' }), TIME_LIMIT_MS);
    worker.once('message', (answer: Answer) => {
      clearTimeout(timer);
      resolve(answer);
    });
    const broken = () => {
      clearTimeout(timer);
      resolve({ refusal: 'unreadable' });
    };
    worker.once('error', broken);
    worker.once('exit', broken);
  }).finally(() => worker.terminate());
}
