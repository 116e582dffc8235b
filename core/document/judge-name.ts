import { hasControlCharacter } from '../yaml/check-text.ts';
import type { YamlMapping } from '../yaml/value.ts';
import { blameValue, isMapping, type Judge } from './judge.ts';
import { shorten } from './words.ts';

const STRANGE = /[/[\]]|^\s|\s$|^$|[\r\n\t]/;

/** Judges a part's name: it is a step of a path, so it has no slash, no brackets and no blanks at its ends. */
export function judgeName(judge: Judge, part: YamlMapping): void {
  const { name } = part;
  if (typeof name !== 'string') return;
  if (!STRANGE.test(name) && (isPlain(name) || !hasControlCharacter(name))) return;
  blameValue(
    judge,
    {
      code: 'MODEL_BAD_NAME',
      message: `a part's name ${whatIsStrange(name)}`,
      hint: 'names are steps of a path such as "boom/access hole"; copies are called "servo[1]"',
    },
    part,
    'name',
  );
}

function isPlain(name: string): boolean {
  return /^[ -~]*$/.test(name);
}

function whatIsStrange(name: string): string {
  if (name === '') return 'is empty';
  const sign = /[/[\]]/.exec(name);
  if (sign !== null) return `cannot have "${sign[0]}" in it: '${shorten(name)}'`;
  if (/^\s|\s$/.test(name)) return `begins or ends with a blank: '${shorten(name)}'`;
  return 'has a line end, a tab or a control character in it';
}

/** Judges that the names in a list of parts or limits are given once each. */
export function judgeNamesDiffer(judge: Judge, list: readonly unknown[], noun: string): void {
  const first = new Map<string, YamlMapping>();
  for (const item of list) {
    if (!isMapping(item as YamlMapping)) continue;
    const mapping = item as YamlMapping;
    if (typeof mapping.name !== 'string') continue;
    const before = first.get(mapping.name);
    if (before === undefined) first.set(mapping.name, mapping);
    else blameDuplicate(judge, mapping, before, mapping.name, noun);
  }
}

function blameDuplicate(
  judge: Judge,
  item: YamlMapping,
  before: YamlMapping,
  name: string,
  noun: string,
): void {
  const { line, column } = judge.places.placeOf(item === before ? [] : ['name'], before);
  const message = `two ${noun} beside one another are called '${shorten(name)}'; the first is at ${line}:${column}`;
  blameValue(judge, { code: 'MODEL_DUPLICATE_NAME', message, hint: 'rename one of them' }, item, 'name');
}
