import { BadRequestException, type CallHandler, type ExecutionContext, Injectable, type NestInterceptor, PayloadTooLargeException } from '@nestjs/common';
import { isUUID } from 'class-validator';
import type { Request } from 'express';
import { catchError, finalize, type Observable, throwError } from 'rxjs';
import type { Actor } from '../access/actor.js';
import { invalid, Problem } from '../common/problems/problem.js';
import { Settings } from '../config/settings.js';
import { ImagesService } from './images.service.js';

/** Uploads held in memory at once, each at most the size limit: 6 × 60 MB as the settings come. */
const AT_ONCE = 6;
/** Uploads whose bodies wait in the sender's socket. */
const MOST_WAITING = 200;

/** Stands before the reading of an upload's body: nobody's is read who may not store it, and few at once. */
@Injectable()
export class UploadGate implements NestInterceptor {
  private inside = 0;
  private readonly waiting: (() => void)[] = [];

  constructor(
    private readonly images: ImagesService,
    private readonly settings: Settings,
  ) {}

  async intercept(context: ExecutionContext, next: CallHandler): Promise<Observable<unknown>> {
    const request = context.switchToHttp().getRequest<Request & { user: Actor }>();
    const caseId = request.params['caseId'];
    // a malformed id is the route's to refuse
    if (typeof caseId === 'string' && isUUID(caseId)) await this.images.assertMayUpload(request.user, caseId);
    await this.enter();
    if (request.socket.destroyed) {
      this.leave();
      throw brokenOff();
    }
    return next.handle().pipe(
      catchError((error: unknown) => throwError(() => this.problemOf(error, request))),
      finalize(() => this.leave()),
    );
  }

  private async enter(): Promise<void> {
    if (this.inside < AT_ONCE) {
      this.inside++;
      return;
    }
    if (this.waiting.length >= MOST_WAITING)
      throw new Problem('unavailable', 'Too many pictures are being sent just now. Send this one again in a moment.', [], {}, { 'Retry-After': '5' });
    await new Promise<void>((resolve) => this.waiting.push(resolve));
  }

  private leave(): void {
    const next = this.waiting.shift();
    if (next) next();
    else this.inside--;
  }

  /** What went wrong with the body, in words for the person who sent it. */
  private problemOf(error: unknown, request: Request): unknown {
    if (error instanceof PayloadTooLargeException) {
      const message = `The file is larger than ${Math.round(this.settings.uploadMaxBytes / 1024 / 1024)} MB. Export it smaller, or as a compressed picture.`;
      return new Problem('too-large', message, [{ field: 'file', code: 'too-large', message }]);
    }
    if (error instanceof Problem) return error;
    const code = ((error as Error).cause as { code?: string } | undefined)?.code ?? '';
    if (['LIMIT_UNEXPECTED_FILE', 'LIMIT_FILE_COUNT'].includes(code)) return invalid('file', 'one-file', 'Send one picture, in the field file.');
    const isMalformed = error instanceof BadRequestException && (code !== '' || error.message.startsWith('Multipart'));
    if (isMalformed || request.socket.destroyed) return brokenOff();
    return error;
  }
}

const brokenOff = () => new Problem('bad-request', 'The upload broke off, or is not well-formed. Send it again.');
