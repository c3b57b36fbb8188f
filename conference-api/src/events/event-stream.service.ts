import { type BeforeApplicationShutdown, Injectable } from '@nestjs/common';
import type { Request, Response } from 'express';
import { DataSource, In, IsNull, MoreThan } from 'typeorm';
import type { Actor } from '../access/actor.js';
import { Session } from '../auth/entities/session.entity.js';
import { unavailable } from '../common/problems/problem.js';
import { type FedEvent, LiveEventFeed } from './live-event-feed.service.js';
import { mayHear } from './may-hear.js';

const HEARTBEAT_MS = 15_000;
const SESSION_CHECK_MS = 2000;
/** A page that does not read is cut off here; it comes back with its last event's id. */
const MOST_WAITING_BYTES = 256 * 1024;
const MOST_STREAMS_OF_ONE = 20;
const MOST_REPLAYED = 500;

interface Stream {
  actor: Actor;
  response: Response;
  /** What comes while the stream is being opened; null once it is open. */
  early: FedEvent[] | null;
}

/** Server-sent events to open pages. Each event is asked for each person anew; roles are those of when the stream was opened. */
@Injectable()
export class EventStreamService implements BeforeApplicationShutdown {
  private readonly streams = new Set<Stream>();
  private heartbeat: NodeJS.Timeout | null = null;
  private sessionsCheckedAt = 0;
  private isStopping = false;

  constructor(
    private readonly feed: LiveEventFeed,
    private readonly dataSource: DataSource,
  ) {}

  /** Where `lastEventId` is too old to go on from, an event `reset` tells the page that anything may have changed. */
  async open(actor: Actor, lastEventId: string | undefined, request: Request, response: Response): Promise<void> {
    if (this.isStopping) throw unavailable('server');
    this.closeOldestOf(actor);
    // among the streams from here on, so that nothing is missed between the replay and the first live event
    const stream: Stream = { actor, response, early: [] };
    this.streams.add(stream);
    try {
      await this.feed.start((events) => this.tell(events), () => this.closeEnded());
      const missed = lastEventId ? await this.findMissed(lastEventId) : [];
      if (request.destroyed || response.destroyed) this.remove(stream);
      else if (!this.streams.has(stream)) throw unavailable('server');
      else this.begin(stream, missed);
    } catch (error) {
      this.remove(stream);
      throw error;
    }
  }

  beforeApplicationShutdown(): void {
    this.isStopping = true;
    for (const stream of [...this.streams]) this.close(stream);
  }

  private begin(stream: Stream, missed: FedEvent[] | null): void {
    const { response } = stream;
    response.status(200).set({
      'Content-Type': 'text/event-stream; charset=utf-8',
      'Cache-Control': 'no-store',
      'X-Accel-Buffering': 'no',
      Connection: 'keep-alive',
    });
    response.flushHeaders();
    response.on('close', () => this.remove(stream));
    response.on('error', () => this.remove(stream));
    this.heartbeat ??= setInterval(() => this.beat(), HEARTBEAT_MS);
    const early = stream.early ?? [];
    stream.early = null;
    this.write(stream, 'retry: 3000\n\n');
    if (missed === null) this.write(stream, 'event: reset\ndata: {}\n\n');
    const replayed = new Set(missed?.map(({ event }) => event.id));
    for (const fed of [...(missed ?? []), ...early.filter(({ event }) => !replayed.has(event.id))]) this.tellOne(stream, fed);
  }

  private async findMissed(lastEventId: string): Promise<FedEvent[] | null> {
    return /^\d{1,19}$/.test(lastEventId) ? this.feed.findSince(lastEventId, MOST_REPLAYED) : null;
  }

  private tell(events: FedEvent[]): void {
    for (const event of events) for (const stream of [...this.streams]) this.tellOne(stream, event);
  }

  private tellOne(stream: Stream, fed: FedEvent): void {
    if (stream.early) {
      stream.early.push(fed);
      return;
    }
    if (!mayHear(stream.actor, fed)) return;
    const { id, kind, caseId, meetingId, conferenceId, personId } = fed.event;
    this.write(stream, `id: ${id}\nevent: ${kind}\ndata: ${JSON.stringify({ id, kind, caseId, meetingId, conferenceId })}\n\n`);
    // its roles are others now: the page opens a new stream, if it still may
    if (kind === 'membership-changed' && personId === stream.actor.personId) this.close(stream);
  }

  private write(stream: Stream, text: string): void {
    if (!this.streams.has(stream) || stream.early) return;
    if (stream.response.writableLength > MOST_WAITING_BYTES) {
      this.remove(stream);
      stream.response.destroy();
      return;
    }
    stream.response.write(text);
  }

  private beat(): void {
    for (const stream of [...this.streams]) this.write(stream, ': beat\n\n');
  }

  /** Streams whose session was ended or has run out, and those of people who were shut out. */
  private async closeEnded(): Promise<void> {
    if (Date.now() - this.sessionsCheckedAt < SESSION_CHECK_MS || !this.streams.size) return;
    this.sessionsCheckedAt = Date.now();
    const ids = [...new Set([...this.streams].map((stream) => stream.actor.sessionId))];
    const live = await this.dataSource.manager.find(Session, {
      select: { id: true },
      where: { id: In(ids), endedAt: IsNull(), expiresAt: MoreThan(new Date()), person: { isActive: true } },
    });
    const liveIds = new Set(live.map((session) => session.id));
    for (const stream of [...this.streams]) if (ids.includes(stream.actor.sessionId) && !liveIds.has(stream.actor.sessionId)) this.close(stream);
  }

  private closeOldestOf(actor: Actor): void {
    const own = [...this.streams].filter((stream) => stream.actor.personId === actor.personId);
    if (own.length >= MOST_STREAMS_OF_ONE) this.close(own[0]!);
  }

  private close(stream: Stream): void {
    this.remove(stream);
    // one that is being opened sees that it was taken out
    if (!stream.early) stream.response.end();
  }

  private remove(stream: Stream): void {
    this.streams.delete(stream);
    if (this.streams.size) return;
    this.feed.stop();
    if (this.heartbeat) clearInterval(this.heartbeat);
    this.heartbeat = null;
  }
}
