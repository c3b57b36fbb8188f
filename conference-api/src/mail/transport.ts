import { Injectable } from '@nestjs/common';
import SMTPConnection from 'nodemailer/lib/smtp-connection';
import { Readable } from 'node:stream';
import { Settings } from '../config/settings.js';
import { asDeliveryFault, DeliveryFault } from './delivery-fault.js';
import type { WholeMessage } from './message.js';

const CONNECT_MS = 5000;
const GOODBYE_MS = 2000;
const SILENCE_MS = 20_000;
/** One mail takes no longer than this, so that a lease outlives it. */
export const LONGEST_SEND_MS = 40_000;

/** Opens sessions with the mail server of the settings. */
@Injectable()
export class MailTransport {
  constructor(private readonly settings: Settings) {}

  async open(connectMs = CONNECT_MS): Promise<SmtpSession> {
    const url = new URL(this.settings.smtpUrl);
    const secure = url.protocol === 'smtps:';
    const connection = new SMTPConnection({
      host: url.hostname.replace(/^\[|\]$/g, ''),
      port: url.port ? Number(url.port) : secure ? 465 : 587,
      secure,
      connectionTimeout: connectMs,
      greetingTimeout: connectMs,
      dnsTimeout: connectMs,
      socketTimeout: SILENCE_MS,
      socketCloseTimeout: 1000,
    });
    const session = new SmtpSession(connection);
    try {
      await session.connect();
      if (url.username) await session.logIn(decodeURIComponent(url.username), decodeURIComponent(url.password));
    } catch (error) {
      session.close();
      throw asDeliveryFault(error);
    }
    return session;
  }

  /** Connects and reads the greeting; throws a fault where the server is not there. */
  async ping(connectMs: number): Promise<void> {
    (await this.open(connectMs)).end();
  }
}

/** One SMTP session, for several mails one after the other. */
export class SmtpSession {
  private fault: unknown = null;
  private onFault: (error: unknown) => void = () => undefined;

  constructor(private readonly connection: SMTPConnection) {
    // without a listener a broken connection would end the process
    connection.on('error', (error: unknown) => this.break(error));
    connection.once('end', () => this.break(new DeliveryFault('unreachable', false, 'The mail server closed the connection.')));
  }

  connect(): Promise<void> {
    return this.until((done) => this.connection.connect((error) => done(error)));
  }

  logIn(user: string, pass: string): Promise<void> {
    return this.until((done) => this.connection.login({ user, pass, credentials: { user, pass } }, (error) => done(error)));
  }

  /**
   * Sends one mail. `beforeEnd` runs when the whole body is on its way and before the closing dot: where it
   * throws, the dot is never sent and the server throws the half mail away (RFC 5321, 4.1.1.4).
   */
  async send(message: WholeMessage, beforeEnd: () => Promise<void>): Promise<void> {
    const body = Readable.from(bodyOf(message.bytes, beforeEnd), { objectMode: false });
    const size = message.bytes.length;
    const timer = setTimeout(() => this.break(new DeliveryFault('unreachable', false, 'The mail server took too long.')), LONGEST_SEND_MS);
    try {
      await this.until<unknown>((done) => this.connection.send({ ...message.envelope, size }, body, (error) => done(error)));
    } catch (error) {
      // first the socket, so that nothing that is still in the stream can close the mail
      this.close();
      body.destroy();
      throw error;
    } finally {
      clearTimeout(timer);
    }
  }

  /** Says goodbye; for a session with nothing under way. */
  end(): void {
    this.connection.quit();
    // a server that does not say goodbye in return must not keep the process
    setTimeout(() => this.connection.close(), GOODBYE_MS).unref();
  }

  close(): void {
    this.connection.close();
  }

  private break(error: unknown): void {
    this.fault ??= error;
    this.onFault(error);
  }

  private until<T = void>(work: (done: (error?: unknown) => void) => void): Promise<T> {
    return new Promise<T>((resolve, reject) => {
      if (this.fault) return reject(this.fault);
      this.onFault = reject;
      work((error) => (error ? reject(error) : resolve(undefined as T)));
    });
  }
}

async function* bodyOf(bytes: Buffer, beforeEnd: () => Promise<void>): AsyncGenerator<Buffer> {
  yield bytes;
  await beforeEnd();
}
