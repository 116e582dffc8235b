import type { Fault } from '../errors.ts';
import { readYaml } from '../yaml/read-yaml.ts';
import { assemblyShape } from './assembly-shape.ts';
import { judgeDocument } from './judge-document.ts';
import { prototypeKeyFaults } from './prototype-key.ts';
import { quickCheck } from './quick-check.ts';
import type { DocumentRead } from './read-document.ts';
import type { AssemblyDocument } from './schema.ts';
import { findTorn } from './unquoted-commas.ts';

/** The text is not a right assembly file; `readDocument` says why. */
export class WrongShape extends Error {}

let isAssembly: ((value: unknown) => boolean) | undefined;

/**
 * Reads an assembly file that is right, without the schema's library: the same answer as `readDocument`, which is for
 * files that may be wrong and says what is.
 *
 * @throws WrongShape where `readDocument` would report a fault of shape; InputError as `readYaml`
 */
export function readRightDocument(text: string, file: string): DocumentRead {
  const { root, places } = readYaml(text, file);
  isAssembly ??= quickCheck(assemblyShape);
  const strange = /__proto__|\\/.test(text) && prototypeKeyFaults(root, places).length > 0;
  const torn = text.includes('(') && findTorn(root).length > 0;
  if (!isAssembly(root) || strange || torn) throw new WrongShape();
  const faults: Fault[] = [];
  judgeDocument({ places, faults, meant: undefined }, root);
  if (faults.length > 0) throw new WrongShape();
  return { document: root as unknown as AssemblyDocument, places };
}
