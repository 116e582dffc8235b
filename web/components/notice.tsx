import type { ReactNode, Ref } from 'react';

/** News beside where it happened. Good and plain news wait their turn for a screen reader; bad news does not. */
export function Notice({
  kind = 'plain',
  title,
  children,
  ref,
}: {
  kind?: 'plain' | 'good' | 'bad';
  title?: ReactNode;
  children?: ReactNode;
  ref?: Ref<HTMLDivElement>;
}) {
  return (
    <div
      ref={ref}
      tabIndex={-1}
      role={kind === 'bad' ? 'alert' : 'status'}
      className={`notice ${kind === 'plain' ? '' : kind}`}
    >
      {title !== undefined && <p className={kind === 'bad' ? 'outside' : 'font-semibold'}>{title}</p>}
      {children}
    </div>
  );
}
