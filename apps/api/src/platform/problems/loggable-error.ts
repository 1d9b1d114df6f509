/**
 * What of an error may be logged. Messages of the database repeat statements with their values, names and amounts among them,
 * so of an error with an SQLSTATE only the code and the place in our sources are kept.
 */
export function loggableError(error: unknown): Record<string, unknown> {
  if (!(error instanceof Error)) return { type: typeof error };
  const code = 'code' in error ? String(error.code) : undefined;
  const isOfDatabase = /^[0-9A-Z]{5}$/.test(code ?? '') || /Exception$|^DatabaseError$/.test(error.constructor.name);
  return {
    type: error.constructor.name,
    ...(code !== undefined && { code }),
    ...(!isOfDatabase && { message: error.message }),
    frames: (error.stack ?? '')
      .split('\n')
      .filter((line) => /^\s+at /.test(line))
      .map((line) => line.trim()),
    ...(error.cause instanceof Error && { cause: loggableError(error.cause) }),
  };
}
