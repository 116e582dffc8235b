import { drawRoll } from '#core/drawing/draw-roll.ts';
import { InputError } from '#core/errors.ts';
import { loadProject } from '#core/model/load-project.ts';
import { buildRecord } from '#core/record/build-record.ts';
import { rollUp } from '#core/rollup/roll-up.ts';
import { sha256 } from '../services/secrets.ts';
import { MemorySource } from './memory-source.ts';
import type { UploadResult, UploadTask } from './tasks.ts';

/** Rolls uploaded files up, in every state or in one, as the command would. */
export function rollUpUpload({ top, state, files, tool, at }: UploadTask): UploadResult {
  try {
    const project = loadProject(top, new MemorySource(new Map(files.map((f) => [f.path, f.content]))));
    const states = state === null ? project.root.states.map((s) => s.name) : [state];
    const rolls = states.map((name) => rollUp(project, { state: name }));
    const records = rolls.map((roll) => buildRecord(roll, { tool, at }, sha256));
    return { records, drawings: rolls.map((roll, i) => drawRoll(roll, records[i]!)) };
  } catch (error) {
    if (error instanceof InputError) return { faults: error.faults };
    throw error;
  }
}
