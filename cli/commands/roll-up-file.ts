import { existsSync, realpathSync } from 'node:fs';
import { resolve } from 'node:path';
import { InputError } from '#core/errors.ts';
import { openProject } from '#core/model/open-project.ts';
import type { Project } from '#core/model/read-project.ts';
import type { ProjectSource } from '#core/model/source.ts';
import { buildRecord } from '#core/record/build-record.ts';
import type { Provenance, RollUpRecord } from '#core/record/record.ts';
import { type RollUp, rollUp } from '#core/rollup/roll-up.ts';
import { setValues } from '#core/rollup/set-values.ts';
import { DiskSource, sha256 } from '../project/disk-source.ts';
import { projectPath, projectRoot } from '../project/project-root.ts';
import { provenanceOf } from '../project/provenance.ts';
import { type Context, tell } from './context.ts';

export interface RollUpRequest {
  /** States asked for; all where empty. */
  readonly states: readonly string[];
  /** `--set`, for the top file's parameters. */
  readonly set: Readonly<Record<string, string>>;
}

/** A file rolled up in every state asked for. */
export interface FileRun {
  readonly project: Project;
  readonly source: ProjectSource;
  readonly rolls: readonly RollUp[];
  readonly records: readonly RollUpRecord[];
}

/** Rolls up one file on disk. Git is asked while the core computes. */
export async function rollUpFile(file: string, request: RollUpRequest, context: Context): Promise<FileRun> {
  const { source, path } = openFile(file, context);
  const provenance = provenanceOf(source.root, context.io.env);
  // A rejection is reported by the await below; until then it must not count as unhandled.
  provenance.catch(() => undefined);
  const { project, rolls } = await rollUpSource(path, source, request, context);
  return { project, source, rolls, records: recordsOf(rolls, await provenance) };
}

/** The source of a file given on the command line, and its path in the project. */
export function openFile(file: string, context: Context): { source: DiskSource; path: string } {
  if (!existsSync(file))
    throw new InputError([
      {
        code: 'FILE_MISSING',
        message: `expected a file, found none at ${file}`,
        hint: 'check the name; `steelyard new FILE` writes a starter assembly',
      },
    ]);
  const root = projectRoot(realpathSync(resolve(file)));
  const source = new DiskSource(root);
  context.source = source;
  return { source, path: projectPath(root, realpathSync(resolve(file))) };
}

export async function rollUpSource(
  path: string,
  source: ProjectSource,
  request: RollUpRequest,
  context: Context,
): Promise<{ project: Project; rolls: RollUp[] }> {
  tell(context, `reading ${path}`);
  const project = await openProject(path, source);
  const set = setValues(project.root, request.set);
  const states = request.states.length > 0 ? request.states : project.root.states.map((s) => s.name);
  const meshes = new Map();
  const meshInputs = new Map();
  const rolls = states.map((state) => {
    tell(context, `rolling up ${project.root.assembly}, ${state}`);
    return rollUp(project, { state, set, meshes, meshInputs });
  });
  return { project, rolls };
}

export const recordsOf = (rolls: readonly RollUp[], provenance: Provenance): RollUpRecord[] =>
  rolls.map((roll) => buildRecord(roll, { ...provenance }, sha256));
