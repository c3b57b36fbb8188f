import { Injectable, type OnApplicationShutdown } from '@nestjs/common';
import { createRequire } from 'node:module';
import { join } from 'node:path';
import { Worker } from 'node:worker_threads';
import { type DicomFault, DicomRefusal } from './dicom-elements.js';
import { checkDicomStructure } from './dicom-structure.js';
import { DICOM_WORKER } from './dicom-worker.js';
import { MOST_PIXELS } from './pixel-limit.js';
import { unreadable } from './unreadable.js';

/** Pixels as they are seen, one byte a channel: grey, or RGB. */
export interface PlainPixels {
  data: Buffer;
  width: number;
  height: number;
  channels: 1 | 3;
  /** mm per pixel where the file tells it and pixels are square. */
  pixelSpacingMm: number | null;
}

type Refusal = { refusal: DicomFault | 'time' };
type Answer = Refusal | (Omit<PlainPixels, 'data'> & { pixels: Uint8Array });

const IDLE_MS = 60_000;

const REFUSALS: Record<DicomFault | 'time', string> = {
  'cut-off': 'The DICOM file is cut off: a part of the picture is missing. Export it again.',
  broken: 'The DICOM file is broken, or written in a way that is not read here. Export it again.',
  'too-large': 'The picture has more than 60 million pixels. Export it smaller.',
  'no-picture': 'The DICOM file holds no picture.',
  frames: 'The DICOM file holds several pictures; export the one that is needed as a single picture.',
  'not-read': 'The DICOM file is written in a way that would be shown wrongly here (colour with run lengths, or 32 bits big-endian). Export it uncompressed.',
  time: 'Reading the DICOM file took too long. Export it again, without compression.',
};

/**
 * Pixels for viewing of a DICOM file. A hostile file can make a decoder run for ever or eat memory, so the
 * decoder runs in a worker: past its time it is ended and the next file gets a new one. Starting one takes
 * longer than most pictures, so it is kept for a minute.
 */
@Injectable()
export class DicomRenderer implements OnApplicationShutdown {
  /** What one file may take. */
  timeLimitMs = 10_000;
  private worker: Worker | null = null;
  private idle: NodeJS.Timeout | undefined;
  private turn: Promise<unknown> = Promise.resolve();

  /** Problem 422 that names the fault where the file is no single whole picture. */
  async render(bytes: Buffer): Promise<PlainPixels> {
    try {
      await checkDicomStructure(bytes);
    } catch (error) {
      throw error instanceof DicomRefusal ? unreadable(wordsFor(error)) : error;
    }
    const answer = await this.inTurn(() => this.ask(bytes));
    if ('refusal' in answer) throw unreadable(REFUSALS[answer.refusal]);
    const { pixels, ...rest } = answer;
    return { ...rest, data: Buffer.from(pixels.buffer, pixels.byteOffset, pixels.byteLength) };
  }

  async onApplicationShutdown(): Promise<void> {
    clearTimeout(this.idle);
    await this.end();
  }

  private inTurn<T>(work: () => Promise<T>): Promise<T> {
    const result = this.turn.then(work);
    this.turn = result.catch(() => undefined);
    return result;
  }

  private async ask(bytes: Buffer): Promise<Answer> {
    clearTimeout(this.idle);
    const worker = (this.worker ??= this.start());
    worker.ref();
    const answer = await this.answerOf(worker, bytes);
    // a decoder that met a fault may have been left in any state
    if ('refusal' in answer) await this.end();
    else {
      worker.unref();
      this.idle = setTimeout(() => void this.end(), IDLE_MS).unref();
    }
    return answer;
  }

  private answerOf(worker: Worker, bytes: Buffer): Promise<Answer> {
    return new Promise<Answer>((resolve) => {
      const answered = (answer: Answer) => {
        clearTimeout(timer);
        worker.off('message', answered).off('error', broken).off('exit', broken);
        resolve(answer);
      };
      const broken = () => answered({ refusal: 'broken' });
      const timer = setTimeout(() => answered({ refusal: 'time' }), this.timeLimitMs);
      worker.on('message', answered).on('error', broken).on('exit', broken);
      const copy = new Uint8Array(bytes).buffer;
      worker.postMessage(copy, [copy]);
    });
  }

  private start(): Worker {
    const worker = new Worker(DICOM_WORKER, {
      eval: true,
      workerData: { base: createRequire(join(process.cwd(), 'package.json')).resolve('dcmjs-imaging'), mostPixels: MOST_PIXELS },
      resourceLimits: { maxOldGenerationSizeMb: 1024 },
      stdout: true,
      stderr: true,
    });
    // one that fails while nothing is asked of it is replaced with the next file
    worker.on('error', () => this.forget(worker)).on('exit', () => this.forget(worker));
    return worker;
  }

  private forget(worker: Worker): void {
    if (this.worker === worker) this.worker = null;
  }

  private async end(): Promise<void> {
    const worker = this.worker;
    this.worker = null;
    await worker?.terminate();
  }
}

const wordsFor = ({ fault, frames }: DicomRefusal) => (frames ? REFUSALS.frames.replace('several', String(frames)) : REFUSALS[fault]);
