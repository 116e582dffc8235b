import type { Fault } from '../errors.ts';
import type { Places } from '../yaml/places.ts';
import type { PathStep, YamlMapping, YamlValue } from '../yaml/value.ts';
import { oneOf } from './schema-walk.ts';

/** Where a judge says what it finds. Values are named by the mapping that holds them and a path from there. */
export interface Judge {
  places: Places;
  faults: Fault[];
  /** Keys that mistyped ones of a mapping probably stand for; those are not called missing as well. */
  meant?: ReadonlyMap<object, ReadonlySet<string>>;
}

/** A fault's code, message and hint. */
export type Words = Pick<Fault, 'code' | 'message' | 'hint'>;

/** Blames a key of a mapping. */
export function blameKey(judge: Judge, words: Words, owner: object, ...path: PathStep[]): void {
  judge.faults.push({ ...words, ...judge.places.markOfKey(path, owner) });
}

/** Blames a value. */
export function blameValue(judge: Judge, words: Words, owner: object, ...path: PathStep[]): void {
  judge.faults.push({ ...words, ...judge.places.markOf(path, owner) });
}

export function isMapping(value: YamlValue | undefined): value is YamlMapping {
  return typeof value === 'object' && !Array.isArray(value);
}

/** Whether a mistyped key of a mapping probably stands for one of these. */
export function isMeant(judge: Judge, owner: object, keys: readonly string[]): boolean {
  const meant = judge.meant?.get(owner);
  return meant !== undefined && keys.some((key) => meant.has(key));
}

/** The entries of a value that should be a mapping; none when it is not, which the schema reports. */
export function entriesOf(value: YamlValue | undefined): [string, YamlValue][] {
  return isMapping(value) ? Object.entries(value) : [];
}

/** The items of a value that should be a list. */
export function itemsOf(value: YamlValue | undefined): YamlValue[] {
  return Array.isArray(value) ? value : [];
}

/**
 * Judges that a mapping has exactly one of some keys.
 *
 * @returns the one key it has, if it has just one
 */
export function needOne(
  judge: Judge,
  owner: YamlMapping,
  keys: readonly string[],
  noun: string,
  hint?: string,
): string | undefined {
  const given = keys.filter((key) => key in owner);
  if (given.length === 1) return given[0];
  if (given.length > 1) clash(judge, owner, given[0]!, given[1]!, noun);
  else if (!isMeant(judge, owner, keys)) {
    const list = oneOf(keys.map((key) => `'${key}'`));
    blameValue(judge, { code: 'MODEL_MISSING_KEY', message: `${noun} needs ${list}`, hint }, owner);
  }
  return undefined;
}

/** Blames the second of two keys that exclude one another. */
export function clash(
  judge: Judge,
  owner: object,
  first: string,
  second: string,
  noun: string,
  hint?: string,
): void {
  const message = `${noun} has both '${first}' and '${second}'; only one of them can be given`;
  blameKey(
    judge,
    { code: 'MODEL_KEYS_CLASH', message, hint: hint ?? 'delete one of the two' },
    owner,
    second,
  );
}
