/** An input that a calculation refuses: which field, a stable code, and the remedy in words. */
export class CalcInputError extends Error {
  constructor(
    readonly field: string,
    readonly code: string,
    message: string,
  ) {
    super(message);
    this.name = 'CalcInputError';
  }
}
