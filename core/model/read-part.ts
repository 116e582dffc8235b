import type { PartDocument } from '../document/index.ts';
import { nearestName } from '../nearest-name.ts';
import { DENSITY, MASS } from '../units/index.ts';
import type { FileReader } from './file-reader.ts';
import type { FileModel, PartModel, Quantity, ShapeModel } from './model.ts';
import { readBody } from './read-body.ts';
import { boundQuantity, parameterNamed } from './read-parameters.ts';
import { readPlacing } from './read-placing.ts';
import { readSolid } from './read-shape.ts';
import { type Where, within } from './where.ts';

/** What parts of one file refer to. */
export interface PartContext {
  readonly reader: FileReader;
  readonly products: 'negative' | 'positive' | null;
  readonly materials: ReadonlyMap<string, Quantity>;
  readonly states: readonly string[];
  /** Reads the named file; throws InputError. */
  include(named: string, where: Where): FileModel;
}

export function readPart(part: PartDocument, context: PartContext, where: Where): PartModel {
  const { reader } = context;
  const quantity = (key: 'mass' | 'density', unit: typeof MASS) =>
    part[key] === undefined ? null : reader.quantity(part[key]!, reader.unitOf(unit), within(where, key));
  const shape = readShape(part, context, where);
  const density = part.material === undefined ? quantity('density', DENSITY) : material(part, context, where);
  const mass = quantity('mass', MASS);
  checkMassSource(part, shape, reader, where);
  return {
    name: part.name,
    where,
    line: reader.places.lineOf(part),
    shape,
    mass,
    density,
    cut: part.cut === 'true',
    maturity: part.maturity ?? null,
    category: part.category ?? null,
    basis: part.basis ?? null,
    states: part.states ? knownStates(part.states, context, within(where, 'states')) : null,
    placing: readPlacing(part, reader, where),
    override: part.override
      ? {
          mass: reader.quantity(
            part.override.mass,
            reader.unitOf(MASS),
            within(within(where, 'override'), 'mass'),
          ),
          reason: part.override.reason,
          where: within(where, 'override'),
          line: reader.places.lineOf(part.override),
        }
      : null,
    parts: (part.parts ?? []).map((child, i) => readPart(child, context, within(within(where, 'parts'), i))),
    note: part.note ?? null,
    source: part.source ?? null,
  };
}

function readShape(part: PartDocument, context: PartContext, where: Where): ShapeModel {
  const { reader } = context;
  if (part.solid !== undefined) return readSolid(part.solid, reader, where);
  if (part.body !== undefined) {
    const at = within(where, 'body');
    return { kind: 'body', body: readBody(part.body, context.products, reader, at), where: at };
  }
  if (part.include !== undefined) return readInclude(part, context, where);
  return { kind: 'group' };
}

function readInclude(part: PartDocument, context: PartContext, where: Where): ShapeModel {
  const { reader } = context;
  const file = context.include(part.include!, within(where, 'include'));
  const values = new Map<number, Quantity>();
  for (const [name, text] of Object.entries(part.with ?? {})) {
    const at = within(within(where, 'with'), name);
    const symbol = parameterNamed(file.slots, name);
    if (symbol) {
      const like = file.parameters[symbol.slot]!.value;
      values.set(symbol.slot, boundQuantity(reader, text, like, at));
    } else
      unknownName(reader, at, 'parameter', name, file.slots.keys(), {
        whose: ` of ${file.path}`,
        isKey: true,
      });
  }
  const state = part.state === undefined ? null : readIncludeState(part.state, file, context, where);
  return { kind: 'include', file, with: values, state, where: within(where, 'include') };
}

function readIncludeState(
  given: string | Readonly<Record<string, string>>,
  file: FileModel,
  context: PartContext,
  where: Where,
): string | ReadonlyMap<string, string> {
  const at = within(where, 'state');
  const theirs = file.states.map((s) => s.name);
  const check = (name: string, place: Where) => {
    if (!theirs.includes(name))
      unknownName(context.reader, place, 'state', name, theirs, { whose: ` of ${file.path}` });
    return name;
  };
  if (typeof given === 'string') return check(given, at);
  const map = new Map<string, string>();
  for (const [ours, theirState] of Object.entries(given)) {
    knownStates([ours], context, at, true);
    map.set(ours, check(theirState, within(at, ours)));
  }
  return map;
}

function knownStates(
  names: readonly string[],
  context: PartContext,
  where: Where,
  keyed = false,
): readonly string[] {
  names.forEach((name, i) => {
    if (!context.states.includes(name))
      unknownName(context.reader, within(where, keyed ? name : i), 'state', name, context.states, {
        isKey: keyed,
      });
  });
  return names;
}

/** A name that refers to nothing: the fault that names the nearest known one. */
export function unknownName(
  reader: FileReader,
  where: Where,
  kind: 'state' | 'material' | 'parameter' | 'frame' | 'part' | 'maturity' | 'quantity',
  name: string,
  known: Iterable<string>,
  { whose = '', isKey = false }: { whose?: string; isKey?: boolean } = {},
): void {
  const names = [...known];
  const nearest = nearestName(name, names);
  const report = isKey ? reader.keyFault : reader.fault;
  report.call(reader, where, {
    code: `MODEL_UNKNOWN_${kind.toUpperCase()}`,
    message: `expected a ${kind}${whose}, found '${name}', which is not one`,
    hint: nearest
      ? `did you mean '${nearest}'?`
      : names.length === 0
        ? `there is none: declare it first`
        : `known: ${names.slice(0, 12).join(', ')}${names.length > 12 ? ' …' : ''}`,
  });
}

function material(part: PartDocument, context: PartContext, where: Where): Quantity | null {
  const known = context.materials.get(part.material!);
  if (!known)
    unknownName(
      context.reader,
      within(where, 'material'),
      'material',
      part.material!,
      context.materials.keys(),
    );
  return known ?? null;
}

/** A solid needs one source of mass; what else may lend it (a cut's host) is judged when the tree is known. */
function checkMassSource(part: PartDocument, shape: ShapeModel, reader: FileReader, where: Where): void {
  const hasDensity = part.density !== undefined || part.material !== undefined;
  if (part.mass !== undefined && hasDensity)
    reader.fault(within(where, 'mass'), {
      code: 'MODEL_MASS_TWICE',
      message: 'expected `mass` or a density (`material`, `density`), found both',
      hint: 'keep one; to scale what the density gives to a weighed mass, use `override: { mass, reason }`',
    });
  if (shape.kind === 'group' || shape.kind === 'body' || shape.kind === 'include') {
    const key = part.mass !== undefined ? 'mass' : part.material !== undefined ? 'material' : null;
    if (key)
      reader.fault(within(where, key), {
        code: 'MODEL_MASS_MISPLACED',
        message: `expected no \`${key}\` on a part without a solid of its own, found one`,
        hint: 'give the mass to the parts inside; to scale a whole group, use `override: { mass, reason }`',
      });
    return;
  }
  const thin = shape.kind === 'mesh' ? shape.fill === 'shell' : shape.solid.family === 'thin';
  const line = shape.kind === 'solid' && shape.solid.family === 'line';
  const name = shape.kind === 'mesh' ? 'mesh' : shape.solid.name;
  if (part.mass !== undefined || part.cut === 'true') return;
  if (line)
    reader.fault(where, {
      code: 'MODEL_MASS_MISSING',
      message: `expected \`mass\` on a ${name}, which has no volume, found none`,
      hint: 'add, for instance, `mass: 10 g`',
    });
  else if (!hasDensity)
    reader.fault(where, {
      code: 'MODEL_MASS_MISSING',
      message: 'expected `mass`, `material` or `density` on a solid, found none',
      hint: 'add one; a density with its unit is, for instance, `density: 2700 kg/m^3`',
    });
  else if (thin && !shape.thickness)
    reader.fault(shape.where, {
      code: 'MODEL_MASS_MISSING',
      message: `expected \`thickness\` on a thin ${name} whose mass comes from a density, found none`,
      hint: 'add `thickness`, or give `mass` in place of the density',
    });
}
