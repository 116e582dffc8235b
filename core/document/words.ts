import type { PathStep, YamlValue } from '../yaml/value.ts';

const ITEM_NOUNS: Record<string, string> = {
  parts: 'a part',
  limits: 'a limit',
  rotate: 'a rotation',
  repeat: 'a repeat',
};

const ENTRY_NOUNS: Record<string, string> = {
  materials: 'a material',
  parameters: 'a parameter',
  frames: 'a frame',
  states: 'a state',
  sweeps: 'a sweep',
  vary: 'a range',
};

/** What a mapping at a path is, in words: "a part", "solid 'tube'", "'override'". */
export function nounOf(path: readonly PathStep[]): string {
  const last = path.at(-1);
  const before = path.at(-2);
  if (last === undefined) return 'an assembly';
  if (typeof last === 'number') return ITEM_NOUNS[String(before)] ?? `an item of '${before}'`;
  if (before === 'solid') return `solid '${last}'`;
  if (typeof before === 'string' && Object.hasOwn(ENTRY_NOUNS, before)) return ENTRY_NOUNS[before]!;
  return ITEM_NOUNS[last] !== undefined && last === 'repeat' ? ITEM_NOUNS.repeat! : `'${last}'`;
}

/** How the value at a path is called: "'at'", "item 2 of 'at'". */
export function labelOf(path: readonly PathStep[]): string {
  const last = path.at(-1);
  if (last === undefined) return 'the file';
  if (typeof last === 'string') return `'${shorten(last)}'`;
  const list = path.slice(0, -1);
  return list.length === 0 ? `item ${last + 1}` : `item ${last + 1} of ${labelOf(list)}`;
}

/** What was found, in words. */
export function found(value: YamlValue | undefined): string {
  if (value === undefined || value === '') return 'nothing';
  if (typeof value === 'string') return `the text '${shorten(value)}'`;
  return Array.isArray(value) ? 'a list' : 'a mapping';
}

/** Text fit for a message: one line, not too long. */
export function shorten(text: string): string {
  const line = text.replace(/\s+/g, ' ');
  return line.length <= 40 ? line : `${line.slice(0, 39)}…`;
}
