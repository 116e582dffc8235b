/** The SQLSTATE or the system's code of an error; '' where it has none. */
export function stateOf(error: unknown): string {
  const { original, code } = (error ?? {}) as { original?: { code?: string }; code?: string };
  return original?.code ?? code ?? '';
}

/**
 * Whether an error says that the database stops, starts or cannot be reached: by PostgreSQL's classes 57P and 08, by the
 * system's codes, or in the driver's words.
 */
export function isDatabaseAway(error: unknown): boolean {
  const { name, message } = (error ?? {}) as { name?: string; message?: string };
  return (
    /^SequelizeConnection/.test(name ?? '') ||
    /^57P|^08|ECONN|EPIPE/.test(stateOf(error)) ||
    /Connection terminated|not queryable|timeout exceeded when trying to connect/.test(message ?? '')
  );
}
