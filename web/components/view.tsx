import type { ReactNode } from 'react';
import { ProblemNotice } from './problem-notice.tsx';
import { Waiting } from './waiting.tsx';

interface Loaded<T> {
  readonly data: T | undefined;
  readonly error: unknown;
  readonly refetch: () => unknown;
}

/**
 * The four states of a view: loading that keeps its room, error with retry, empty, data. Data that is already there
 * stays while it is loaded again, also where that fails (then the failure is said above it).
 */
export function View<T>({
  query,
  rows,
  waiting,
  isEmpty,
  empty,
  children,
}: {
  query: Loaded<T>;
  /** Lines to keep while loading. */
  rows?: number;
  waiting?: ReactNode;
  isEmpty?: (data: T) => boolean;
  empty?: ReactNode;
  children: (data: T) => ReactNode;
}) {
  const failed = query.error ? (
    <ProblemNotice error={query.error} retry={() => void query.refetch()} />
  ) : null;
  if (query.data === undefined) return failed ?? waiting ?? <Waiting rows={rows} />;
  return (
    <>
      {failed}
      {isEmpty?.(query.data) ? empty : children(query.data)}
    </>
  );
}
