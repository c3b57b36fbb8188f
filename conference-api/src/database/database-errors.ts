const DOWN = new Set([
  'ECONNREFUSED',
  'ECONNRESET',
  'EPIPE',
  'ETIMEDOUT',
  'ENOTFOUND',
  'PROTOCOL_CONNECTION_LOST',
  'PROTOCOL_ENQUEUE_AFTER_FATAL_ERROR',
  'PROTOCOL_ENQUEUE_AFTER_QUIT',
  'ER_SERVER_SHUTDOWN',
  'ER_CON_COUNT_ERROR',
  'ER_QUERY_INTERRUPTED',
  'ER_CONNECTION_KILLED',
]);

const codeOf = (error: unknown): string | undefined => {
  const { code, driverError } = (error ?? {}) as { code?: string; driverError?: { code?: string } };
  return driverError?.code ?? code;
};

/** True where the server could not be reached or went away, so that trying again later can help. */
export function isDatabaseDown(error: unknown): boolean {
  const code = codeOf(error);
  if (code && DOWN.has(code)) return true;
  const message = error instanceof Error ? error.message : '';
  return /connection is in closed state|Pool is closed|Queue limit reached|not established/i.test(message);
}

/** True where two transactions met, so that running the whole use case again can help. */
export const isDeadlock = (error: unknown) => ['ER_LOCK_DEADLOCK', 'ER_LOCK_WAIT_TIMEOUT', 'ER_CHECKREAD'].includes(codeOf(error) ?? '');

export const isDuplicate = (error: unknown) => codeOf(error) === 'ER_DUP_ENTRY';
