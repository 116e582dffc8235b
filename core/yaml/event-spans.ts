import { EVENT_ID, type Event, SCALAR_STYLE, type ScalarEvent } from 'js-yaml';

const ABSENT = -1;

/** A piece of text: where it begins and how long it is (1 for what spans lines or is empty). */
export interface Span {
  start: number;
  length: number;
}

/** Whether a scalar is an empty one that has no text at all, as in `name:`. */
export function isEmptyPlain(event: Event): boolean {
  return event.type === EVENT_ID.SCALAR && event.valueStart === ABSENT;
}

/** The first event after a whole value: the event itself for scalars and aliases, past its end for collections. */
export function nextValue(events: readonly Event[], index: number): number {
  let depth = 0;
  for (let i = index; i < events.length; i++) {
    const type = events[i]!.type;
    if (type === EVENT_ID.SEQUENCE || type === EVENT_ID.MAPPING || type === EVENT_ID.DOCUMENT) depth++;
    else if (type === EVENT_ID.POP) depth--;
    if (depth <= 0) return i + 1;
  }
  return events.length;
}

/** Where a value stands in the text. An empty one stands at the last text before it, its key. */
export function spanOf(events: readonly Event[], index: number, text: string): Span {
  const event = events[index];
  if (event === undefined) return { start: 0, length: 1 };
  if (event.type === EVENT_ID.MAPPING || event.type === EVENT_ID.SEQUENCE)
    return { start: event.start, length: 1 };
  if (event.type === EVENT_ID.ALIAS) {
    return { start: event.anchorStart - 1, length: event.anchorEnd - event.anchorStart + 1 };
  }
  if (event.type !== EVENT_ID.SCALAR) return spanOf(events, index + 1, text);
  if (event.valueStart === ABSENT) return emptySpan(events, index, text);
  return scalarSpan(event, events, index, text);
}

function scalarSpan(event: ScalarEvent, events: readonly Event[], index: number, text: string): Span {
  if (isBlock(event)) return { start: blockHeader(event, events, index, text), length: 1 };
  const quote = event.style === SCALAR_STYLE.PLAIN ? 0 : 1;
  const start = event.valueStart - quote;
  const isOneLine = !/[\r\n]/.test(text.slice(event.valueStart, event.valueEnd));
  return { start, length: isOneLine ? Math.max(1, event.valueEnd + quote - start) : 1 };
}

function isBlock(event: ScalarEvent): boolean {
  return event.style === SCALAR_STYLE.LITERAL_BLOCK || event.style === SCALAR_STYLE.FOLDED_BLOCK;
}

/** The "|" or ">" of a block scalar: the first one after whatever stands before it. */
function blockHeader(event: ScalarEvent, events: readonly Event[], index: number, text: string): number {
  const from = Math.max(event.anchorEnd, event.tagEnd, endBefore(events, index));
  const between = /(?:#[^\r\n]*|[^|>#]+)*/y;
  between.lastIndex = from;
  between.test(text);
  return Math.min(between.lastIndex, event.valueStart);
}

function emptySpan(events: readonly Event[], index: number, text: string): Span {
  for (let i = index - 1; i >= 0; i--) {
    const event = events[i]!;
    if (event.type === EVENT_ID.POP || event.type === EVENT_ID.DOCUMENT || isEmptyPlain(event)) continue;
    return spanOf(events, i, text);
  }
  return { start: 0, length: 1 };
}

/** The offset right after the last text before an event. */
function endBefore(events: readonly Event[], index: number): number {
  for (let i = index - 1; i >= 0; i--) {
    const event = events[i]!;
    if (event.type === EVENT_ID.ALIAS) return event.anchorEnd;
    if (event.type === EVENT_ID.SEQUENCE || event.type === EVENT_ID.MAPPING) return event.start;
    if (event.type !== EVENT_ID.SCALAR || event.valueStart === ABSENT) continue;
    const isQuoted = event.style === SCALAR_STYLE.SINGLE_QUOTED || event.style === SCALAR_STYLE.DOUBLE_QUOTED;
    return event.valueEnd + (isQuoted ? 1 : 0);
  }
  return 0;
}
