import { type Ast, childrenOf } from './ast.ts';
import type { Span } from './expression-error.ts';

export interface NameUse extends Span {
  readonly name: string;
}

/** Every use of a parameter or quantity in an expression, in the order of the text; `pi` is none. */
export function namesIn(ast: Ast): NameUse[] {
  const uses: NameUse[] = [];
  const visit = (node: Ast): void => {
    if (node.kind === 'name' && node.name !== 'pi')
      uses.push({ name: node.name, start: node.start, end: node.end });
    for (const child of childrenOf(node)) visit(child);
  };
  visit(ast);
  return uses;
}
