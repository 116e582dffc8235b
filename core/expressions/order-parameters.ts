import type { Ast } from './ast.ts';
import { ExpressionError } from './expression-error.ts';
import { type NameUse, namesIn } from './names-in.ts';

export interface NamedExpression {
  readonly name: string;
  /** Null for a value that reads nothing, a plain number say. */
  readonly ast: Ast | null;
}

/** Parameters that need one another in a circle; its offsets are in the text of the parameter named `parameter`. */
export class ParameterCircle extends ExpressionError {
  /** The names around the circle, the first one again at the end. */
  readonly path: readonly string[];
  readonly parameter: string;

  constructor(path: readonly string[], use: NameUse) {
    const message =
      path.length === 2
        ? `the parameter ${path[0]} uses itself`
        : `parameters use one another in a circle: ${path.join(' → ')}`;
    super('PARAMETER_CIRCLE', message, use, 'give one of them a value of its own');
    this.path = path;
    this.parameter = path[0]!;
  }
}

interface Visit {
  readonly name: string;
  readonly uses: readonly NameUse[];
  next: number;
}

/**
 * An order in which every parameter comes after those it uses; otherwise as listed. Names that are not in the list are
 * passed over.
 *
 * @throws ParameterCircle PARAMETER_CIRCLE
 */
export function orderParameters(parameters: readonly NamedExpression[]): string[] {
  const byName = new Map(parameters.map((p) => [p.name, p.ast]));
  const order: string[] = [];
  const done = new Set<string>();
  for (const { name } of parameters) {
    // The path from the listed parameter to the one in hand; a loop, not recursion, so that long chains are no danger.
    const path: Visit[] = [];
    const open = new Set<string>();
    const enter = (next: string): void => {
      const ast = byName.get(next);
      path.push({ name: next, uses: ast ? namesIn(ast).filter((use) => byName.has(use.name)) : [], next: 0 });
      open.add(next);
    };
    if (!done.has(name)) enter(name);
    for (let visit = path.at(-1); visit !== undefined; visit = path.at(-1)) {
      const use = visit.uses[visit.next++];
      if (use === undefined) {
        path.pop();
        open.delete(visit.name);
        done.add(visit.name);
        order.push(visit.name);
      } else if (open.has(use.name)) throw circle(path, use);
      else if (!done.has(use.name)) enter(use.name);
    }
  }
  return order;
}

function circle(path: readonly Visit[], closing: NameUse): ParameterCircle {
  const loop = path.slice(path.findIndex((visit) => visit.name === closing.name));
  const first = loop[0]!;
  return new ParameterCircle([...loop.map((visit) => visit.name), closing.name], first.uses[first.next - 1]!);
}
