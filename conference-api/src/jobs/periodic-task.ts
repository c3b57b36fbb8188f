import type { LoggerService } from '@nestjs/common';

/** Work done again and again: never twice at once, and a fault is told once until it is over. */
export class PeriodicTask {
  private running: Promise<void> | null = null;
  private isFailing = false;

  constructor(
    private readonly name: string,
    private readonly work: () => Promise<unknown>,
    private readonly logger: Pick<LoggerService, 'log' | 'warn'>,
  ) {}

  /** Does it now; joins the one under way. Never throws: the next time comes. */
  run(): Promise<void> {
    this.running ??= this.attempt().finally(() => {
      this.running = null;
    });
    return this.running;
  }

  /** Resolves when none is under way. */
  async settle(): Promise<void> {
    await this.running;
  }

  private async attempt(): Promise<void> {
    try {
      await this.work();
      if (this.isFailing) this.logger.log(`${this.name}: works again`);
      this.isFailing = false;
    } catch (error) {
      if (!this.isFailing) this.logger.warn(`${this.name}: ${nameOf(error)}; it is tried again`);
      this.isFailing = true;
    }
  }
}

// a message could quote what a person wrote: class and code only
function nameOf(error: unknown): string {
  if (!(error instanceof Error)) return 'fault';
  const { code } = error as { code?: string };
  return code ? `${error.name} ${code}` : error.name;
}
