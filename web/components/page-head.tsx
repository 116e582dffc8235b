import { type ReactNode, useEffect, useRef } from 'react';
import { useLocation } from 'react-router-dom';
import { useTitle } from '#web/hooks/use-title.ts';

/** A page's title, taking the focus when one comes here from another page, and one line under it. */
export function PageHead({
  title,
  shown,
  of,
  children,
}: {
  /** For the window, and on the page where `shown` gives nothing richer. */
  title: string;
  shown?: ReactNode;
  /** What the page belongs to, such as the project's name. */
  of?: string;
  children?: ReactNode;
}) {
  useTitle(title, of);
  const head = useRef<HTMLHeadingElement>(null);
  const { pathname, key } = useLocation();
  const arrival = useRef(key);
  // biome-ignore lint/correctness/useExhaustiveDependencies: another path is another page.
  useEffect(() => {
    if (arrival.current !== 'default' || key !== 'default') head.current?.focus({ preventScroll: true });
  }, [pathname]);
  return (
    <header>
      <h1 ref={head} tabIndex={-1}>
        {shown ?? title}
      </h1>
      {children !== undefined && <div className="conv">{children}</div>}
    </header>
  );
}
