/** One thing wrong with one field, and its remedy. */
export interface FieldError {
  field: string;
  code: string;
  message: string;
}

interface ProblemDocument {
  type?: string;
  title?: string;
  status?: number;
  detail?: string;
  errors?: FieldError[];
  [extension: string]: unknown;
}

const PREFIX = 'urn:kerfside:problem:';

/** A refusal by the API (RFC 9457), or the lack of any answer (`offline`, status 0). */
export class ApiProblem extends Error {
  override readonly name = 'ApiProblem';

  constructor(
    readonly status: number,
    /** Stable, for example `stale-version`. */
    readonly code: string,
    readonly title: string,
    readonly detail: string,
    readonly errors: FieldError[] = [],
    /** The whole document: what a `stale-version` adds stands here. */
    readonly extensions: Record<string, unknown> = {},
    /** Seconds after which it is worth trying again, where the server said. */
    readonly retryAfter: number | null = null,
  ) {
    super(detail);
  }

  /** The first message for each field. */
  get byField(): Record<string, string> {
    const fields: Record<string, string> = {};
    for (const error of this.errors) fields[error.field] ??= error.message;
    return fields;
  }

  /** Trying again may help. */
  get isPassing(): boolean {
    return this.status === 0 || this.status === 503 || this.status === 502 || this.status === 504;
  }
}

export const offline = () =>
  new ApiProblem(0, 'offline', 'No connection', 'The server can not be reached. Nothing was changed; check the connection and try again.');

/** Reads a refusal; a body that is no problem document still gives one. */
export async function readProblem(response: Response): Promise<ApiProblem> {
  let document: ProblemDocument = {};
  try {
    document = (await response.json()) as ProblemDocument;
  } catch {
    // a proxy's page or nothing at all: the status is all there is
  }
  const { type, title, detail, errors, ...extensions } = document;
  const retryAfter = Number(response.headers.get('retry-after'));
  return new ApiProblem(
    response.status,
    type?.startsWith(PREFIX) ? type.slice(PREFIX.length) : 'unknown',
    title ?? 'The request failed',
    detail ?? `The server answered ${response.status}. Try again in a moment.`,
    errors ?? [],
    extensions,
    response.headers.has('retry-after') && Number.isFinite(retryAfter) ? retryAfter : null,
  );
}

export const asProblem = (error: unknown): ApiProblem =>
  error instanceof ApiProblem
    ? error
    : new ApiProblem(0, 'unknown', 'Something went wrong here', 'Nothing was changed. Reload the page and try again.');
