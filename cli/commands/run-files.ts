import { FAULTS_AT_MOST, type Fault, InputError } from '#core/errors.ts';
import { plainText } from '#core/figures/index.ts';
import type { RollUpRecord } from '#core/record/record.ts';
import { type PartSelection, selectPart } from '#core/record/select-part.ts';
import { isBroken } from '#core/record/waiver-state.ts';
import { EXIT } from '../exit-status.ts';
import { writeWhole } from '../io.ts';
import { annotationsOfFaults, annotationsOfRecords, formatAnnotations } from '../output/ci-annotations.ts';
import { ciState } from '../project/ci.ts';
import type { Settings } from '../push/settings.ts';
import { aboutOf } from './about.ts';
import type { Context } from './context.ts';
import { checkUnits, dayOf, formatOfFile, partsOf } from './options.ts';
import { renderRecords } from './render-records.ts';
import { type FileRun, rollUpFile } from './roll-up-file.ts';
import { RUN_FORMATS, type RunOptions } from './run-options.ts';

/** The work of `run` and `check`: roll up, print, and for `check` judge. */
export async function runFiles(
  files: readonly string[],
  options: RunOptions,
  context: Context,
  command: 'run' | 'check',
): Promise<void> {
  const today = dayOf(options.asOf);
  // What is wrong with the call is said before anything is computed.
  const outputs = options.out.map((file) => ({ file, format: formatOfFile(file, options, RUN_FORMATS) }));
  const format = options.format ?? (context.io.outIsTerminal ? 'table' : 'json');
  checkCall(options, outputs.length > 0 ? outputs.map((output) => output.format) : [format]);
  const settings = await pushSettings(options, context);
  const runs = await rollUpAll(files, options, context);
  if (!runs) return;
  const records = runs.flatMap((run) => run.records);
  for (const record of records) checkFrame(record, options);
  const selections = options.of === undefined ? null : selectIn(runs, options.of);
  const request = { records, selections, options, today };
  for (const { file, format } of outputs) writeWhole(file, renderRecords(format, request, null));
  if (outputs.length === 0) context.io.out(renderRecords(format, request, context));
  if (options.threeView) await drawThreeViews(runs, options.threeView, context);
  reportWarnings(records, outputs.length > 0 || !SHOW_WARNINGS.has(format), context);
  const broken = records.some((record) => record.limits.some((limit) => isBroken(limit, today)));
  if (command === 'check') {
    annotate(annotationsOfRecords(records, today, options.units), context);
    if (broken) context.status = EXIT.broken;
  }
  if (settings) await push(runs, settings, context);
}

/** Where to push; null where that is not asked for. */
async function pushSettings(options: RunOptions, context: Context): Promise<Settings | null> {
  if (options.push) {
    const { readSettings } = await import('../push/settings.ts');
    return readSettings(options, context.io.env);
  }
  if (options.server === undefined && options.project === undefined && !options.insecure) return null;
  throw new InputError([
    {
      code: 'CALL_PUSH',
      message: 'expected --push beside the server or project to push to, found none',
      hint: 'add --push, or leave --server, --project and --insecure out',
    },
  ]);
}

async function push(runs: readonly FileRun[], settings: Settings, context: Context): Promise<void> {
  const { pack } = await import('../push/pack.ts');
  const { findIn } = await import('../push/find-input.ts');
  const { pushRecords } = await import('../push/push-records.ts');
  const parcels = runs.flatMap(({ records, source }) => {
    const find = findIn([source]);
    return records.map((record) => pack(record, find));
  });
  await pushRecords(parcels, settings, context);
}

/** Rolls every file up; the faults of all are printed together, and then nothing else is. */
async function rollUpAll(
  files: readonly string[],
  options: RunOptions,
  context: Context,
): Promise<FileRun[] | null> {
  const { reportFaults } = await import('../program.ts');
  const runs: FileRun[] = [];
  let faults: Fault[] = [];
  for (const file of files) {
    try {
      runs.push(await rollUpFile(file, { states: options.state, set: options.set }, context));
    } catch (error) {
      if (!(error instanceof InputError)) throw error;
      reportFaults(error.faults, context);
      faults = [...faults, ...error.faults];
    }
  }
  if (faults.length === 0) return runs;
  if (faults.length >= FAULTS_AT_MOST && !context.quiet)
    context.io.err(`reading stopped after ${FAULTS_AT_MOST} faults; mend these and run again\n`);
  annotate(annotationsOfFaults(faults), context);
  context.status = EXIT.wrong;
  return null;
}

/** What is wrong with the options, whatever the format that is asked for shows of them. */
function checkCall(options: RunOptions, formats: readonly string[]): void {
  aboutOf(options.about);
  partsOf(options.parts);
  checkUnits(options.units);
  if (options.of === undefined || !formats.includes('junit')) return;
  throw new InputError([
    {
      code: 'CALL_OF',
      message: 'expected a format that shows one part, found junit, which reports the limits of a whole run',
      hint: 'leave --of out, or ask for table, json, ndjson, csv or markdown',
    },
  ]);
}

/** A frame that does not exist is the call's fault, not a bug. */
function checkFrame(record: RollUpRecord, { frame }: RunOptions): void {
  if (frame === undefined || Object.hasOwn(record.frames, frame)) return;
  throw new InputError([
    {
      code: 'CALL_FRAME',
      message: `expected a frame of ${record.assembly}, found '${frame}'`,
      hint: `known: ${Object.keys(record.frames).join(', ') || 'none; declare it under `frames:`'}`,
    },
  ]);
}

function selectIn(runs: readonly FileRun[], path: string): PartSelection[] {
  return runs.flatMap((run) => run.rolls.map((roll, i) => selectPart(roll, run.records[i]!, path)));
}

const SHOW_WARNINGS: ReadonlySet<string> = new Set(['table', 'markdown']);

/** Warnings stand in a table; elsewhere they are said on stderr. */
function reportWarnings(records: readonly RollUpRecord[], aloud: boolean, context: Context): void {
  if (!aloud || context.quiet) return;
  const said = new Set<string>();
  for (const { warnings } of records)
    for (const { code, message, at } of warnings) {
      const line = `warning ${code}: ${message}${at ? ` (${at.file}:${at.line})` : ''}`;
      if (said.has(line)) continue;
      said.add(line);
      context.io.err(`${plainText(line)}\n`);
    }
}

/** Notes beside the lines of the change, where a CI shows them. */
function annotate(annotations: Parameters<typeof formatAnnotations>[0], context: Context): void {
  const ci = ciState(context.io.env);
  if (ci?.ci.name !== 'GitHub Actions' || annotations.length === 0) return;
  context.io.err(formatAnnotations(annotations, 'workflow-command'));
}

async function drawThreeViews(runs: readonly FileRun[], file: string, context: Context): Promise<void> {
  const { drawRoll } = await import('#core/drawing/draw-roll.ts');
  const drawings = runs.flatMap((run) => run.rolls.map((roll, i) => ({ roll, record: run.records[i]! })));
  for (const { roll, record } of drawings) {
    const path = drawings.length === 1 ? file : withName(file, `${record.assembly}-${record.state}`);
    writeWhole(path, drawRoll(roll, record));
    if (!context.quiet) context.io.err(`${path}: three views of ${record.assembly}, ${record.state}\n`);
  }
}

/** `out.svg` → `out-heron-flight.svg`, where several drawings are asked for at once. */
function withName(file: string, name: string): string {
  const plain = name
    .toLowerCase()
    .replace(/[^\p{L}\p{N}]+/gu, '-')
    .replace(/^-|-$/g, '');
  const at = file.lastIndexOf('.');
  return at > file.lastIndexOf('/') + 1
    ? `${file.slice(0, at)}-${plain}${file.slice(at)}`
    : `${file}-${plain}.svg`;
}
