import { type Event, parseEvents, YAMLException } from 'js-yaml';
import { InputError } from '../errors.ts';
import { LineTable } from './line-table.ts';
import { openingOf } from './opening.ts';
import { plainWords } from './syntax-words.ts';

/** The deepest nesting that is read. */
export const DEPTH_AT_MOST = 100;

/** Texts longer than this can hold more nodes than are read, and are counted while they are parsed. */
const LENGTH_WITHOUT_COUNT = 2_000_000;

/** The parser enters a node at most about three times; past this many entries a text has more than a million nodes. */
const ENTRIES_AT_MOST = 3_000_000;

class TooManyNodes extends Error {}

/**
 * A depth limit that counts how often it is asked, which the parser does once a node it enters. It is the one
 * way to stop the parser before a text of millions of nodes has filled the memory.
 */
function countingDepthLimit(): number {
  let entries = 0;
  const limit = {
    valueOf() {
      if (++entries > ENTRIES_AT_MOST) throw new TooManyNodes();
      return DEPTH_AT_MOST;
    },
  };
  return limit as unknown as number;
}

/**
 * Parses YAML into the flat list of events with their offsets.
 *
 * @throws InputError YAML_SYNTAX, YAML_TAG, YAML_TOO_DEEP, YAML_TOO_MANY_NODES
 */
export function parse(text: string, file: string): Event[] {
  const maxDepth = text.length > LENGTH_WITHOUT_COUNT ? countingDepthLimit() : DEPTH_AT_MOST;
  try {
    return parseEvents(text, { maxDepth });
  } catch (error) {
    if (error instanceof TooManyNodes) throw tooManyNodes(file);
    if (error instanceof YAMLException) throw syntaxError(error, text, file);
    throw error;
  }
}

/** The fault of a text with more nodes than are read. */
export function tooManyNodes(file: string): InputError {
  return new InputError([
    {
      code: 'YAML_TOO_MANY_NODES',
      message: 'the file has more than 1000000 values, counting what its aliases stand for',
      at: { file, line: 1, column: 1 },
      hint: 'split it with "include", or use "repeat" for copies',
    },
  ]);
}

function syntaxError(error: YAMLException, text: string, file: string): InputError {
  const noticed = Math.min(error.mark?.position ?? 0, text.length);
  const offset = openingOf(error.reason, text, noticed) ?? noticed;
  const at = { file, ...new LineTable(text).placeOf(offset) };
  return new InputError([{ ...plainWords(error.reason, text[offset]), at }]);
}
