import { setTimeout as pause } from 'node:timers/promises';

export interface HeardEvent {
  id?: string;
  event?: string;
  data?: { id?: string; kind?: string; caseId?: string | null; meetingId?: string | null; conferenceId?: string | null };
}

export interface Listening {
  status: number;
  headers: Headers;
  heard: HeardEvent[];
  /** Resolves with the first event that fits, heard already or still to come; throws after `limitMs`. */
  until: (fits: (event: HeardEvent) => boolean, limitMs?: number) => Promise<HeardEvent>;
  /** Resolves when the server has ended the stream. */
  ended: Promise<void>;
  stop: () => void;
}

/** Opens the stream of live events, as a page does. */
export async function listen(baseUrl: string, auth: { Authorization: string }, lastEventId?: string): Promise<Listening> {
  const abort = new AbortController();
  const headers = { ...auth, accept: 'text/event-stream', ...(lastEventId ? { 'last-event-id': lastEventId } : {}) };
  const response = await fetch(`${baseUrl}/api/events`, { headers, signal: abort.signal });
  const heard: HeardEvent[] = [];
  const ended = response.ok && response.body ? read(response.body, heard).catch(() => undefined) : response.text().then(() => undefined);
  return {
    status: response.status,
    headers: response.headers,
    heard,
    ended,
    stop: () => abort.abort(),
    until: async (fits, limitMs = 8000) => {
      for (const begun = Date.now(); Date.now() - begun < limitMs; await pause(20)) {
        const found = heard.find(fits);
        if (found) return found;
      }
      throw new Error(`no such event within ${limitMs} ms; heard ${JSON.stringify(heard)}`);
    },
  };
}

async function read(body: ReadableStream<Uint8Array>, heard: HeardEvent[]): Promise<void> {
  let text = '';
  const decoder = new TextDecoder();
  for await (const chunk of body) {
    text += decoder.decode(chunk, { stream: true });
    for (let end = text.indexOf('\n\n'); end >= 0; end = text.indexOf('\n\n')) {
      const event = parse(text.slice(0, end));
      if (event) heard.push(event);
      text = text.slice(end + 2);
    }
  }
}

function parse(block: string): HeardEvent | null {
  const fields = block.split('\n').filter((line) => !line.startsWith(':')).map((line) => /^(\w+): ?(.*)$/.exec(line)).filter((match) => match !== null);
  const value = (name: string) => fields.find((match) => match[1] === name)?.[2];
  if (value('data') === undefined) return null;
  return { id: value('id'), event: value('event'), data: JSON.parse(value('data')!) };
}
