import { Injectable, Logger } from '@nestjs/common';
import { Interval } from '@nestjs/schedule';
import { DataSource, LessThan } from 'typeorm';
import { Settings } from '../config/settings.js';
import { OneTimeToken } from './entities/one-time-token.entity.js';
import { Session } from './entities/session.entity.js';
import { SignInFailure } from './entities/sign-in-failure.entity.js';

const HOUR = 60 * 60 * 1000;
const DAY = 24 * HOUR;

/** Forgets what no longer serves: old failures, links and sessions. The audit trail keeps what happened. */
@Injectable()
export class ExpiredSecretsService {
  private readonly logger = new Logger(ExpiredSecretsService.name);

  constructor(
    private readonly dataSource: DataSource,
    private readonly settings: Settings,
  ) {}

  @Interval(HOUR)
  async sweepHourly(): Promise<void> {
    if (!this.settings.jobs) return;
    // any process may do it, and the next hour comes: a failure is only noted
    await this.sweep(new Date()).catch((error: unknown) => this.logger.warn(`sweep failed: ${error instanceof Error ? error.name : typeof error}`));
  }

  async sweep(now: Date): Promise<void> {
    const before = (days: number) => LessThan(new Date(now.getTime() - days * DAY));
    const { manager } = this.dataSource;
    await manager.delete(SignInFailure, { at: before(1) });
    await manager.delete(OneTimeToken, { expiresAt: before(30) });
    await manager.delete(Session, { expiresAt: before(30) });
    await manager.delete(Session, { endedAt: before(30) });
  }
}
