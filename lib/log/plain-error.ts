type DatabaseError = Error & { sqlMessage?: string; code?: string; errno?: number };

/**
 * An error as it may stand in the log. One from the database tells its statement with every value in it, which may be
 * what people wrote: of that only the server's own message stays, its quoted values left out.
 */
export function plainError(error: unknown): Record<string, unknown> {
  if (!(error instanceof Error)) return { message: String(error) };
  const { sqlMessage, code, errno } = error as DatabaseError;
  const type = error.name;
  if (sqlMessage === undefined) return { type, message: error.message, stack: error.stack, code };
  const calls = (error.stack ?? '').split('\n').filter((line) => /^\s+at /.test(line));
  return {
    type,
    code,
    errno,
    message: sqlMessage.replace(/'(?:[^'\\]|\\.)*'/g, "'…'"),
    stack: calls.join('\n'),
  };
}
