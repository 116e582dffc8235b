import { type Fault, FaultList } from '../errors.ts';
import type { Places } from '../yaml/places.ts';
import { readYaml } from '../yaml/read-yaml.ts';
import type { PathStep, YamlMapping } from '../yaml/value.ts';
import { assemblyShape } from './assembly-shape.ts';
import { IssueFaults } from './issue-faults.ts';
import { judgeDocument } from './judge-document.ts';
import { prototypeKeyFaults } from './prototype-key.ts';
import { quickCheck } from './quick-check.ts';
import { type AssemblyDocument, assembly } from './schema.ts';
import { findTorn, type TornExpression, tornFault } from './unquoted-commas.ts';

/** An assembly file that has the right shape, every scalar still text, and where everything in it stands. */
export interface DocumentRead {
  document: AssemblyDocument;
  places: Places;
}

/** Issues beyond this many are not looked at; a reading reports far fewer. */
const ISSUES_AT_MOST = 200;

/**
 * Reads an assembly file and judges its shape. What its expressions say, and whether names it uses exist, is
 * judged later.
 *
 * @param text the file's text
 * @param file its name in faults, relative to the project folder
 * @returns the document: the very objects whose lines `places` knows
 * @throws InputError with every fault found, in the order of the text: those of `readYaml`, or MODEL_UNKNOWN_KEY,
 * MODEL_MISSING_KEY, MODEL_WRONG_SHAPE, MODEL_UNKNOWN_CHOICE, MODEL_KEYS_CLASH, MODEL_DUPLICATE_NAME,
 * MODEL_BAD_NAME, MODEL_BAD_DATE, MODEL_MASS_MISPLACED, YAML_UNQUOTED_COMMA
 */
export function readDocument(text: string, file: string): DocumentRead {
  const { root, places } = readYaml(text, file);
  const faults = faultsOf(root, places, text);
  if (faults.length > 0) {
    const list = new FaultList();
    for (const fault of inTextOrder(faults)) list.add(fault);
    list.check();
  }
  return { document: root as unknown as AssemblyDocument, places };
}

let isAssembly: ((value: unknown) => boolean) | undefined;

function faultsOf(root: YamlMapping, places: Places, text: string): Fault[] {
  isAssembly ??= quickCheck(assemblyShape);
  const faults: Fault[] = [];
  const strange = text.includes('__proto__') || text.includes('\\') ? prototypeKeyFaults(root, places) : [];
  const torn = text.includes('(') ? findTorn(root) : [];
  const reader = isAssembly(root) ? undefined : new IssueFaults(assembly, root, places);
  if (reader !== undefined) faults.push(...schemaFaults(root, reader, torn));
  judgeDocument({ places, faults, meant: reader?.meant }, root);
  faults.push(...strange, ...torn.slice(0, ISSUES_AT_MOST).map((one) => tornFault(one, places)));
  return faults;
}

function schemaFaults(root: YamlMapping, reader: IssueFaults, torn: readonly TornExpression[]): Fault[] {
  const issues = (assembly.safeParse(root).error?.issues ?? [])
    .slice(0, ISSUES_AT_MOST)
    .map((issue) => withoutTorn(issue, torn))
    .filter((issue) => issue !== undefined);
  const unknown = issues.filter((issue) => issue.code === 'unrecognized_keys');
  const others = issues.filter((issue) => issue.code !== 'unrecognized_keys');
  const faults = unknown.flatMap((issue) => reader.faultsOf(issue));
  return faults.concat(
    others.filter((issue) => !reader.isExplained(issue)).flatMap((issue) => reader.faultsOf(issue)),
  );
}

type Issue = Parameters<IssueFaults['faultsOf']>[0];

/** An issue without what a torn expression explains: a list too long, keys that are pieces. */
function withoutTorn(issue: Issue, torn: readonly TornExpression[]): Issue | undefined {
  for (const { owner, pieces } of torn) {
    if (!isSamePath(owner, issue.path as PathStep[])) continue;
    if (issue.code !== 'unrecognized_keys') return undefined;
    const keys = issue.keys.filter((key) => !pieces.includes(key));
    return keys.length === 0 ? undefined : { ...issue, keys };
  }
  return issue;
}

function isSamePath(a: readonly PathStep[], b: readonly PathStep[]): boolean {
  return a.length === b.length && a.every((step, i) => step === b[i]);
}

/** Faults by line and column; a value's shape is blamed once, and nothing is said twice. */
function inTextOrder(faults: readonly Fault[]): Fault[] {
  const seen = new Set<string>();
  return [...faults].sort(byPlace).filter((fault) => {
    const words = fault.code === 'MODEL_WRONG_SHAPE' ? '' : fault.message;
    const key = `${fault.code} ${fault.at?.line}:${fault.at?.column} ${words}`;
    return !seen.has(key) && seen.add(key);
  });
}

function byPlace(a: Fault, b: Fault): number {
  return (a.at?.line ?? 0) - (b.at?.line ?? 0) || (a.at?.column ?? 0) - (b.at?.column ?? 0);
}
