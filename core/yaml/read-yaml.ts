import { EVENT_ID, type Event } from 'js-yaml';
import { type Fault, FaultList, InputError } from '../errors.ts';
import { nearestName } from '../nearest-name.ts';
import { type BuiltData, buildData, type Complaint } from './build-data.ts';
import { checkText } from './check-text.ts';
import { isEmptyPlain, nextValue, spanOf } from './event-spans.ts';
import { LineTable } from './line-table.ts';
import { measureExpanded } from './measure-aliases.ts';
import { DEPTH_AT_MOST, parse, tooManyNodes } from './parse-events.ts';
import { Places } from './places.ts';
import { TAG_WORDS, TOO_DEEP_WORDS } from './syntax-words.ts';
import type { YamlMapping } from './value.ts';

/** The most values a file may hold, counting what its aliases stand for. */
export const NODES_AT_MOST = 1_000_000;

/** The most aliases a file may use, counting those inside what other aliases stand for. */
export const ALIASES_AT_MOST = 100;

/** A file read: its data, every scalar as text, and where everything stands. */
export interface YamlFile {
  root: YamlMapping;
  places: Places;
}

/**
 * Reads one YAML file whose root is a mapping. Every scalar is text: no numbers, dates, yes/no or null.
 *
 * @param text the file's text; a byte order mark is dropped
 * @param file its name in faults
 * @throws InputError TEXT_TOO_LARGE, TEXT_CONTROL_CHARACTER, YAML_SYNTAX, YAML_TAG, YAML_TOO_DEEP, YAML_EMPTY,
 * YAML_SEVERAL_DOCUMENTS, YAML_NOT_MAPPING, YAML_DUPLICATE_KEY, YAML_MERGE_KEY, YAML_KEY_NOT_TEXT, YAML_ALIASES,
 * YAML_UNKNOWN_ALIAS, YAML_ALIAS_CIRCLE, YAML_TOO_MANY_NODES
 */
export function readYaml(text: string, file: string): YamlFile {
  const body = checkText(text, file);
  const events = parse(body, file);
  const reader = new Reader(events, body, file);
  if (events.length === 0) throw reader.error(EMPTY, 0);
  const data = buildData(events, body);
  reader.judge(data);
  return {
    root: data.root as YamlMapping,
    places: new Places(file, body, data.collections, data.collectionEvents, events),
  };
}

type Words = Omit<Fault, 'at' | 'length'>;

const EMPTY: Words = {
  code: 'YAML_EMPTY',
  message: 'the file is empty',
  hint: 'begin with "assembly: <name>" and "parts:"',
};

/** Judges what was built. Only files with something to say make it look at places. */
class Reader {
  readonly #events: readonly Event[];
  readonly #text: string;
  readonly #file: string;
  #lines: LineTable | undefined;

  constructor(events: readonly Event[], text: string, file: string) {
    this.#events = events;
    this.#text = text;
    this.#file = file;
  }

  /** @throws InputError when anything is wrong */
  judge(data: BuiltData): void {
    const faults = new FaultList();
    if (data.complaints.length > 0) {
      for (const complaint of data.complaints) faults.add(this.#complaint(complaint));
    }
    this.#judgeSize(data, faults);
    if (data.end < this.#events.length)
      faults.add(this.#fault(SEVERAL_DOCUMENTS, this.#secondDocument(data.end)));
    else if (isEmptyPlain(this.#events[1]!)) faults.add(this.#fault(EMPTY, 1));
    else if (typeof data.root === 'string' || Array.isArray(data.root)) {
      faults.add(this.#fault(notMapping(Array.isArray(data.root)), 1));
    }
    faults.check();
  }

  error(words: Words, event: number): InputError {
    return new InputError([this.#fault(words, event)]);
  }

  #judgeSize(data: BuiltData, faults: FaultList): void {
    if (this.#events.length <= NODES_AT_MOST && data.aliases === 0) return;
    const size = measureExpanded(this.#events, this.#text);
    if (size.aliases > ALIASES_AT_MOST)
      faults.add(this.#fault(tooManyAliases(size.aliases), this.#firstAlias()));
    if (size.nodes > NODES_AT_MOST) faults.add(tooManyNodes(this.#file).faults[0]!);
    if (size.depth > DEPTH_AT_MOST) faults.add(this.#fault(TOO_DEEP_WORDS, this.#firstAlias()));
  }

  #complaint(complaint: Complaint): Fault {
    const { event } = complaint;
    switch (complaint.kind) {
      case 'duplicate-key':
        return this.#fault(this.#duplicateKey(event), event);
      case 'unknown-alias':
        return this.#fault(unknownAlias(this.#name(event), this.#anchorsBefore(event)), event);
      case 'tag':
        return this.#tag(event);
      case 'alias-circle':
        return this.#fault(aliasCircle(this.#name(event)), event);
      default:
        return this.#fault(COMPLAINTS[complaint.kind], event);
    }
  }

  #tag(index: number): Fault {
    const event = this.#events[index];
    if (event === undefined || !('tagStart' in event)) return this.#fault(TAG_WORDS, index);
    const at = { file: this.#file, ...this.#lineTable.placeOf(event.tagStart) };
    return { ...TAG_WORDS, at, length: event.tagEnd - event.tagStart };
  }

  #duplicateKey(index: number): Words {
    const key = this.#name(index);
    const first = this.#place(this.#firstOfKey(key, index));
    return {
      code: 'YAML_DUPLICATE_KEY',
      message: `the key '${key}' is given twice here; the first is at ${first.line}:${first.column}`,
      hint: 'delete or rename one of them',
    };
  }

  /** The first key of this name in the mapping that holds the key at `index`. */
  #firstOfKey(key: string, index: number): number {
    let depth = 0;
    let start = index - 1;
    for (; start > 0; start--) {
      const type = this.#events[start]!.type;
      if (type === EVENT_ID.POP) depth++;
      else if (type === EVENT_ID.MAPPING || type === EVENT_ID.SEQUENCE) {
        if (depth === 0) break;
        depth--;
      }
    }
    for (let i = start + 1; i < index; i = nextValue(this.#events, nextValue(this.#events, i))) {
      if (this.#name(i) === key) return i;
    }
    return index;
  }

  /** The text of a scalar without escapes, or an alias's name. */
  #name(index: number): string {
    const event = this.#events[index];
    if (event?.type === EVENT_ID.ALIAS) return this.#text.slice(event.anchorStart, event.anchorEnd);
    if (event?.type === EVENT_ID.SCALAR) return this.#text.slice(event.valueStart, event.valueEnd);
    return '';
  }

  #anchorsBefore(index: number): string[] {
    const names: string[] = [];
    for (let i = 0; i < index; i++) {
      const event = this.#events[i]!;
      if (event.type === EVENT_ID.ALIAS || !('anchorStart' in event) || event.anchorStart < 0) continue;
      names.push(this.#text.slice(event.anchorStart, event.anchorEnd));
    }
    return names;
  }

  #firstAlias(): number {
    return this.#events.findIndex((event) => event.type === EVENT_ID.ALIAS);
  }

  /** The first event of the second document that stands somewhere; else its beginning. */
  #secondDocument(start: number): number {
    const events = this.#events;
    for (let i = start + 1; i < events.length; i++) {
      const type = events[i]!.type;
      if (type !== EVENT_ID.POP && type !== EVENT_ID.DOCUMENT && !isEmptyPlain(events[i]!)) return i;
    }
    return start + 1;
  }

  #fault(words: Words, index: number): Fault {
    const { length } = spanOf(this.#events, index, this.#text);
    return { ...words, at: { file: this.#file, ...this.#place(index) }, length };
  }

  #place(index: number): { line: number; column: number } {
    return this.#lineTable.placeOf(spanOf(this.#events, index, this.#text).start);
  }

  get #lineTable(): LineTable {
    this.#lines ??= new LineTable(this.#text);
    return this.#lines;
  }
}

const COMPLAINTS: Record<'merge-key' | 'key-not-text' | 'control-character', Words> = {
  'merge-key': {
    code: 'YAML_MERGE_KEY',
    message: 'merge keys ("<<") are not used in an assembly file',
    hint: 'write the keys out, or use "include" with "with"',
  },
  'key-not-text': {
    code: 'YAML_KEY_NOT_TEXT',
    message: 'a key must be text; this one is missing, a list, a mapping or an alias',
    hint: 'quote text that begins with a bracket, a brace or "*"',
  },
  'control-character': {
    code: 'TEXT_CONTROL_CHARACTER',
    message: 'the quoted text has an escape for a control character',
    hint: 'delete the escape',
  },
};

const SEVERAL_DOCUMENTS: Words = {
  code: 'YAML_SEVERAL_DOCUMENTS',
  message: 'the file holds several YAML documents; an assembly file holds one',
  hint: 'delete the "---" line, or move the second document into a file of its own',
};

function notMapping(isList: boolean): Words {
  return {
    code: 'YAML_NOT_MAPPING',
    message: `the file holds ${isList ? 'a list' : 'text'} where keys are expected`,
    hint: 'begin with "assembly: <name>" and "parts:"',
  };
}

function tooManyAliases(count: number): Words {
  const counted = count > 1_000_000 ? 'more than a million' : String(count);
  return {
    code: 'YAML_ALIASES',
    message: `the file uses ${counted} aliases, counting those inside others; at most ${ALIASES_AT_MOST} are read`,
    hint: 'use "repeat" for copies, or "include" with "with"',
  };
}

function unknownAlias(name: string, known: readonly string[]): Words {
  const nearest = nearestName(name, known);
  return {
    code: 'YAML_UNKNOWN_ALIAS',
    message: `the alias '*${name}' names no anchor above it${nearest === undefined ? '' : `; did you mean '*${nearest}'?`}`,
    hint: `write '&${name}' before the value it stands for, or quote the text`,
  };
}

function aliasCircle(name: string): Words {
  return {
    code: 'YAML_ALIAS_CIRCLE',
    message: `the alias '*${name}' stands inside the value it names`,
    hint: 'delete the alias',
  };
}
