import { EVENT_ID, type Event } from 'js-yaml';

/** How large the document is with every alias written out, without writing it out. */
export interface ExpandedSize {
  nodes: number;
  aliases: number;
  depth: number;
}

const SCALAR_SIZE: ExpandedSize = { nodes: 1, aliases: 0, depth: 0 };

/** Sums the sizes upwards through the events; what an alias stands for has been summed before it. */
export function measureExpanded(events: readonly Event[], text: string): ExpandedSize {
  const anchors = new Map<string, ExpandedSize>();
  const open: { size: ExpandedSize; anchor: string }[] = [
    { size: { nodes: 0, aliases: 0, depth: 0 }, anchor: '' },
  ];
  const add = (size: ExpandedSize) => {
    const into = open.at(-1)!.size;
    into.nodes += size.nodes;
    into.aliases += size.aliases;
    into.depth = Math.max(into.depth, size.depth);
  };
  for (let i = 1; i < events.length && open.length > 0; i++) {
    const event = events[i]!;
    if (event.type === EVENT_ID.SCALAR) {
      if (event.anchorStart >= 0) anchors.set(text.slice(event.anchorStart, event.anchorEnd), SCALAR_SIZE);
      add(SCALAR_SIZE);
    } else if (event.type === EVENT_ID.ALIAS) {
      const target = anchors.get(text.slice(event.anchorStart, event.anchorEnd)) ?? SCALAR_SIZE;
      add({ ...target, aliases: target.aliases + 1 });
    } else if (event.type === EVENT_ID.POP) {
      if (open.length === 1) break;
      const { size, anchor } = open.pop()!;
      const whole = { nodes: size.nodes + 1, aliases: size.aliases, depth: size.depth + 1 };
      if (anchor !== '') anchors.set(anchor, whole);
      add(whole);
    } else if (event.type === EVENT_ID.DOCUMENT) {
      break;
    } else {
      const anchor = event.anchorStart >= 0 ? text.slice(event.anchorStart, event.anchorEnd) : '';
      open.push({ size: { nodes: 0, aliases: 0, depth: 0 }, anchor });
    }
  }
  return open[0]!.size;
}
