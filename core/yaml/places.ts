import { EVENT_ID, type Event, getScalarValue, SCALAR_STYLE } from 'js-yaml';
import type { Place } from '../errors.ts';
import { isEmptyPlain, nextValue, type Span, spanOf } from './event-spans.ts';
import { LineTable } from './line-table.ts';
import { parse } from './parse-events.ts';
import type { PathStep } from './value.ts';

/** A place and how much text it covers, ready to be spread into a fault. */
export interface Mark {
  at: Place;
  /** In characters; 1 for what spans several lines. */
  length: number;
}

type Steps = readonly PathStep[];

/**
 * Where everything in one file stands. Lines of lists and mappings are cheap; places of keys and scalars parse
 * the text once more when the first is asked for, so a file without faults pays nothing for them.
 *
 * A path goes from the root, or from a list or mapping of the data given as `from`. A path that leads past what
 * the file holds gives the place of the last value on its way.
 */
export class Places {
  readonly file: string;
  readonly #text: string;
  readonly #collections: readonly object[];
  readonly #collectionEvents: readonly number[];
  #eventOfObject: Map<object, number> | undefined;
  #startOfObject: Map<object, number> | undefined;
  #events: readonly Event[] | undefined;
  #lines: LineTable | undefined;
  readonly #starts: readonly number[];

  constructor(
    file: string,
    text: string,
    collections: readonly object[],
    collectionEvents: readonly number[],
    events: readonly Event[],
  ) {
    this.file = file;
    this.#text = text;
    this.#collections = collections;
    this.#collectionEvents = collectionEvents;
    this.#starts = collectionEvents.map((index) => spanOf(events, index, text).start);
  }

  /** The line of a list or mapping of the data, by identity; 1 for an object that is not of this file. */
  lineOf(object: object): number {
    return this.#lineTable.lineOf(this.#startOf(object));
  }

  /** The place of a list or mapping of the data, by identity; the file's start for a strange object. */
  placeOfObject(object: object): Place {
    return this.#place(this.#startOf(object));
  }

  /** The place of a value. */
  placeOf(path: Steps, from?: object): Place {
    return this.markOf(path, from).at;
  }

  /** The place of the key that ends the path; for an index, of the item. */
  placeOfKey(path: Steps, from?: object): Place {
    return this.markOfKey(path, from).at;
  }

  /** The place and length of a value. */
  markOf(path: Steps, from?: object): Mark {
    return this.#mark(spanOf(this.#allEvents, this.#find(path, from).value, this.#text));
  }

  /** The place and length of the key that ends the path; for an index, of the item. */
  markOfKey(path: Steps, from?: object): Mark {
    const found = this.#find(path, from);
    return this.#mark(spanOf(this.#allEvents, found.key ?? found.value, this.#text));
  }

  /** The place of a piece of a scalar's text, by its offset there. */
  placeInScalar(path: Steps, offset: number, length = 1, from?: object): Place {
    return this.markInScalar(path, offset, length, from).at;
  }

  /**
   * The place and length of a piece of a scalar's text. Exact for scalars on one line, quoted ones with escapes
   * too; the scalar's start for those on several lines.
   */
  markInScalar(path: Steps, offset: number, length: number, from?: object): Mark {
    const index = this.#find(path, from).value;
    const start = this.#offsetInScalar(index, offset);
    if (start === undefined) return this.#mark(spanOf(this.#allEvents, index, this.#text));
    const end = this.#offsetInScalar(index, offset + length) ?? start + length;
    return this.#mark({ start, length: Math.max(1, end - start) });
  }

  #offsetInScalar(index: number, offset: number): number | undefined {
    const event = this.#allEvents[index];
    if (event?.type !== EVENT_ID.SCALAR || isEmptyPlain(event)) return undefined;
    if (event.style === SCALAR_STYLE.LITERAL_BLOCK || event.style === SCALAR_STYLE.FOLDED_BLOCK)
      return undefined;
    const raw = this.#text.slice(event.valueStart, event.valueEnd);
    if (/[\r\n]/.test(raw)) return undefined;
    if (event.fast) return event.valueStart + Math.min(offset, raw.length);
    return (
      event.valueStart +
      rawOffset(raw, offset, (piece) =>
        getScalarValue(piece, { ...event, valueStart: 0, valueEnd: piece.length }),
      )
    );
  }

  /** Walks a path through the events. */
  #find(path: Steps, from: object | undefined): { key: number | undefined; value: number } {
    const events = this.#allEvents;
    let key: number | undefined;
    let value = from === undefined ? 1 : (this.#eventOf(from) ?? 1);
    for (const step of path) {
      const child = this.#child(this.#resolve(value), step);
      if (child === undefined) return { key: events[value] === undefined ? undefined : key, value };
      key = child.key;
      value = child.value;
    }
    return { key, value };
  }

  #child(index: number, step: PathStep): { key: number | undefined; value: number } | undefined {
    const events = this.#allEvents;
    const type = events[index]?.type;
    let i = index + 1;
    if (type === EVENT_ID.SEQUENCE) {
      for (let n = 0; events[i] !== undefined && events[i]!.type !== EVENT_ID.POP; n++) {
        if (n === step) return { key: undefined, value: i };
        i = nextValue(events, i);
      }
    } else if (type === EVENT_ID.MAPPING) {
      while (events[i] !== undefined && events[i]!.type !== EVENT_ID.POP) {
        const value = nextValue(events, i);
        const event = events[i]!;
        if (event.type === EVENT_ID.SCALAR && getScalarValue(this.#text, event) === step)
          return { key: i, value };
        i = nextValue(events, value);
      }
    }
    return undefined;
  }

  /** The event an alias stands for: the last anchor of its name before it. */
  #resolve(index: number): number {
    const alias = this.#allEvents[index];
    if (alias?.type !== EVENT_ID.ALIAS) return index;
    const name = this.#text.slice(alias.anchorStart, alias.anchorEnd);
    for (let i = index - 1; i > 0; i--) {
      const event = this.#allEvents[i]!;
      if (event.type === EVENT_ID.POP || event.type === EVENT_ID.DOCUMENT || event.type === EVENT_ID.ALIAS)
        continue;
      if (event.anchorStart >= 0 && this.#text.slice(event.anchorStart, event.anchorEnd) === name) return i;
    }
    return index;
  }

  #eventOf(object: object): number | undefined {
    this.#eventOfObject ??= pair(this.#collections, this.#collectionEvents);
    return this.#eventOfObject.get(object);
  }

  #startOf(object: object): number {
    this.#startOfObject ??= pair(this.#collections, this.#starts);
    return this.#startOfObject.get(object) ?? 0;
  }

  #mark(span: Span): Mark {
    return { at: this.#place(span.start), length: span.length };
  }

  #place(offset: number): Place {
    return { file: this.file, ...this.#lineTable.placeOf(offset) };
  }

  get #lineTable(): LineTable {
    this.#lines ??= new LineTable(this.#text);
    return this.#lines;
  }

  get #allEvents(): readonly Event[] {
    this.#events ??= parse(this.#text, this.file);
    return this.#events;
  }
}

function pair(objects: readonly object[], numbers: readonly number[]): Map<object, number> {
  const map = new Map<object, number>();
  for (let i = 0; i < objects.length; i++) map.set(objects[i]!, numbers[i]!);
  return map;
}

/** The shortest piece of the raw text, cut between escapes, whose decoded value is at least `offset` long. */
function rawOffset(raw: string, offset: number, decode: (piece: string) => string): number {
  let at = 0;
  let length = 0;
  for (const [unit] of raw.matchAll(/\\(?:x..|u....|U.{8}|.)|''|[\s\S]/gs)) {
    if (length >= offset) return at;
    length += unit.length === 1 ? 1 : decode(unit).length;
    at += unit.length;
  }
  return at;
}
