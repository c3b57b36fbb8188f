import { createParser, type EventSourceMessage } from 'eventsource-parser';

export interface EventStreamOptions {
  url: string;
  /** A live token, or null when nobody is signed in. */
  token: () => Promise<string | null>;
  /** Renews the token after a 401. */
  renew: () => Promise<unknown>;
  onMessage: (message: EventSourceMessage) => void;
  onState?: (state: 'open' | 'waiting') => void;
  /** Milliseconds before the nth try in a row; tests shorten it. */
  pause?: (attempt: number) => number;
}

// half fixed, half random, so that all tabs do not come back in the same moment after a restart
const growingPause = (attempt: number) => Math.min(1000 * 2 ** attempt, 30_000) * (0.5 + Math.random() / 2);

const wait = (milliseconds: number, signal: AbortSignal) =>
  new Promise<void>((resolve) => {
    const timer = setTimeout(resolve, milliseconds);
    signal.addEventListener('abort', () => {
      clearTimeout(timer);
      resolve();
    });
  });

async function readStream(body: ReadableStream<Uint8Array>, feed: (text: string) => void, signal: AbortSignal) {
  const reader = body.getReader();
  const decoder = new TextDecoder();
  while (!signal.aborted) {
    const { done, value } = await reader.read();
    if (done) return;
    feed(decoder.decode(value, { stream: true }));
  }
}

/** Server-sent events over fetch, since EventSource can send no bearer token. Runs until the signal is aborted. */
export async function followEvents(options: EventStreamOptions, signal: AbortSignal): Promise<void> {
  let lastEventId = '';
  let failures = 0;
  const connect = async () => {
    const token = await options.token();
    if (token === null) return;
    const headers: Record<string, string> = { accept: 'text/event-stream', authorization: `Bearer ${token}` };
    if (lastEventId) headers['last-event-id'] = lastEventId;
    const response = await fetch(options.url, { headers, signal, cache: 'no-store' });
    if (response.status === 401) {
      await options.renew();
      return;
    }
    if (!response.ok || !response.body) return;
    options.onState?.('open');
    const parser = createParser({
      onEvent: (message) => {
        failures = 0;
        if (message.id) lastEventId = message.id;
        options.onMessage(message);
      },
    });
    await readStream(response.body, (text) => parser.feed(text), signal);
  };
  while (!signal.aborted) {
    try {
      await connect();
    } catch {
      // a lost connection is met by the next try
    }
    if (signal.aborted) return;
    options.onState?.('waiting');
    await wait((options.pause ?? growingPause)(failures), signal);
    failures += 1;
  }
}
