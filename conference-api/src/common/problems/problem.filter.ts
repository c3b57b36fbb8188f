import { ArgumentsHost, Catch, ExceptionFilter, HttpException, Logger } from '@nestjs/common';
import type { Request, Response } from 'express';
import { CalcInputError } from '../../calc/common/calc-input-error.js';
import { isDatabaseDown } from '../../database/database-errors.js';
import { Problem, type ProblemCode, unavailable } from './problem.js';

const CODES: Record<number, ProblemCode> = {
  400: 'bad-request',
  401: 'unauthorized',
  403: 'forbidden',
  404: 'not-found',
  405: 'method-not-allowed',
  409: 'conflict',
  413: 'too-large',
  415: 'unsupported-type',
  422: 'invalid',
  429: 'too-many-attempts',
  503: 'unavailable',
};

/** Turns whatever was thrown into the problem that a client may see; nothing internal leaks. */
export function toProblem(error: unknown): Problem {
  if (error instanceof Problem) return error;
  if (error instanceof CalcInputError)
    return new Problem('invalid', error.message, [{ field: error.field, code: error.code, message: error.message }]);
  if (isDatabaseDown(error)) return unavailable('database');
  const status = error instanceof HttpException ? error.getStatus() : (error as { status?: number })?.status;
  const code = status ? CODES[status] : undefined;
  if (code === 'not-found') return new Problem(code, 'There is nothing at this address.');
  if (code) return new Problem(code, plainDetail(error));
  return new Problem('internal', 'Nothing was changed. Try again; if it happens again, tell the administrator the time.');
}

// body-parser and Nest speak English sentences of their own; a parser's position in the body is no secret
function plainDetail(error: unknown): string {
  const message = error instanceof Error ? error.message : '';
  if (/entity too large|File too large/i.test(message)) return 'The body is larger than this route takes.';
  if (/JSON/.test(message)) return 'The body is not valid JSON.';
  return message.slice(0, 200) || 'The request was refused.';
}

@Catch()
export class ProblemFilter implements ExceptionFilter {
  private readonly logger = new Logger('Problem');

  catch(error: unknown, host: ArgumentsHost) {
    const http = host.switchToHttp();
    const response = http.getResponse<Response>();
    const request = http.getRequest<Request>();
    const problem = toProblem(error);
    const document = problem.toDocument();
    // the path and the class name only: a message could quote what a person typed
    if (document.status >= 500 && problem !== error)
      this.logger.error(`${request.method} ${request.path}: ${describe(error)}`);
    if (response.headersSent) {
      response.destroy();
      return;
    }
    response
      .status(document.status)
      .set({ 'Cache-Control': 'no-store', ...problem.headers })
      .type('application/problem+json')
      .send(JSON.stringify(document));
  }
}

function describe(error: unknown): string {
  if (!(error instanceof Error)) return typeof error;
  const code = (error as { code?: string }).code ?? '';
  const frames = (error.stack ?? '').split('\n').filter((line) => line.startsWith('    at ')).slice(0, 4).join(' ');
  return `${error.name} ${code} ${frames}`;
}
