import type * as z from 'zod';
import type { Fault } from '../errors.ts';
import { nearestName } from '../nearest-name.ts';
import type { Places } from '../yaml/places.ts';
import type { PathStep, YamlMapping, YamlValue } from '../yaml/value.ts';
import {
  branchFor,
  type Definition,
  definitionAt,
  expectation,
  narrow,
  shapeOfValue,
  valueAt,
} from './schema-walk.ts';
import { SOLIDS } from './solid-keys.ts';
import { synonymOf } from './synonyms.ts';
import { found, labelOf, nounOf, shorten } from './words.ts';

type Issue = z.core.$ZodIssue;

/** Lists of known keys longer than this are left to the reference. */
const KEYS_IN_A_HINT = 14;

/** Turns what zod found into faults with places and words. */
export class IssueFaults {
  readonly #schema: z.ZodType;
  readonly #root: YamlValue;
  readonly #places: Places;
  /** By mapping, the known keys that its mistyped ones probably stand for. */
  readonly meant = new Map<object, Set<string>>();

  constructor(schema: z.ZodType, root: YamlValue, places: Places) {
    this.#schema = schema;
    this.#root = root;
    this.#places = places;
  }

  /** One issue's faults: one for each unknown key, one for anything else; of a union, those of the branch that fits. */
  faultsOf(issue: Issue, prefix: readonly PathStep[] = []): Fault[] {
    const path = [...prefix, ...(issue.path as PathStep[])];
    switch (issue.code) {
      case 'unrecognized_keys':
        return issue.keys.flatMap((key) => this.#splitText(path, key) ?? this.#unknownKey(path, key));
      case 'invalid_union':
        return this.#union(issue.errors, path);
      case 'invalid_value':
        return [this.#unknownChoice(path)];
      case 'too_small':
      case 'too_big':
        return [this.#wrongLength(path, issue)];
      default:
        return [this.#isMissing(path) ? this.#missingKey(path) : this.#wrongShape(path)];
    }
  }

  #union(errors: readonly Issue[][], path: PathStep[]): Fault[] {
    const definition = definitionAt(this.#schema, path, this.#root);
    const value = valueAt(this.#root, path);
    if (value === undefined) return [this.#missingKey(path)];
    const branch = branchFor(definition?.options ?? [], shapeOfValue(value));
    const issues = errors[branch];
    if (issues === undefined || issues.length === 0) return [this.#wrongShape(path)];
    return issues.flatMap((issue) => this.faultsOf(issue, path));
  }

  /**
   * A key without a value behind a text, as in `{ note: wraps, I hope }`: the comma has split what was one text.
   *
   * @returns one fault for all pieces of a text, at its first; undefined where the key is one that was meant as such
   */
  #splitText(path: PathStep[], key: string): Fault[] | undefined {
    const entries = Object.entries(valueAt(this.#root, path) as YamlMapping);
    const known = this.#knownKeys(path);
    const isPiece = ([name, value]: readonly [string, YamlValue]) => value === '' && !known.includes(name);
    const at = entries.findIndex(([name]) => name === key);
    const first = entries.findLastIndex((entry, i) => i < at && !isPiece(entry));
    const [owner, text] = entries[first] ?? [];
    if (owner === undefined || !isPiece(entries[at]!) || typeof text !== 'string' || text === '')
      return undefined;
    if (!this.#isInFlow(path, owner, key) || (!key.includes(' ') && nearestName(key, known)))
      return undefined;
    if (at > first + 1) return [];
    const after = entries.slice(at).findIndex((entry) => !isPiece(entry));
    const pieces = entries.slice(at, after < 0 ? undefined : at + after).map(([name]) => name);
    const whole = shorten([text, ...pieces].join(', '));
    return [
      {
        code: 'YAML_UNQUOTED_COMMA',
        message: `the comma in ${whole} splits it here, inside { }`,
        ...this.#places.markOf([...path, owner]),
        hint: `a text with a comma needs quotes there: "${whole}"`,
      },
    ];
  }

  /** Whether two keys stand inside { }: those of an indented mapping stand below one another. */
  #isInFlow(path: PathStep[], one: string, other: string): boolean {
    const [a, b] = [one, other].map((key) => this.#places.markOfKey([...path, key]).at);
    return a?.line === b?.line || a?.column !== b?.column;
  }

  #unknownKey(path: PathStep[], key: string): Fault {
    const known = this.#knownKeys(path);
    const isSolid = path.at(-1) === 'solid';
    const what = isSolid
      ? `unknown solid '${shorten(key)}'`
      : `unknown key '${shorten(key)}' in ${nounOf(path)}`;
    const nearest = nearestName(key, known) ?? synonymOf(key, known);
    if (nearest !== undefined) this.#remember(path, nearest);
    return {
      code: isSolid ? 'MODEL_UNKNOWN_CHOICE' : 'MODEL_UNKNOWN_KEY',
      message: nearest === undefined ? what : `${what}; did you mean '${nearest}'?`,
      ...this.#places.markOfKey([...path, key]),
      hint:
        known.length <= KEYS_IN_A_HINT || (isSolid && nearest === undefined)
          ? `known here: ${known.join(', ')}`
          : undefined,
    };
  }

  #remember(path: PathStep[], key: string): void {
    const owner = valueAt(this.#root, path) as object;
    this.meant.set(owner, (this.meant.get(owner) ?? new Set()).add(key));
  }

  /** Whether a fault calls a key missing that a mistyped one stands for. */
  isExplained(issue: Issue): boolean {
    const path = issue.path as PathStep[];
    const owner = valueAt(this.#root, path.slice(0, -1));
    const key = path.at(-1);
    if (typeof owner !== 'object' || typeof key !== 'string' || key in owner) return false;
    return this.meant.get(owner)?.has(key) === true;
  }

  #knownKeys(path: PathStep[]): string[] {
    const definition = definitionAt(this.#schema, path, this.#root);
    if (definition === undefined) return [];
    const object = narrow(definition, valueAt(this.#root, path));
    return Object.keys(object.shape ?? {});
  }

  #unknownChoice(path: PathStep[]): Fault {
    const value = valueAt(this.#root, path);
    if (value === undefined) return this.#missingKey(path);
    if (typeof value !== 'string' || value === '') return this.#wrongShape(path);
    const definition = definitionAt(this.#schema, path, this.#root)!;
    const choices = Object.keys(narrow(definition, value).entries ?? {});
    const nearest = nearestName(value, choices);
    const message = `${labelOf(path)} is '${shorten(value)}'; expected ${this.#expected(path, definition)}`;
    return {
      code: 'MODEL_UNKNOWN_CHOICE',
      message: nearest === undefined ? message : `${message}; did you mean '${nearest}'?`,
      ...this.#places.markOf(path),
      hint: this.#choiceHint(path, value, choices),
    };
  }

  #choiceHint(path: PathStep[], value: string, choices: string[]): string | undefined {
    if (choices.includes('true')) return 'only "true" and "false" are yes and no here';
    if (path.at(-1) !== 'solid') return undefined;
    const solid = synonymOf(value, Object.keys(SOLIDS)) ?? nearestName(value, Object.keys(SOLIDS));
    return solid === undefined ? undefined : `write its sizes too: solid: { ${solid}: { … } }`;
  }

  #isMissing(path: PathStep[]): boolean {
    return typeof path.at(-1) === 'string' && valueAt(this.#root, path) === undefined;
  }

  #missingKey(path: PathStep[]): Fault {
    const owner = path.slice(0, -1);
    return {
      code: 'MODEL_MISSING_KEY',
      message: `${nounOf(owner)} needs '${path.at(-1)}'`,
      ...this.#places.markOf(owner),
      hint: this.#missingHint(path),
    };
  }

  #missingHint(path: PathStep[]): string | undefined {
    const definition = definitionAt(this.#schema, path, this.#root);
    if (definition === undefined) return undefined;
    return `add '${path.at(-1)}': ${this.#expected(path, definition)}`;
  }

  #wrongShape(path: PathStep[]): Fault {
    const value = valueAt(this.#root, path);
    const definition = definitionAt(this.#schema, path, this.#root);
    const expected = definition === undefined ? 'nothing' : this.#expected(path, definition);
    return {
      code: 'MODEL_WRONG_SHAPE',
      message: `${labelOf(path)} is ${found(value)}; expected ${expected}`,
      ...this.#places.markOf(path),
      hint: definition === undefined ? undefined : shapeHint(value, definition, path),
    };
  }

  #wrongLength(path: PathStep[], issue: { minimum?: unknown; maximum?: unknown; exact?: boolean }): Fault {
    const value = valueAt(this.#root, path);
    const definition = definitionAt(this.#schema, path, this.#root);
    const count = Array.isArray(value) ? value.length : 0;
    const items = narrow(definition ?? { type: 'string' }, value).items;
    const bound = String(issue.minimum ?? issue.maximum);
    const expected =
      items !== undefined ? String(items.length) : issue.exact === true ? bound : `at least ${bound}`;
    return {
      code: 'MODEL_WRONG_SHAPE',
      message: `${labelOf(path)} has ${count === 1 ? '1 item' : `${count} items`}; expected ${expected}`,
      ...this.#places.markOf(path),
    };
  }

  #expected(path: PathStep[], definition: Definition): string {
    if (path.at(-1) === 'solid') return "particle or a mapping with a solid's name";
    return expectation(definition);
  }
}

function shapeHint(
  value: YamlValue | undefined,
  definition: Definition,
  path: readonly PathStep[],
): string | undefined {
  const expected = expectation(definition);
  if (value === '' && expected === 'a mapping')
    return `write '${path.at(-1)}: {}' when there is nothing to say`;
  if (value === '' && expected.startsWith('a list'))
    return 'list the items below it, each after "-", or delete the key';
  if (expected === 'a list' && typeof value === 'object') return 'put it in a list: [ { … } ]';
  if (expected === 'a list') return 'put it in a list: [ … ]';
  if (expected === 'a list of 3 items') return 'write [ x, y, z ]';
  return undefined;
}
