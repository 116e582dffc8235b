import type { ReactNode } from 'react';
import { ScrollRegion } from './scroll-region.tsx';

/**
 * A table of figures that scrolls by itself where it is too wide; its first column stays, and breaks its words on a
 * narrow screen so that the figures have room.
 *
 * @param label what the table says; a section of the page may bear the same name
 */
export function WideTable({ label, children }: { label: string; children: ReactNode }) {
  return (
    <ScrollRegion label={`${label}, table`} keepFirst>
      <div className="max-sm:[&_tbody_th]:min-w-24 max-sm:[&_tbody_th]:max-w-[42vw] max-sm:[&_tbody_th]:whitespace-normal">
        {children}
      </div>
    </ScrollRegion>
  );
}
