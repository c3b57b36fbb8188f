import { type BeforeApplicationShutdown, Injectable, Logger, type OnApplicationBootstrap, type OnModuleDestroy } from '@nestjs/common';
import { Interval } from '@nestjs/schedule';
import { Settings } from '../config/settings.js';
import { LiveEventFeed } from '../events/live-event-feed.service.js';
import { ImageSweepService } from '../images/image-sweep.service.js';
import { OutboxSender } from '../mail/outbox-sender.service.js';
import { AgendaDueService } from '../meetings/agenda-due.service.js';
import { SlotMeetingsService } from '../meetings/slot-meetings.service.js';
import { PeriodicTask } from './periodic-task.js';

const SECOND = 1000;
const MINUTE = 60 * SECOND;
const HOUR = 60 * MINUTE;

/**
 * What the server does by itself, in every process whose settings say so; each task can bear running in
 * several at once. What the sign-in leaves behind is swept in `auth/expired-secrets.service.ts`.
 */
@Injectable()
export class JobsService implements OnApplicationBootstrap, OnModuleDestroy, BeforeApplicationShutdown {
  private readonly logger = new Logger(JobsService.name);
  private isStopping = false;
  private readonly mail = this.task('sending mail', () => this.sender.sendDue());
  private readonly agendas = this.task('sending agendas', () => this.agendaDue.sendDue());
  private readonly slots = this.task('making meetings', () => this.slotMeetings.makeAhead());
  private readonly events = this.task('forgetting old live events', () => this.feed.forgetOld());
  private readonly images = this.task('sweeping images', () => this.imageSweep.sweep());

  constructor(
    private readonly settings: Settings,
    private readonly sender: OutboxSender,
    private readonly agendaDue: AgendaDueService,
    private readonly slotMeetings: SlotMeetingsService,
    private readonly feed: LiveEventFeed,
    private readonly imageSweep: ImageSweepService,
  ) {}

  onApplicationBootstrap(): void {
    void this.makeMeetings();
  }

  @Interval(SECOND)
  sendMail(): Promise<void> {
    return this.whenOn(this.mail);
  }

  @Interval(15 * SECOND)
  sendAgendas(): Promise<void> {
    return this.whenOn(this.agendas);
  }

  @Interval(5 * MINUTE)
  makeMeetings(): Promise<void> {
    return this.whenOn(this.slots);
  }

  @Interval(HOUR)
  forgetEvents(): Promise<void> {
    return this.whenOn(this.events);
  }

  @Interval(HOUR)
  sweepImages(): Promise<void> {
    return this.whenOn(this.images);
  }

  onModuleDestroy(): void {
    this.isStopping = true;
  }

  /** Nothing is broken off: what is under way comes to its end before the database is let go. */
  async beforeApplicationShutdown(): Promise<void> {
    await Promise.all([this.mail, this.agendas, this.slots, this.events, this.images].map((task) => task.settle()));
  }

  private async whenOn(task: PeriodicTask): Promise<void> {
    if (this.settings.jobs && !this.isStopping) await task.run();
  }

  private task(name: string, work: () => Promise<unknown>): PeriodicTask {
    return new PeriodicTask(name, work, this.logger);
  }
}
