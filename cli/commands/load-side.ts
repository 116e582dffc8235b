import { execFileSync } from 'node:child_process';
import { existsSync, readFileSync } from 'node:fs';
import { resolve } from 'node:path';
import { InputError } from '#core/errors.ts';
import { readRecords } from '#core/record/read-records.ts';
import type { RollUpRecord } from '#core/record/record.ts';
import { decodeUtf8 } from '../project/disk-source.ts';
import { GitSource } from '../project/git-source.ts';
import { projectPath, projectRoot } from '../project/project-root.ts';
import type { Context } from './context.ts';
import { type RollUpRequest, recordsOf, rollUpFile, rollUpSource } from './roll-up-file.ts';

/** One side of a comparison: what was named, and its records. */
export interface Side {
  readonly name: string;
  readonly records: readonly RollUpRecord[];
}

/** Records of a side: a file of records (JSON), an assembly file, or `REV:path` in git. */
export async function loadSide(name: string, request: RollUpRequest, context: Context): Promise<Side> {
  if (existsSync(name)) {
    if (/\.(json|ndjson|jsonl)$/i.test(name))
      return { name, records: pickStates(readRecordFile(name), request, name) };
    return { name, records: (await rollUpFile(name, request, context)).records };
  }
  const revision = /^([^:]+):(.+)$/.exec(name);
  if (revision) return { name, records: await fromGit(revision[1]!, revision[2]!, request, context) };
  throw new InputError([
    {
      code: 'FILE_MISSING',
      message: `expected a record, an assembly file or REV:path, found none at ${name}`,
      hint: 'for instance record.json, heron.yaml, or main:heron.yaml for the file as a branch has it',
    },
  ]);
}

export const readRecordFile = (file: string): RollUpRecord[] =>
  readRecords(decodeUtf8(readFileSync(file), file), file);

function pickStates(
  records: readonly RollUpRecord[],
  { states }: RollUpRequest,
  name: string,
): readonly RollUpRecord[] {
  if (states.length === 0) return records;
  const picked = records.filter((record) => states.includes(record.state));
  if (picked.length > 0) return picked;
  throw new InputError([
    {
      code: 'MODEL_UNKNOWN_STATE',
      message: `expected state ${states.join(', ')} in ${name}, found ${records.map((r) => r.state).join(', ')}`,
      hint: 'choose one of these with --state',
    },
  ]);
}

/** The path is relative to the repository's root, or to the current folder with `./` (as git reads it). */
async function fromGit(
  revision: string,
  path: string,
  request: RollUpRequest,
  context: Context,
): Promise<RollUpRecord[]> {
  const root = projectRoot(resolve('x'));
  const commit = commitOf(root, revision);
  const inside = path.startsWith('./') ? projectPath(root, resolve(path)) : path;
  const source = new GitSource(root, commit);
  context.source = source;
  const { rolls } = await rollUpSource(inside, source, request, context);
  return recordsOf(rolls, { tool: 'steelyard', commit, at: new Date(0).toISOString() });
}

function commitOf(root: string, revision: string): string {
  try {
    return execFileSync(
      'git',
      ['-C', root, 'rev-parse', '--verify', '--quiet', '--end-of-options', `${revision}^{commit}`],
      {
        encoding: 'utf8',
        stdio: ['ignore', 'pipe', 'ignore'],
      },
    ).trim();
  } catch {
    throw new InputError([
      {
        code: 'GIT_REVISION',
        message: `expected a revision that git knows here, found '${revision}'`,
        hint: 'name a branch, tag or commit of this repository; in CI, fetch enough history (for instance fetch-depth: 0)',
      },
    ]);
  }
}
