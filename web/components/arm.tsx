import { useLayoutEffect, useRef, useState } from 'react';

/** Where the poise hangs (on its first notch where no page is marked) and how the arm is cut, in pixels from the masthead's left end. */
interface Measure {
  readonly width: number;
  readonly fulcrum: number;
  /** Where the heavy end ends and the notches begin. */
  readonly heavy: number;
  readonly poise: number;
}

const HEAVY_END = 150;
const NARROW = 720;

/** The masthead's arm: short and heavy left of its fulcrum, notched and tapering to the right, the poise where you are. */
export function Arm({ here }: { here: string }) {
  const arm = useRef<SVGSVGElement>(null);
  const [measure, setMeasure] = useState<Measure | null>(null);
  const first = useRef(true);
  // biome-ignore lint/correctness/useExhaustiveDependencies: another place moves the poise.
  useLayoutEffect(() => {
    const element = arm.current?.parentElement;
    if (!element) return;
    const look = () => setMeasure(measureOf(element));
    look();
    const observer = new ResizeObserver(look);
    observer.observe(element);
    let gone = false;
    void document.fonts?.ready.then(() => gone || look());
    return () => {
      gone = true;
      observer.disconnect();
    };
  }, [here]);
  useLayoutEffect(() => {
    if (measure) requestAnimationFrame(() => (first.current = false));
  }, [measure]);
  if (!measure) return <svg ref={arm} className="arm" aria-hidden="true" />;
  const { width, fulcrum, heavy, poise } = measure;
  return (
    <svg ref={arm} className="arm" aria-hidden="true">
      <path d={`M0 0H${width}V2.4L${heavy} 4.4H0z`} fill="var(--color-ink)" />
      <path d={notches(heavy + 12, width)} stroke="var(--color-paper)" strokeWidth="1.1" fill="none" />
      <path d={`M${fulcrum} 5l-8 14h16z`} fill="none" stroke="var(--color-ink)" strokeWidth="1.4" />
      <g
        className="poise"
        data-first={first.current ? '' : undefined}
        style={{ transform: `translateX(${poise}px)` }}
      >
        <path d="M-4 0a4 4 0 1 1 8 0v3M0 4v8" stroke="var(--color-brass)" strokeWidth="2" fill="none" />
        <path
          d="M-7 12h14l5 17h-24z"
          fill="var(--color-brass-fill)"
          stroke="var(--color-ink)"
          strokeWidth="1.2"
        />
      </g>
    </svg>
  );
}

function measureOf(masthead: HTMLElement): Measure {
  const box = masthead.getBoundingClientRect();
  const here = masthead.querySelector<HTMLElement>('[data-here]');
  const narrow = box.width < NARROW;
  const fulcrum = narrow ? 12 : 64;
  const heavy = narrow ? 2 * fulcrum : HEAVY_END;
  return {
    width: box.width,
    fulcrum,
    heavy,
    poise: here ? hookOf(here, box, narrow) : heavy + 24,
  };
}

/** Under the middle of what is marked; at the arm's end for what stands in another row than the arm's. */
function hookOf(here: HTMLElement, box: DOMRect, narrow: boolean): number {
  if (narrow && here.dataset.here === 'end') return box.width - 20;
  const { left, width } = here.getBoundingClientRect();
  return Math.round(left + width / 2 - box.left);
}

/** Notches that widen away from the fulcrum. */
function notches(from: number, to: number): string {
  let path = '';
  for (let at = from, step = 7; at < to - 10; at += step, step += 0.22) path += `M${at - 2} 1.2l2 3 2-3`;
  return path;
}
