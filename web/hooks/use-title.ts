import { useEffect } from 'react';

/** Sets the document's title: the page, then where it belongs. */
export function useTitle(...parts: readonly (string | undefined)[]): void {
  const title = [...parts, 'Steelyard'].filter(Boolean).join(' · ');
  useEffect(() => {
    document.title = title;
  }, [title]);
}
