import { existsSync } from 'node:fs';
import { join } from 'node:path';
import type { Provenance } from '#core/record/record.ts';
import { version } from '../version.ts';
import { ciState } from './ci.ts';
import { gitState } from './git.ts';

/**
 * Where a run comes from. Git and CI are found by themselves; STEELYARD_COMMIT, STEELYARD_BRANCH and STEELYARD_AUTHOR
 * say otherwise, for builds that run outside the repository.
 */
export async function provenanceOf(
  folder: string,
  env: NodeJS.ProcessEnv = process.env,
): Promise<Provenance> {
  const git = existsSync(join(folder, '.git')) ? await gitState(folder) : null;
  const ci = ciState(env);
  const given = {
    commit: env.STEELYARD_COMMIT || git?.commit || ci?.commit,
    branch: env.STEELYARD_BRANCH || git?.branch || ci?.branch,
    tag: git?.tag,
    remote: git?.remote,
    author: env.STEELYARD_AUTHOR || git?.author,
    dirty: git?.dirty,
    ci: ci?.ci,
  };
  const known = Object.fromEntries(Object.entries(given).filter(([, v]) => v !== undefined && v !== null));
  return { tool: `steelyard ${version}`, node: process.version, ...known, at: new Date().toISOString() };
}
