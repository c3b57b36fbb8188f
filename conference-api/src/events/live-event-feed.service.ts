import { type BeforeApplicationShutdown, Injectable, Logger } from '@nestjs/common';
import { DataSource, In, LessThan, MoreThan, MoreThanOrEqual } from 'typeorm';
import { Case } from '../cases/entities/case.entity.js';
import { LiveEvent } from './entities/live-event.entity.js';

const POLL_MS = 500;
/** Ids are given when a row is written and seen when it is committed: one may turn up behind a later one by as much as a transaction lasts. */
const LOOK_BACK_MS = 30_000;
const REPLAY_BACK_MS = 5000;
const PAGE = 500;
const KEPT_MS = 24 * 3_600_000;

export type CaseFactsOf = Pick<Case, 'id' | 'conferenceId' | 'presenterId' | 'treatingSurgeonId' | 'stage' | 'releasedAt'>;

/** An event with what has to be known to say who may hear of it. */
export interface FedEvent {
  event: LiveEvent;
  found: CaseFactsOf | null;
}

/** Reads the table of live events for this process, once for all its streams, while there are any. */
@Injectable()
export class LiveEventFeed implements BeforeApplicationShutdown {
  private readonly logger = new Logger(LiveEventFeed.name);
  private readonly seen = new Map<string, number>();
  private timer: NodeJS.Timeout | null = null;
  private starting: Promise<void> | null = null;
  private polling: Promise<void> | null = null;
  private isFailing = false;
  private lookedAt = 0;
  private listener: ((events: FedEvent[]) => void) | null = null;
  private onTick: (() => Promise<void>) | null = null;

  constructor(private readonly dataSource: DataSource) {}

  /** Resolves once everything that is committed from now on will be heard; throws where the database is away. */
  async start(listener: (events: FedEvent[]) => void, onTick: () => Promise<void>): Promise<void> {
    this.listener = listener;
    this.onTick = onTick;
    if (this.timer) return;
    this.starting ??= this.prime().finally(() => {
      this.starting = null;
    });
    await this.starting;
  }

  stop(): void {
    if (this.timer) clearInterval(this.timer);
    this.timer = null;
    this.seen.clear();
  }

  async beforeApplicationShutdown(): Promise<void> {
    this.stop();
    await this.polling;
  }

  /**
   * What came after the event `id`, or null where that is not known any more. A few that were heard before
   * can be among them: hearing twice only makes a page ask twice.
   */
  async findSince(id: string, most: number): Promise<FedEvent[] | null> {
    const { manager } = this.dataSource;
    const last = await manager.findOneBy(LiveEvent, { id });
    if (!last) return null;
    const since = new Date(last.at.getTime() - REPLAY_BACK_MS);
    const where = [{ id: MoreThan(id) }, { id: LessThan(id), at: MoreThanOrEqual(since) }];
    const events = await manager.find(LiveEvent, { where, order: { id: 'ASC' }, take: most + 1 });
    return events.length > most ? null : this.withFacts(events);
  }

  /** Deletes events that no stream can ask for any more. */
  async forgetOld(now = new Date()): Promise<void> {
    await this.dataSource.manager.delete(LiveEvent, { at: LessThan(new Date(now.getTime() - KEPT_MS)) });
  }

  private async prime(): Promise<void> {
    await this.readNew();
    this.timer = setInterval(() => void this.poll(), POLL_MS);
  }

  /** One look at a time: a slow database is not asked again before it has answered. */
  private poll(): Promise<void> {
    this.polling ??= this.look().finally(() => {
      this.polling = null;
    });
    return this.polling;
  }

  private async look(): Promise<void> {
    try {
      await this.onTick?.();
      const events = await this.readNew();
      if (events.length && this.timer) this.listener?.(await this.withFacts(events));
      if (this.isFailing) this.logger.log('live events are read again');
      this.isFailing = false;
    } catch (error) {
      // streams stay open and hear what they missed when the database is back
      if (!this.isFailing) this.logger.warn(`live events can not be read: ${error instanceof Error ? error.name : 'fault'}`);
      this.isFailing = true;
    }
  }

  private async readNew(): Promise<LiveEvent[]> {
    const now = Date.now();
    // after an outage back to the last good look, not only the usual while
    const since = Math.min(now, this.timer ? this.lookedAt : now) - LOOK_BACK_MS;
    const fresh: LiveEvent[] = [];
    for (let after = '0'; ; ) {
      const page = await this.dataSource.manager.find(LiveEvent, { where: { at: MoreThan(new Date(since)), id: MoreThan(after) }, order: { id: 'ASC' }, take: PAGE });
      for (const event of page) if (!this.seen.has(event.id)) fresh.push(event);
      if (page.length < PAGE) break;
      after = page.at(-1)!.id;
    }
    for (const event of fresh) this.seen.set(event.id, event.at.getTime());
    this.lookedAt = now;
    for (const [id, at] of this.seen) if (at < since - LOOK_BACK_MS) this.seen.delete(id);
    return fresh;
  }

  private async withFacts(events: LiveEvent[]): Promise<FedEvent[]> {
    const ids = [...new Set(events.map((event) => event.caseId).filter((id) => id !== null))];
    const cases = ids.length
      ? await this.dataSource.manager.find(Case, {
          select: { id: true, conferenceId: true, presenterId: true, treatingSurgeonId: true, stage: true, releasedAt: true },
          where: { id: In(ids) },
        })
      : [];
    const byId = new Map(cases.map((found) => [found.id, found]));
    return events.map((event) => ({ event, found: event.caseId ? (byId.get(event.caseId) ?? null) : null }));
  }
}
