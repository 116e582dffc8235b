import { createTwoFilesPatch } from 'diff';
import type { Sequelize } from 'sequelize';
import type { Comparison } from '#core/api/runs.ts';
import { difference } from '#core/difference/index.ts';
import { Input } from '../models/index.ts';
import { textOf } from './inputs.ts';
import type { WholeRun } from './run-detail.ts';
import { findRunRow } from './run-rows.ts';

const PATCH_AT_MOST = 400_000;

/** What moved from one run to another, and the unified difference of every text that changed. */
export async function compareRuns(
  sequelize: Sequelize,
  a: WholeRun,
  b: WholeRun,
  on: 'basic' | 'predicted' | undefined,
): Promise<Comparison> {
  const grows = a.record.conventions.growth || b.record.conventions.growth;
  const found = difference(a.record, b.record, on ?? (grows ? 'predicted' : 'basic'));
  const projectId = a.run.projectId;
  const [rowA, rowB, inputs] = await Promise.all([
    findRunRow(sequelize, projectId, a.run.id),
    findRunRow(sequelize, projectId, b.run.id),
    Input.findAll({
      where: { projectId, sha256: found.inputs.flatMap((i) => [i.a, i.b]).filter((h) => h !== null) },
    }),
  ]);
  const texts = new Map(
    await Promise.all(inputs.map(async (input) => [input.sha256, await textOf(input)] as const)),
  );
  const textUnder = (hash: string | null): string | null => (hash === null ? '' : (texts.get(hash) ?? null));
  return {
    a: rowA!,
    b: rowB!,
    difference: found,
    texts: found.inputs.flatMap(({ path, a: before, b: after }) => {
      const [old, now] = [textUnder(before), textUnder(after)];
      if (old === null || now === null) return [];
      const patch = createTwoFilesPatch(path, path, old, now, '', '', { context: 3, timeout: 300 });
      return patch === undefined || patch.length > PATCH_AT_MOST ? [] : [{ path, patch }];
    }),
  };
}
