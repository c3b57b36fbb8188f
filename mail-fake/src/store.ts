import { randomUUID } from 'node:crypto';
import { appendFile, mkdir, open, readdir, readFile, rename, rm, stat, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { parseHeaderSection } from './message.js';

/** What the list shows of a message. `to` are the recipients of the envelope, not the To header. */
export interface MessageSummary {
  id: string;
  from: string;
  to: string[];
  subject: string;
  date: string;
}

export interface Envelope {
  from: string;
  to: string[];
}

export interface ListQuery {
  to?: string;
  limit: number;
  before?: string;
}

const HEADER_SECTION_LIMIT = 256 * 1024;

/**
 * Keeps messages in a folder: `messages/<id>.eml` as received, and `index.jsonl` with a line a message.
 * A message counts as kept once its line is in the index; a line torn by a crash is passed over.
 */
export class MessageStore {
  private messages: MessageSummary[] = [];
  private writing: Promise<unknown> = Promise.resolve();

  private constructor(private readonly folder: string) {}

  static async open(folder: string): Promise<MessageStore> {
    const store = new MessageStore(folder);
    await rm(store.path('incoming'), { recursive: true, force: true });
    await mkdir(store.path('incoming'), { recursive: true });
    await mkdir(store.path('messages'), { recursive: true });
    const index = await readFile(store.path('index.jsonl'), 'utf8').catch(emptyWhenMissing);
    const files = new Set(await readdir(store.path('messages')));
    store.messages = index
      .split('\n')
      .map(readIndexLine)
      .filter((message): message is MessageSummary => message !== null && files.has(`${message.id}.eml`));
    return store;
  }

  get count(): number {
    return this.messages.length;
  }

  /** Where a message is written while it still comes in. */
  newIncomingFile(): string {
    return this.path('incoming', randomUUID());
  }

  async discard(incomingFile: string): Promise<void> {
    await rm(incomingFile, { force: true });
  }

  /** Takes a wholly received file over. Each delivery is a message of its own, also when it repeats one. */
  async keep(incomingFile: string, envelope: Envelope): Promise<MessageSummary> {
    const headers = await parseHeaderSection(await readHeaderSection(incomingFile));
    return this.inTurn(async () => {
      const message: MessageSummary = {
        id: randomUUID(),
        from: headers.from ?? envelope.from,
        to: envelope.to,
        subject: headers.subject ?? '',
        date: new Date().toISOString(),
      };
      await rename(incomingFile, this.emlPath(message.id));
      // The line break comes first, so that a torn line cannot spoil the next one.
      await appendFile(this.path('index.jsonl'), `\n${JSON.stringify(message)}`);
      this.messages.push(message);
      return message;
    });
  }

  /** Newest first, at most `limit`; `before` continues below that message. Null when `before` is not kept. */
  list({ to, limit, before }: ListQuery): { messages: MessageSummary[]; total: number; next: string | null } | null {
    const wanted = to?.toLowerCase();
    const isWanted = (message: MessageSummary) =>
      wanted === undefined || message.to.some((address) => address.toLowerCase() === wanted);
    const end = before === undefined ? this.messages.length : this.messages.findIndex(({ id }) => id === before);
    if (end < 0) {
      return null;
    }
    const total = this.messages.filter(isWanted).length;
    const below = this.messages.slice(0, end).filter(isWanted).reverse();
    const messages = below.slice(0, limit);
    return { messages, total, next: below.length > limit ? (messages.at(-1)?.id ?? null) : null };
  }

  /** A message with its bytes as received, or null when it is not kept (any more). */
  async read(id: string): Promise<{ message: MessageSummary; raw: Buffer } | null> {
    const message = this.messages.find((kept) => kept.id === id);
    if (!message) {
      return null;
    }
    try {
      return { message, raw: await readFile(this.emlPath(id)) };
    } catch (error) {
      if ((error as NodeJS.ErrnoException).code === 'ENOENT') {
        return null;
      }
      throw error;
    }
  }

  async deleteAll(): Promise<void> {
    await this.inTurn(async () => {
      const emptied = this.path('incoming', randomUUID());
      await writeFile(emptied, '');
      await rename(emptied, this.path('index.jsonl'));
      this.messages = [];
      await rm(this.path('messages'), { recursive: true, force: true });
      await mkdir(this.path('messages'));
    });
  }

  /** Waits for what is being written. */
  async close(): Promise<void> {
    await this.writing;
  }

  private inTurn<T>(work: () => Promise<T>): Promise<T> {
    const result = this.writing.then(work);
    this.writing = result.catch(() => undefined);
    return result;
  }

  private emlPath(id: string): string {
    return this.path('messages', `${id}.eml`);
  }

  private path(...parts: string[]): string {
    return join(this.folder, ...parts);
  }
}

async function readHeaderSection(file: string): Promise<Buffer> {
  const { size } = await stat(file);
  const handle = await open(file);
  try {
    const start = Buffer.alloc(Math.min(size, HEADER_SECTION_LIMIT));
    await handle.read(start, 0, start.length, 0);
    const end = start.indexOf('\r\n\r\n');
    return end < 0 ? start : start.subarray(0, end + 4);
  } finally {
    await handle.close();
  }
}

function readIndexLine(line: string): MessageSummary | null {
  try {
    const value = JSON.parse(line) as MessageSummary;
    return typeof value.id === 'string' && Array.isArray(value.to) ? value : null;
  } catch {
    return null;
  }
}

function emptyWhenMissing(error: NodeJS.ErrnoException): string {
  if (error.code === 'ENOENT') {
    return '';
  }
  throw error;
}
