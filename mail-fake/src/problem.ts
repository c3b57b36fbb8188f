/** One bad field of the input. */
export interface FieldError {
  field: string;
  code: string;
  message: string;
}

const TITLES: Record<number, string> = {
  400: 'The request is not understood',
  403: 'Not allowed',
  404: 'Not found',
  413: 'Too large',
  415: 'Unsupported content type',
  422: 'The input is not valid',
  500: 'Something failed here',
  502: 'The other server did not take it',
};

/** A refusal that is answered as a problem document (RFC 9457). */
export class Problem extends Error {
  constructor(
    readonly status: number,
    readonly type: string,
    readonly detail: string,
    readonly errors?: FieldError[],
  ) {
    super(detail);
  }

  toJSON() {
    return {
      type: `urn:mail-fake:problem:${this.type}`,
      title: TITLES[this.status] ?? 'Error',
      status: this.status,
      detail: this.detail,
      ...(this.errors ? { errors: this.errors } : {}),
    };
  }
}

export function invalidInput(errors: FieldError[]): Problem {
  const detail = errors.map((error) => `${error.field}: ${error.message}`).join('; ');
  return new Problem(422, 'invalid-input', detail, errors);
}
