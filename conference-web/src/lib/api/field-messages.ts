import { ApiProblem } from './problem';

/** The messages by field of a refusal; empty for anything else. */
export const fieldMessages = (error: unknown): Record<string, string> => (error instanceof ApiProblem ? error.byField : {});
