import { type RefObject, useLayoutEffect, useState } from 'react';

/** The width of an element in CSS pixels, kept as it changes; `first` until it is measured. */
export function useWidth(element: RefObject<HTMLElement | null>, first: number): number {
  const [width, setWidth] = useState(first);
  useLayoutEffect(() => {
    const target = element.current;
    if (!target) return;
    const measure = () => setWidth(Math.round(target.clientWidth) || first);
    measure();
    const observer = new ResizeObserver(measure);
    observer.observe(target);
    return () => observer.disconnect();
  }, [element, first]);
  return width;
}
