/** Something the person at the terminal can act on: printed without a stack trace. */
export class Problem extends Error {
  constructor(message, { output = '' } = {}) {
    super(message);
    this.name = 'Problem';
    this.output = output;
  }
}
