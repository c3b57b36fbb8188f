import type { Projection } from '@kerfside/calc/vocabulary/images.js';
import { type ApiProblem, asProblem } from '@/lib/api/problem';
import type { Schemas } from '@/lib/api/types';

export interface ImageFields {
  projection: Projection;
  interval: string;
  caption: string;
}

export type UploadState =
  /** Not sent yet: looked at and described first. */
  | { kind: 'chosen' }
  | { kind: 'waiting' }
  | { kind: 'sending'; sent: number; total: number }
  /** All of it has arrived; the server reads the picture. */
  | { kind: 'reading' }
  | { kind: 'done'; image: Schemas['ImageDto'] }
  | { kind: 'refused'; problem: ApiProblem }
  | { kind: 'cancelled' };

export interface Upload {
  id: string;
  file: File;
  /** The picture as it would be sent, where browsers can show it: names burned into it are seen before. */
  preview: string | null;
  fields: ImageFields;
  state: UploadState;
}

export type SendImage = (
  file: File,
  fields: ImageFields,
  options: { signal: AbortSignal; onProgress: (sent: number, total: number) => void },
) => Promise<Schemas['ImageDto']>;

export const AT_ONCE = 3;

const SHOWN_BY_BROWSERS = ['image/jpeg', 'image/png', 'image/webp'];

const isUnderWay = ({ state }: Upload) => state.kind === 'sending' || state.kind === 'reading';
const isWaiting = ({ state }: Upload) => state.kind === 'waiting';

/** Sends pictures, three at once at most; each can be cancelled and tried again by itself. */
export class UploadQueue {
  private uploads: readonly Upload[] = [];
  private readonly listeners = new Set<() => void>();
  private readonly aborts = new Map<string, AbortController>();
  private nextId = 1;

  constructor(
    private readonly send: SendImage,
    private readonly onDone: (image: Schemas['ImageDto']) => void = () => undefined,
  ) {}

  readonly subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  readonly getSnapshot = (): readonly Upload[] => this.uploads;

  add(files: Iterable<File>): void {
    const added = [...files].map(
      (file): Upload => ({
        id: `upload-${this.nextId++}`,
        file,
        preview: SHOWN_BY_BROWSERS.includes(file.type) ? URL.createObjectURL(file) : null,
        fields: { projection: 'other', interval: '', caption: '' },
        state: { kind: 'chosen' },
      }),
    );
    this.put([...this.uploads, ...added]);
  }

  describe(id: string, fields: Partial<ImageFields>): void {
    this.put(this.uploads.map((upload) => (upload.id === id ? { ...upload, fields: { ...upload.fields, ...fields } } : upload)));
  }

  /** Sends all that are chosen. */
  start(): void {
    this.put(this.uploads.map((upload) => (upload.state.kind === 'chosen' ? { ...upload, state: { kind: 'waiting' } } : upload)));
    this.fill();
  }

  cancel(id: string): void {
    const upload = this.uploads.find((each) => each.id === id);
    if (!upload || !(isUnderWay(upload) || isWaiting(upload))) return;
    this.set(id, { kind: 'cancelled' });
    this.aborts.get(id)?.abort();
    this.fill();
  }

  cancelAll(): void {
    for (const upload of this.uploads.filter((each) => isWaiting(each) || isUnderWay(each))) this.cancel(upload.id);
  }

  retry(id: string): void {
    const kind = this.uploads.find((each) => each.id === id)?.state.kind;
    if (kind !== 'refused' && kind !== 'cancelled') return;
    this.set(id, { kind: 'waiting' });
    this.fill();
  }

  remove(id: string): void {
    this.cancel(id);
    const preview = this.uploads.find((upload) => upload.id === id)?.preview;
    if (preview) URL.revokeObjectURL(preview);
    this.put(this.uploads.filter((upload) => upload.id !== id));
  }

  private fill(): void {
    for (;;) {
      if (this.uploads.filter(isUnderWay).length >= AT_ONCE) return;
      const next = this.uploads.find(isWaiting);
      if (!next) return;
      this.set(next.id, { kind: 'sending', sent: 0, total: next.file.size });
      void this.run(next);
    }
  }

  private async run({ id, file, fields }: Upload): Promise<void> {
    const abort = new AbortController();
    this.aborts.set(id, abort);
    // an answer to a cancelled try must not touch a later one
    const settle = (state: UploadState) => {
      if (!abort.signal.aborted) this.set(id, state);
    };
    const onProgress = (sent: number, total: number) => settle(sent >= total ? { kind: 'reading' } : { kind: 'sending', sent, total });
    try {
      const image = await this.send(file, fields, { signal: abort.signal, onProgress });
      settle({ kind: 'done', image });
      // it is there though it was cancelled too late: the list must show it
      this.onDone(image);
    } catch (error) {
      settle({ kind: 'refused', problem: asProblem(error) });
    } finally {
      if (this.aborts.get(id) === abort) this.aborts.delete(id);
      this.fill();
    }
  }

  private set(id: string, state: UploadState): void {
    this.put(this.uploads.map((upload) => (upload.id === id ? { ...upload, state } : upload)));
  }

  private put(uploads: readonly Upload[]): void {
    this.uploads = uploads;
    for (const listener of this.listeners) listener();
  }
}
