import { setTimeout as pause } from 'node:timers/promises';
import express, { type Router } from 'express';
import { S3Error } from './errors.js';

const MODES = ['ok', 'fail', 'delay'] as const;
type Mode = (typeof MODES)[number];

const DEFAULT_DELAY_MS = 1000;
const MAX_DELAY_MS = 60_000;

/** The switch that makes the server fail or dawdle, for tests of what depends on it. */
export class Behaviour {
  private mode: Mode = 'ok';
  private delayMs = 0;
  private readonly closing = new AbortController();

  get current(): { mode: Mode; delayMs: number } {
    return { mode: this.mode, delayMs: this.delayMs };
  }

  /** Takes `{"mode", "delayMs"}`; answers what is wrong with it, or undefined. */
  change(wanted: unknown): string | undefined {
    const { mode, delayMs } = (typeof wanted === 'object' && wanted !== null ? wanted : {}) as Record<string, unknown>;
    if (!MODES.includes(mode as Mode)) return `mode must be one of ${MODES.join(', ')}`;
    const delay = delayMs ?? (mode === 'delay' ? DEFAULT_DELAY_MS : 0);
    if (typeof delay !== 'number' || !Number.isInteger(delay) || delay < 0 || delay > MAX_DELAY_MS) {
      return `delayMs must be a whole number from 0 to ${MAX_DELAY_MS}`;
    }
    this.mode = mode as Mode;
    this.delayMs = delay;
    return undefined;
  }

  /** Called before each S3 request. */
  async apply(): Promise<void> {
    if (this.mode === 'fail') throw new S3Error('SlowDown');
    if (this.mode !== 'delay') return;
    await pause(this.delayMs, undefined, { signal: this.closing.signal }).catch(() => undefined);
  }

  /** Lets go of requests that are still waiting. */
  close(): void {
    this.closing.abort();
  }
}

export function behaviourRouter(behaviour: Behaviour): Router {
  const router = express.Router();
  router.get('/', (_request, response) => {
    response.json(behaviour.current);
  });
  router.put('/', express.json({ type: () => true }), (request, response) => {
    const problem = behaviour.change(request.body);
    if (problem === undefined) response.json(behaviour.current);
    else response.status(400).json({ error: problem });
  });
  return router;
}
