import { Injectable } from '@nestjs/common';
import type { Response } from 'express';
import { DataSource } from 'typeorm';
import { MailQueueService } from '../mail/mail-queue.service.js';
import { MailTransport } from '../mail/transport.js';
import { StorageService } from '../storage/storage.service.js';
import type { HealthDto, PartDto } from './health.dto.js';

const LIMIT_MS = 2000;
const RETRY_AFTER_SECONDS = '5';

/** Asks each part whether it answers, all at once and each within its limit. */
@Injectable()
export class HealthService {
  private asking: Promise<HealthDto> | null = null;

  constructor(
    private readonly dataSource: DataSource,
    private readonly storage: StorageService,
    private readonly transport: MailTransport,
    private readonly queue: MailQueueService,
  ) {}

  async ready(response: Response): Promise<HealthDto> {
    // anyone may ask: many at once must not become many questions to the parts
    this.asking ??= this.ask().finally(() => {
      this.asking = null;
    });
    const health = await this.asking;
    response.set('Cache-Control', 'no-store');
    if (health.state === 'down') response.status(503).set('Retry-After', RETRY_AFTER_SECONDS);
    return health;
  }

  private async ask(): Promise<HealthDto> {
    let oldestUnsentMailSeconds: number | null = null;
    const [database, objectStore, mail] = await Promise.all([
      timed(async () => {
        await this.dataSource.query('SELECT 1');
        oldestUnsentMailSeconds = (await this.queue.findWaiting()).oldestUnsentSeconds;
      }),
      timed(() => this.storage.ping()),
      timed(() => this.transport.ping(LIMIT_MS)),
    ]);
    const parts = { database, objectStore, mail };
    const isUp = Object.values(parts).every((part) => part.state === 'up');
    return { state: isUp ? 'up' : 'down', parts, oldestUnsentMailSeconds };
  }
}

async function timed(question: () => Promise<void>): Promise<PartDto> {
  const begun = performance.now();
  let timer: NodeJS.Timeout | undefined;
  const limit = new Promise<never>((_, reject) => {
    timer = setTimeout(() => reject(new Error('no answer')), LIMIT_MS);
  });
  let state: PartDto['state'] = 'up';
  try {
    await Promise.race([question(), limit]);
  } catch {
    state = 'down';
  } finally {
    clearTimeout(timer);
  }
  return { state, milliseconds: Math.round(performance.now() - begun) };
}
