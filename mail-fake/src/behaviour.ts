import { type FieldError, invalidInput, Problem } from './problem.js';

const MODES = ['accept', 'refuse', 'delay'] as const;
const CODES = [451, 550] as const;
const PLACES = ['connect', 'rcpt', 'data'] as const;
export const LONGEST_DELAY_MS = 600_000;

export type Place = (typeof PLACES)[number];

export interface BehaviourSettings {
  mode: (typeof MODES)[number];
  delayMs: number;
  code: (typeof CODES)[number];
  at: Place;
}

export const DEFAULT_BEHAVIOUR: BehaviourSettings = { mode: 'accept', delayMs: 0, code: 451, at: 'rcpt' };

/** What the SMTP server is to answer instead of accepting. */
export class SmtpRefusal extends Error {
  constructor(
    readonly responseCode: number,
    message: string,
  ) {
    super(message);
  }
}

/** The switch that tests turn: how the SMTP side answers from now on. Not kept over a restart. */
export class Behaviour {
  private settings: BehaviourSettings = DEFAULT_BEHAVIOUR;
  private readonly waiting = new Set<() => void>();
  private closed = false;

  get current(): BehaviourSettings {
    return { ...this.settings };
  }

  set(settings: BehaviourSettings): void {
    this.settings = { ...settings };
  }

  /** The refusal that the switch asks for at this place, or null. */
  refusalAt(place: Place): SmtpRefusal | null {
    const { mode, at, code } = this.settings;
    if (mode !== 'refuse' || at !== place) {
      return null;
    }
    const permanent = code === 550;
    const text = `Refused, because the test server is set to refuse (${permanent ? 'permanent' : 'temporary'})`;
    // RFC 5321 3.1 and 4.2.3: a server that gives no greeting says 554, or 421 when it may be tried again.
    return new SmtpRefusal(place === 'connect' ? (permanent ? 554 : 421) : code, text);
  }

  /** Waits as long as the switch asks for at this place; closing the server ends the wait with a refusal. */
  async pauseAt(place: Place): Promise<void> {
    const { mode, at, delayMs } = this.settings;
    if (mode === 'delay' && at === place && !this.closed) {
      await new Promise<void>((resolve) => {
        const done = () => {
          clearTimeout(timer);
          this.waiting.delete(done);
          resolve();
        };
        const timer = setTimeout(done, delayMs);
        this.waiting.add(done);
      });
    }
    if (this.closed) {
      throw new SmtpRefusal(421, 'The test server is stopping');
    }
  }

  /** Ends all waits, so that closing the server does not take as long as the delay. */
  close(): void {
    this.closed = true;
    for (const done of [...this.waiting]) {
      done();
    }
  }
}

/** Reads the body of `PUT /api/behaviour`; throws a problem that names every bad field. */
export function readBehaviour(body: unknown): BehaviourSettings {
  if (typeof body !== 'object' || body === null || Array.isArray(body)) {
    throw new Problem(400, 'not-an-object', 'Send a JSON object with "mode".');
  }
  const input = body as Record<string, unknown>;
  const errors: FieldError[] = Object.keys(input)
    .filter((key) => !Object.hasOwn(DEFAULT_BEHAVIOUR, key))
    .map((field) => ({ field, code: 'unknown', message: 'is not a field of the behaviour' }));
  const oneOf = <T>(field: string, allowed: readonly T[], fallback?: T): T => {
    const value = input[field] === undefined ? fallback : input[field];
    if (!allowed.includes(value as T)) {
      errors.push({ field, code: 'not-allowed', message: `must be one of ${allowed.join(', ')}` });
    }
    return value as T;
  };
  const settings: BehaviourSettings = {
    mode: oneOf('mode', MODES),
    code: oneOf('code', CODES, DEFAULT_BEHAVIOUR.code),
    at: oneOf('at', PLACES, DEFAULT_BEHAVIOUR.at),
    delayMs: (input.delayMs ?? DEFAULT_BEHAVIOUR.delayMs) as number,
  };
  const shortest = settings.mode === 'delay' ? 1 : 0;
  if (!Number.isInteger(settings.delayMs) || settings.delayMs < shortest || settings.delayMs > LONGEST_DELAY_MS) {
    const message = `must be a whole number of milliseconds, ${shortest} to ${LONGEST_DELAY_MS}`;
    errors.push({ field: 'delayMs', code: 'out-of-range', message });
  }
  if (errors.length > 0) {
    throw invalidInput(errors);
  }
  return settings;
}
