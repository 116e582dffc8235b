import type { FileUnits } from '../units/file-units.ts';
import type { Ast } from './ast.ts';
import type { CheckedNode } from './checked.ts';
import type { Lookup } from './lookup.ts';

/** What the rules of the dimension check need to know. */
export interface CheckContext {
  readonly lookup: Lookup;
  /** The file's units, for hints. */
  readonly units: FileUnits;
  /** Checks a part of the expression. */
  check(ast: Ast): CheckedNode;
}
