import type { GrowthModel, PartModel, Quantity } from '../model/model.ts';
import { within } from '../model/where.ts';
import { nearestName } from '../nearest-name.ts';
import { evaluate, faultAt, type GrowthTables, type Scope } from './scope.ts';

export const growthTablesOf = (growth: GrowthModel, scope: Scope): GrowthTables =>
  new Map(
    [...growth.tables].map(([category, table]) => [
      category,
      new Map([...table].map(([maturity, q]) => [maturity, allowanceOf(q, scope)])),
    ]),
  );

function allowanceOf(quantity: Quantity, scope: Scope): number {
  const allowance = evaluate(quantity, scope);
  if (allowance >= 0) return allowance;
  faultAt(scope, quantity.where, {
    code: 'GROWTH_NEGATIVE',
    message: `expected a growth allowance of zero or more, found ${Number((100 * allowance).toPrecision(12))} %`,
    hint: 'write it as a percentage of the basic mass, for instance 15 %',
  });
  return 0;
}

/**
 * Growth allowance of a part by its maturity and category (predicted = basic × (1 + allowance); ANSI/AIAA S-120A,
 * ISO 22010). A category without a table, or whose table lacks the maturity, takes the plain table.
 *
 * @param counts whether a missing maturity is worth a warning: the part has mass of its own
 */
export function growthOf(
  part: PartModel,
  path: string,
  { maturity, category }: { maturity: string | null; category: string | null },
  counts: boolean,
  scope: Scope,
): number {
  const tables = scope.growth;
  if (!tables) return 0;
  if (maturity === null) {
    if (counts)
      scope.run.withoutMaturity.push({
        path: scope.prefix + path,
        at: { file: scope.file.path, line: part.line },
      });
    return 0;
  }
  const allowance = tables.get(category)?.get(maturity) ?? tables.get(null)?.get(maturity);
  if (allowance !== undefined) return allowance;
  const known = [...new Set([...tables.values()].flatMap((table) => [...table.keys()]))];
  const nearest = nearestName(maturity, known);
  faultAt(scope, part.maturity === null ? part.where : within(part.where, 'maturity'), {
    code: 'MODEL_UNKNOWN_MATURITY',
    message: `expected a maturity of the growth table${category === null ? '' : ` for category '${category}'`}, found '${maturity}'`,
    hint:
      nearest && nearest !== maturity
        ? `did you mean '${nearest}'?`
        : `known: ${known.join(', ')}; add a row to \`growth:\``,
  });
  return 0;
}
