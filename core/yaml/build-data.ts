import { EVENT_ID, type Event, getScalarValue, SCALAR_STYLE, type ScalarEvent } from 'js-yaml';
import { Mapping, type YamlMapping, type YamlValue } from './value.ts';

/** What is wrong with one event; the place and the words are found later, from the events. */
export interface Complaint {
  kind:
    | 'duplicate-key'
    | 'tag'
    | 'merge-key'
    | 'key-not-text'
    | 'unknown-alias'
    | 'alias-circle'
    | 'control-character';
  event: number;
}

/** The data of one document, and where its collections begin. */
export interface BuiltData {
  root: YamlValue;
  /** Every list and mapping, in the order of the text. */
  collections: object[];
  /** The event that begins each of them. */
  collectionEvents: number[];
  aliases: number;
  complaints: Complaint[];
  /** The first event after the document. */
  end: number;
}

const ABSENT = -1;
/** Stands for the value of an alias that has none. */
const NOTHING = '';
const CONTROL_AFTER_ESCAPE = /[^\t\n\r -~\xa0-\ud7ff\ue000-\ufffd]/;

/**
 * Builds plain data from the events of the first document. Every scalar is text; an alias is the very object
 * its anchor names.
 */
export function buildData(events: readonly Event[], text: string): BuiltData {
  const collections: object[] = [];
  const collectionEvents: number[] = [];
  const complaints: Complaint[] = [];
  const anchors = new Map<string, YamlValue | undefined>();
  const openAnchors: string[] = [];
  const outer: {
    list: YamlValue[] | undefined;
    map: YamlMapping | undefined;
    key: string | undefined;
    anchor: string;
  }[] = [];
  let root: YamlValue = NOTHING;
  let list: YamlValue[] | undefined;
  let map: YamlMapping | undefined;
  let key: string | undefined;
  let aliases = 0;
  let i = 1;
  const complain = (kind: Complaint['kind']) => {
    complaints.push({ kind, event: i });
  };

  documents: for (; i < events.length; i++) {
    const event = events[i]!;
    let value: YamlValue;
    switch (event.type) {
      case EVENT_ID.SCALAR:
        value = event.fast ? text.slice(event.valueStart, event.valueEnd) : slowScalar(event, text, complain);
        if (event.tagStart !== ABSENT) complain('tag');
        if (event.anchorStart !== ABSENT) anchors.set(text.slice(event.anchorStart, event.anchorEnd), value);
        if (map !== undefined && key === undefined) {
          key = value;
          if (value === '<<' && event.style === SCALAR_STYLE.PLAIN) complain('merge-key');
          else if (event.valueStart === ABSENT) complain('key-not-text');
          if (key in map) complain('duplicate-key');
          continue;
        }
        break;
      case EVENT_ID.MAPPING:
      case EVENT_ID.SEQUENCE: {
        if (event.tagStart !== ABSENT) complain('tag');
        if (map !== undefined && key === undefined) {
          complain('key-not-text');
          key = NOTHING;
          i = skipKey(events, i);
          continue;
        }
        const anchor = event.anchorStart === ABSENT ? '' : text.slice(event.anchorStart, event.anchorEnd);
        if (anchor !== '') openAnchors.push(anchor);
        outer.push({ list, map, key, anchor });
        if (event.type === EVENT_ID.MAPPING) {
          map = new Mapping();
          list = undefined;
          collections.push(map);
        } else {
          map = undefined;
          list = [];
          collections.push(list);
        }
        collectionEvents.push(i);
        key = undefined;
        continue;
      }
      case EVENT_ID.ALIAS: {
        aliases++;
        const name = text.slice(event.anchorStart, event.anchorEnd);
        if (map !== undefined && key === undefined) {
          complain('key-not-text');
          key = NOTHING;
          continue;
        }
        if (openAnchors.includes(name)) complain('alias-circle');
        else if (!anchors.has(name)) complain('unknown-alias');
        value = anchors.get(name) ?? NOTHING;
        break;
      }
      case EVENT_ID.POP: {
        const frame = outer.pop();
        if (frame === undefined) break documents;
        value = (map ?? list)!;
        if (frame.anchor !== '') {
          openAnchors.pop();
          anchors.set(frame.anchor, value);
        }
        list = frame.list;
        map = frame.map;
        key = frame.key;
        break;
      }
      default:
        break documents;
    }
    if (map !== undefined) {
      map[key!] = value;
      key = undefined;
    } else if (list !== undefined) list.push(value);
    else root = value;
  }
  return { root, collections, collectionEvents, aliases, complaints, end: i + 1 };
}

function slowScalar(event: ScalarEvent, text: string, complain: (kind: 'control-character') => void): string {
  if (event.valueStart === ABSENT) return NOTHING;
  const value = getScalarValue(text, event);
  if (
    event.style === SCALAR_STYLE.DOUBLE_QUOTED &&
    CONTROL_AFTER_ESCAPE.test(value) &&
    !isWellFormed(value)
  ) {
    complain('control-character');
  }
  return value;
}

/** Whether text has no control characters and no half surrogate pairs. */
function isWellFormed(value: string): boolean {
  return !/\p{Cc}|\p{Surrogate}/u.test(value.replace(/[\t\n\r]/g, ''));
}

/** The last event of a key that is a list or a mapping. */
function skipKey(events: readonly Event[], index: number): number {
  let depth = 0;
  for (let i = index; i < events.length; i++) {
    const type = events[i]!.type;
    if (type === EVENT_ID.SEQUENCE || type === EVENT_ID.MAPPING) depth++;
    else if (type === EVENT_ID.POP && --depth === 0) return i;
  }
  return events.length;
}
