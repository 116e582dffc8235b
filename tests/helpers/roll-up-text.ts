import { createHash } from 'node:crypto';
import { expect } from 'vitest';
import { type Fault, InputError } from '#core/errors.ts';
import { loadProject } from '#core/model/load-project.ts';
import { buildRecord } from '#core/record/build-record.ts';
import type { RollUpRecord } from '#core/record/record.ts';
import { type RollUp, rollUp } from '#core/rollup/roll-up.ts';
import { setValues } from '#core/rollup/set-values.ts';
import { dedent } from './cli-test.ts';
import { MemorySource } from './memory-source.ts';

export interface Given {
  /** Other files of the project by path. */
  files?: Readonly<Record<string, string | Uint8Array>>;
  state?: string;
  set?: Readonly<Record<string, string>>;
}

/** Rolls up an assembly written in the test; the first state where none is asked for. */
export function rollUpText(yaml: string, { files = {}, state, set = {} }: Given = {}): RollUp {
  const texts = Object.entries(files).map(
    ([path, content]) => [path, typeof content === 'string' ? dedent(content) : content] as const,
  );
  const project = loadProject('top.yaml', new MemorySource(new Map([['top.yaml', dedent(yaml)], ...texts])));
  return rollUp(project, {
    state: state ?? project.root.states[0]!.name,
    set: setValues(project.root, set),
  });
}

const hash = (text: string) => createHash('sha256').update(text).digest('hex');

export const recordOfText = (yaml: string, given: Given = {}): RollUpRecord =>
  buildRecord(rollUpText(yaml, given), { tool: 'test', at: '2026-12-01T00:00:00Z' }, hash);

/** The faults of an assembly that must not roll up. */
export function faultsOf(yaml: string, given: Given = {}): readonly Fault[] {
  try {
    rollUpText(yaml, given);
  } catch (error) {
    if (error instanceof InputError) return error.faults;
    throw error;
  }
  return expect.fail('expected a fault, found that the assembly rolls up');
}

/** `CODE line:column` of each fault, the file in front where it is not the top file. */
export const placesOf = (faults: readonly Fault[]): string[] =>
  faults.map(({ code, at }) => {
    const file = !at || at.file === 'top.yaml' ? '' : `${at.file}:`;
    return at ? `${code} ${file}${at.line}:${at.column}` : code;
  });
