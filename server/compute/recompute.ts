import { gunzipSync } from 'node:zlib';
import { drawRoll } from '#core/drawing/draw-roll.ts';
import { InputError } from '#core/errors.ts';
import { loadProject } from '#core/model/load-project.ts';
import { parameterNamed } from '#core/model/read-parameters.ts';
import { buildRecord } from '#core/record/build-record.ts';
import type { RollUpRecord } from '#core/record/record.ts';
import { rollUp } from '#core/rollup/roll-up.ts';
import { CORE_VERSION } from '#core/version.ts';
import { contentOf, type RecordContent } from '../services/record-content.ts';
import { sha256 } from '../services/secrets.ts';
import { firstDifference } from './first-difference.ts';
import { MemorySource } from './memory-source.ts';
import type { RecomputeResult, RecomputeTask } from './tasks.ts';

/** Computes a stored record again from its inputs, state and parameter values, and compares all of it. */
export function recompute(task: RecomputeTask): RecomputeResult {
  const stored = JSON.parse(gunzipSync(task.content).toString('utf8')) as RecordContent;
  const not = (detail: string): RecomputeResult => ({ status: 'not recomputable', detail, drawing: null });
  if (stored.conventions.coreVersion !== CORE_VERSION)
    return not(`made by core version ${stored.conventions.coreVersion}; this server has ${CORE_VERSION}`);
  // Each content is unpacked once, however many paths it has.
  const unpacked = new Map<Uint8Array, Uint8Array>();
  for (const content of task.contents) unpacked.set(content, gunzipSync(content));
  const files = new Map(
    task.inputs.map(({ path, content }) => [path, unpacked.get(task.contents[content]!)!]),
  );
  const missing = stored.inputs.filter(({ path }) => !files.has(path)).map(({ path }) => path);
  if (missing.length > 0) return not(`inputs that did not come with it: ${missing.join(', ')}`);
  try {
    const { record, drawing } = compute(stored, files);
    const difference = firstDifference(stored, contentOf(record));
    return difference
      ? { status: 'differs', detail: difference, drawing }
      : { status: 'recomputed', detail: null, drawing };
  } catch (error) {
    if (!(error instanceof InputError)) throw error;
    const { code, message, at } = error.faults[0]!;
    return not(`${code}: ${message}${at ? ` (${at.file}:${at.line}:${at.column})` : ''}`);
  }
}

function compute(stored: RecordContent, files: ReadonlyMap<string, Uint8Array>) {
  const top = stored.inputs[0];
  if (!top)
    throw new InputError([
      { code: 'RECORD_WITHOUT_INPUT', message: 'expected an assembly file, found none' },
    ]);
  const project = loadProject(top.path, new MemorySource(files));
  // The record says every value, whether the file, the state or the call gave it.
  const set = new Map<number, number>();
  for (const [name, { value }] of Object.entries(stored.parameters)) {
    const symbol = parameterNamed(project.root.slots, name);
    if (symbol) set.set(symbol.slot, value);
  }
  const roll = rollUp(project, { state: stored.state, set });
  const record: RollUpRecord = buildRecord(roll, { tool: '', at: '' }, sha256);
  return { record, drawing: drawRoll(roll, record) };
}
