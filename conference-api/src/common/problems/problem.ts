import { HttpException } from '@nestjs/common';

/** One thing wrong with one field of the input, and its remedy. */
export interface FieldError {
  field: string;
  code: string;
  message: string;
}

export interface ProblemDocument {
  type: string;
  title: string;
  status: number;
  detail: string;
  errors?: FieldError[];
  [extension: string]: unknown;
}

const TITLES = {
  'bad-request': [400, 'The request can not be read'],
  unauthorized: [401, 'Sign in first'],
  'sign-in-failed': [401, 'E-mail address or password not right'],
  'session-ended': [401, 'The session has ended'],
  forbidden: [403, 'Not allowed'],
  'not-found': [404, 'Not found'],
  'method-not-allowed': [405, 'Method not allowed'],
  'stale-version': [409, 'Changed meanwhile'],
  'wrong-stage': [409, 'Not possible at this stage'],
  conflict: [409, 'In conflict with what is there'],
  gone: [410, 'No longer valid'],
  'too-large': [413, 'Too large'],
  'unsupported-type': [415, 'This kind of file is not read'],
  invalid: [422, 'Some fields need mending'],
  'too-many-attempts': [429, 'Too many attempts'],
  internal: [500, 'Something went wrong here'],
  unavailable: [503, 'A part of the service is down'],
} as const;

export type ProblemCode = keyof typeof TITLES;

/** The one family of errors; the filter prints it as a problem document (RFC 9457). */
export class Problem extends HttpException {
  constructor(
    readonly code: ProblemCode,
    readonly detail: string,
    readonly errors: FieldError[] = [],
    readonly extensions: Record<string, unknown> = {},
    readonly headers: Record<string, string> = {},
  ) {
    super(detail, TITLES[code][0]);
  }

  toDocument(): ProblemDocument {
    const [status, title] = TITLES[this.code];
    return {
      type: `urn:kerfside:problem:${this.code}`,
      title,
      status,
      detail: this.detail,
      ...(this.errors.length ? { errors: this.errors } : {}),
      ...this.extensions,
    };
  }
}

/** The same answer whether a thing does not exist or may not be known to exist. */
export const notFound = (what: string) =>
  new Problem('not-found', `There is no such ${what}, or you are not a member of its conference.`);

export const forbidden = (detail: string) => new Problem('forbidden', detail);

export const wrongStage = (detail: string) => new Problem('wrong-stage', detail);

export const invalid = (field: string, code: string, message: string) =>
  new Problem('invalid', message, [{ field, code, message }]);

export const staleVersion = (detail: string, extensions: Record<string, unknown>) =>
  new Problem('stale-version', detail, [], extensions);

export const unavailable = (part: string) =>
  new Problem(
    'unavailable',
    `The ${part} can not be reached just now. Nothing was changed; try again in a moment.`,
    [],
    { part },
    { 'Retry-After': '5' },
  );
