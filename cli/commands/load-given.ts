import { existsSync } from 'node:fs';
import { InputError } from '#core/errors.ts';
import { fromRows, type Symmetric3 } from '#core/linalg/symmetric3.ts';
import type { Vector3 } from '#core/linalg/vector3.ts';
import { openProject } from '#core/model/open-project.ts';
import type { ProjectSource } from '#core/model/source.ts';
import type { RollUpRecord } from '#core/record/record.ts';
import { type GivenTensor, givenTensor } from '#core/rollup/given-tensor.ts';
import { setValues } from '#core/rollup/set-values.ts';
import { sha256 } from '../project/disk-source.ts';
import type { Context } from './context.ts';
import { readRecordFile } from './load-side.ts';
import { openFile, type RollUpRequest, rollUpFile } from './roll-up-file.ts';

/** A tensor to be explained, and the words it was named by. */
export interface NamedTensor {
  readonly name: string;
  readonly given: GivenTensor;
}

/**
 * A tensor from the command line: `{ mass: …, centre: …, inertia: { … } }` written out, a record (`run.json`), an
 * assembly (`heron.yaml`), or one part of either (`heron.yaml#receiver`).
 */
export async function loadGiven(
  text: string,
  request: RollUpRequest,
  context: Context,
): Promise<NamedTensor> {
  if (text.trimStart().startsWith('{'))
    return { name: 'the tensor given', given: await fromText(text, context) };
  const at = text.lastIndexOf('#');
  const file = at > 0 && !existsSync(text) ? text.slice(0, at) : text;
  const path = file === text ? null : text.slice(at + 1);
  if (/\.(json|ndjson|jsonl)$/i.test(file) && existsSync(file))
    return { name: text, given: fromRecord(oneState(readRecordFile(file), request, file), path, text) };
  if (path !== null && existsSync(file)) {
    const body = await fromBody(file, path, request, context);
    if (body) return { name: text, given: body };
  }
  const { records } = await rollUpFile(file, request, context);
  return { name: text, given: fromRecord(oneState(records, request, file), path, text) };
}

/** The body written out is read by the format's own reader, as the one part of an assembly in SI units. */
async function fromText(text: string, context: Context): Promise<GivenTensor> {
  const file = 'the tensor given';
  const yaml = `assembly: given\nproducts: negative\nparts:\n  - name: it\n    body: ${text.replace(/\r?\n/g, ' ')}\n`;
  const source: ProjectSource = {
    resolve: (_, named) => named,
    readText: () => ({ text: yaml, sha256: sha256(yaml) }),
    readBytes: () => ({ bytes: new Uint8Array(), sha256: '' }),
  };
  context.source = source;
  return { ...givenTensor(await openProject(file, source), 'it', 'nominal')!, axes: 'unknown' };
}

/** A `body` of an assembly file, as its file writes it. */
async function fromBody(
  file: string,
  path: string,
  request: RollUpRequest,
  context: Context,
): Promise<GivenTensor | null> {
  const { source, path: inProject } = openFile(file, context);
  const project = await openProject(inProject, source);
  if (request.states.length > 1) throw new InputError([notOneState(request.states, file)]);
  const state = request.states[0] ?? project.root.states[0]!.name;
  return givenTensor(project, path, state, setValues(project.root, request.set));
}

function oneState(records: readonly RollUpRecord[], { states }: RollUpRequest, file: string): RollUpRecord {
  const chosen = states.length > 0 ? records.filter((r) => states.includes(r.state)) : records;
  if (chosen.length === 1) return chosen[0]!;
  throw new InputError([
    notOneState(
      chosen.map((r) => r.state),
      file,
      records.map((r) => r.state),
    ),
  ]);
}

const notOneState = (found: readonly string[], file: string, known: readonly string[] = []) => ({
  code: 'CALL_STATE',
  message: `expected one state of ${file}, found ${found.join(', ') || 'none'}`,
  hint: `choose one with --state${known.length > 0 ? `; known: ${known.join(', ')}` : ''}`,
});

const EXACT: Symmetric3 = [0, 0, 0, 0, 0, 0];

/** The whole of a record, basic masses, or one of its parts, in body axes; about the centre, products negative. */
function fromRecord(record: RollUpRecord, path: string | null, name: string): GivenTensor {
  const body = path === null ? record.basic : record.parts.find((p) => p.path === path)?.basic;
  const rows = body && (Array.isArray(body.inertia) ? body.inertia : body.inertia?.aboutCentre);
  if (!body || !rows)
    throw new InputError([
      {
        code: 'CALL_TENSOR',
        message: `expected a part of the record with a tensor, found none at ${name}`,
        hint: `parts: ${record.parts
          .slice(0, 8)
          .map((p) => p.path)
          .join(', ')} …; a group's numbers come from \`run --of\``,
      },
    ]);
  return {
    mass: body.mass,
    centre: body.centre as unknown as Vector3,
    inertia: fromRows(rows),
    about: 'centre',
    products: 'negative',
    axes: 'assembly',
    halfUnits: EXACT,
  };
}
