import { type BeforeApplicationShutdown, Injectable, Logger, type OnModuleDestroy } from '@nestjs/common';
import { setTimeout as pause } from 'node:timers/promises';
import { Settings } from '../config/settings.js';
import { asDeliveryFault, DeliveryFault } from './delivery-fault.js';
import type { OutboxMail } from './entities/outbox-mail.entity.js';
import { buildMessage, mailboxOf, type WholeMessage } from './message.js';
import { OutboxService } from './outbox.service.js';
import { MailTransport, type SmtpSession } from './transport.js';

const BATCH = 20;
const FIRST_PAUSE_MS = 5000;
const HOUR = 3_600_000;
const LONGEST_PAUSE_MS = { temporary: HOUR, unreachable: 60_000 };
/** RFC 5321, 4.5.4.1: giving up takes at least four to five days. */
const GIVE_UP_MS = 5 * 24 * HOUR;
const MARK_TRIES_MS = [200, 500, 1000, 2000, 4000, 8000];

export interface SendingResult {
  sent: number;
  putBack: number;
  failed: number;
  uncertain: number;
}

/**
 * Sends what waits in the outbox, in any number of processes at once.
 *
 * What is promised: never two mails for one purpose, by this program. SMTP alone can not promise 'exactly
 * one': between the server's taking a mail and our knowing of it there is always a moment in which either
 * side can die. That moment is made as short as it can be: the body goes out first, the row is marked
 * 'handing-over', then only the closing dot follows.
 * - A crash before the mark: the server has no whole mail and throws it away (RFC 5321, 4.1.1.4); the lease
 *   runs out and the mail is tried again.
 * - A crash after the mark: the mail may have arrived. The row becomes 'uncertain' when its lease runs out,
 *   stands on the queue page, and is not sent again unless a person says so.
 * - Two who hold a mail, because one was slow: the mark asks for the own claim, so only one comes to the dot.
 */
@Injectable()
export class OutboxSender implements OnModuleDestroy, BeforeApplicationShutdown {
  private readonly logger = new Logger(OutboxSender.name);
  private running: Promise<SendingResult> | null = null;
  private isStopping = false;

  constructor(
    private readonly outbox: OutboxService,
    private readonly transport: MailTransport,
    private readonly settings: Settings,
  ) {}

  /** Sends all that is due at `at` (now, unless a test says otherwise). A second call joins the first. */
  sendDue(at?: Date): Promise<SendingResult> {
    this.running ??= this.sendAll(() => at ?? new Date()).finally(() => {
      this.running = null;
    });
    return this.running;
  }

  onModuleDestroy(): void {
    this.isStopping = true;
  }

  /** Lets the mail under way be finished; the others are given back. */
  async beforeApplicationShutdown(): Promise<void> {
    await this.running?.catch(() => undefined);
  }

  private async sendAll(clock: () => Date): Promise<SendingResult> {
    const result: SendingResult = { sent: 0, putBack: 0, failed: 0, uncertain: 0 };
    await this.outbox.recover(clock());
    while (!this.isStopping) {
      const { token, mails } = await this.outbox.claim(BATCH, clock());
      if (!mails.length) break;
      await this.sendBatch(token, mails, clock, result);
    }
    return result;
  }

  private async sendBatch(token: string, mails: OutboxMail[], clock: () => Date, result: SendingResult): Promise<void> {
    let session: SmtpSession | null = null;
    const waiting = [...mails];
    try {
      for (let mail = waiting.shift(); mail; mail = waiting.shift()) {
        if (this.isStopping) {
          waiting.unshift(mail);
          break;
        }
        if (!(await this.outbox.renew(mail.id, token, clock()))) continue;
        const message = await this.write(mail, token, result);
        if (!message) continue;
        try {
          session ??= await this.transport.open();
        } catch (error) {
          const fault = asDeliveryFault(error);
          for (const other of [mail, ...waiting.splice(0)]) await this.putBack(other, token, fault, clock(), result);
          break;
        }
        if (!(await this.sendOne(session, mail, message, token, clock, result))) session = null;
      }
    } finally {
      session?.end();
      await this.outbox.release(waiting.map((mail) => mail.id), token);
    }
  }

  private async write(mail: OutboxMail, token: string, result: SendingResult): Promise<WholeMessage | null> {
    try {
      return await buildMessage(mail, mailboxOf(this.settings.mailFrom));
    } catch (error) {
      // trying again would not help: the template or the row has to be mended
      this.logger.error(`mail ${mail.id}: ${error instanceof Error ? error.message : 'can not be written'}`);
      await this.outbox.markFailed(mail.id, token, `It could not be written from the template ${mail.template}.`);
      result.failed += 1;
      return null;
    }
  }

  /** False where the session can not be used any more. */
  private async sendOne(session: SmtpSession, mail: OutboxMail, message: WholeMessage, token: string, clock: () => Date, result: SendingResult): Promise<boolean> {
    let isHandingOver = false;
    try {
      await session.send(message, async () => {
        if (!(await this.outbox.markHandingOver(mail.id, token))) throw new DeliveryFault('unreachable', false, 'Another process has it.');
        isHandingOver = true;
      });
    } catch (error) {
      const fault = asDeliveryFault(error);
      if (isHandingOver && !fault.isAnswered) {
        await this.outbox.markUncertain(mail.id, token, `${fault.words} It may have arrived.`);
        result.uncertain += 1;
      } else {
        await this.putBack(mail, token, fault, clock(), result);
      }
      return false;
    }
    await this.noteSent(mail, token, clock());
    result.sent += 1;
    return true;
  }

  private async putBack(mail: OutboxMail, token: string, fault: DeliveryFault, now: Date, result: SendingResult): Promise<void> {
    if (fault.kind === 'permanent' || now.getTime() - mail.createdAt.getTime() > GIVE_UP_MS) {
      await this.outbox.markFailed(mail.id, token, fault.words);
      result.failed += 1;
      return;
    }
    const next = new Date(now.getTime() + pauseAfter(mail.attempts, LONGEST_PAUSE_MS[fault.kind]));
    if (await this.outbox.putBack(mail.id, token, next, fault.words)) result.putBack += 1;
  }

  /** The mail has gone: where the database is away just now, it is worth waiting to be able to say so. */
  private async noteSent(mail: OutboxMail, token: string, now: Date): Promise<void> {
    for (const wait of [...MARK_TRIES_MS, null]) {
      try {
        await this.outbox.markSent(mail, token, now);
        return;
      } catch (error) {
        if (wait === null) throw error;
        await pause(wait);
      }
    }
  }
}

/** Growing pauses, with a fifth more or less so that many mails do not come back in the same moment. */
export function pauseAfter(attempts: number, longest: number, random = Math.random()): number {
  const whole = Math.min(FIRST_PAUSE_MS * 2 ** Math.max(0, attempts - 1), longest);
  return Math.round(whole * (0.8 + 0.4 * random));
}
