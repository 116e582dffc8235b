/** An error as it is logged: what it says and where, without the values that a statement was given. */
export function plainError(error: unknown): object {
  const { name, message, stack, code, original } = (error ?? {}) as Error & {
    code?: string;
    original?: { message: string; code?: string };
  };
  return { name, message, code: original?.code ?? code, stack };
}
