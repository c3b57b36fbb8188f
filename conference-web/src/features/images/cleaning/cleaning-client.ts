import { FileRefusal } from '@kerfside/calc/deidentification/file-refusal';
import { MOST_BYTES } from '@kerfside/calc/deidentification/limits';
import type { CleaningAnswer, CleaningRequest } from './answer-cleaning.js';
import type { CleanedFile, CleanOptions } from './cleaned-file.js';

/** The part of a Worker that is used. */
export interface CleaningWorker {
  postMessage(request: CleaningRequest): void;
  onmessage: ((event: MessageEvent<CleaningAnswer>) => void) | null;
  onerror: ((event: ErrorEvent) => void) | null;
  terminate(): void;
}

/** What one file may take; the largest film needs about two seconds. */
const TIME_LIMIT_MS = 20_000;

/**
 * Cleans the files of one upload in a worker, one after another, with the same new UIDs for the same old
 * ones. A file that takes too long, or more memory than there is, ends the worker; the next gets another.
 */
export class CleaningClient {
  private worker: CleaningWorker | null = null;
  private uids: [string, string][] = [];
  private turn: Promise<unknown> = Promise.resolve();
  private count = 0;

  constructor(
    private readonly startWorker: () => CleaningWorker,
    private readonly timeLimitMs = TIME_LIMIT_MS,
  ) {}

  /** Rejects with a FileRefusal, whose message is for the presenter. */
  clean(file: Blob, options: CleanOptions): Promise<CleanedFile> {
    const cleaned = this.turn.then(() => this.cleanNow(file, options));
    this.turn = cleaned.catch(() => undefined);
    return cleaned;
  }

  close(): void {
    this.worker?.terminate();
    this.worker = null;
  }

  private async cleanNow(file: Blob, options: CleanOptions): Promise<CleanedFile> {
    if (file.size === 0) throw new FileRefusal('empty', 'The file is empty.');
    if (file.size > MOST_BYTES) throw new FileRefusal('too-large', `The file is larger than ${MOST_BYTES / 1024 / 1024} MB.`);
    const answer = await this.ask({ id: ++this.count, file, options, uids: this.uids });
    if ('refusal' in answer) throw new FileRefusal(answer.refusal.fault, answer.refusal.message);
    this.uids = answer.uids;
    return answer.cleaned;
  }

  private ask(request: CleaningRequest): Promise<CleaningAnswer> {
    const worker = (this.worker ??= this.startWorker());
    return new Promise((resolve, reject) => {
      const end = (message: string) => {
        clearTimeout(timer);
        this.close();
        reject(new FileRefusal('not-read', message));
      };
      const timer = setTimeout(() => end('Cleaning the file took too long. Export it again, without compression.'), this.timeLimitMs);
      worker.onmessage = ({ data }) => {
        if (data.id !== request.id) return;
        clearTimeout(timer);
        resolve(data);
      };
      worker.onerror = () => end('The file could not be cleaned: it needs more memory than there is, or is broken.');
      worker.postMessage(request);
    });
  }
}
