import type { ReactNode } from 'react';

/** A section's head on its strong rule, with its qualifier at the right end. */
export function SectionHead({
  title,
  id,
  children,
}: {
  title: ReactNode;
  id?: string;
  children?: ReactNode;
}) {
  return (
    <div className="head">
      <h2 id={id}>{title}</h2>
      {children !== undefined && <div>{children}</div>}
    </div>
  );
}
