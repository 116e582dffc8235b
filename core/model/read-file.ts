import { readDocument, type AssemblyDocument } from '../document/index.ts';
import { FaultList } from '../errors.ts';
import { ANGLE, DENSITY, type Dimension, INERTIA, LENGTH, MASS, aDimension, type FileUnits, parseUnit, SI_UNITS, TextError, type Unit } from '../units/index.ts';
import { FileReader } from './file-reader.ts';
import type { FileModel, FrameModel, Quantity } from './model.ts';
import { readGrowth } from './read-growth.ts';
import { readLimits } from './read-limits.ts';
import { readParameters } from './read-parameters.ts';
import { readPart } from './read-part.ts';
import { readRotate } from './read-placing.ts';
import { checkOmitted, readStates } from './read-states.ts';
import { readSweeps } from './read-sweeps.ts';
import type { TextInput } from './source.ts';
import { within, type Where } from './where.ts';

/** Heaviest density that anything is made of; more is a slip of units. [kg/m³] */
const DENSITY_AT_MOST = 25_000;

/**
 * Text of one assembly file → its model: names resolved, dimensions checked, expressions compiled.
 *
 * @param include reads a file that this one names
 * @throws InputError with every fault of the file, up to FAULTS_AT_MOST
 */
export function readFile(
  path: string,
  input: TextInput,
  include: (named: string, where: Where, reader: FileReader) => FileModel,
): FileModel {
  const { document, places } = readDocument(input.text, path);
  const faults = new FaultList();
  const reader = new FileReader(path, places, faults, SI_UNITS);
  const withUnits = new FileReader(path, places, faults, readUnits(document, reader));
  faults.check();
  return readModel(document, path, input, withUnits, include);
}

function readModel(
  document: AssemblyDocument,
  path: string,
  input: TextInput,
  reader: FileReader,
  include: (named: string, where: Where, reader: FileReader) => FileModel,
): FileModel {
  const parameters = readParameters(document.parameters, reader);
  const materials = readMaterials(document, reader);
  const growth = readGrowth(document.growth, reader);
  const states = readStates(document.states, parameters, reader);
  const stateNames = states.map((s) => s.name);
  const frames = readFrames(document, reader);
  const context = {
    reader,
    products: document.products ?? null,
    materials,
    states: stateNames,
    include: (named: string, where: Where) => include(named, where, reader),
  };
  const parts = document.parts.map((part, i) => readPart(part, context, within(within(null, 'parts'), i)));
  reader.faults.check();
  checkOmitted(states, parts, reader);
  const limits = readLimits(document.limits, reader, {
    parameters: parameters.list,
    parts,
    states: stateNames,
    frames: frames.map((f) => f.name),
  });
  const sweeps = readSweeps(document.sweeps, parameters, stateNames, reader);
  reader.faults.check();
  return {
    path,
    text: input.text,
    sha256: input.sha256,
    assembly: document.assembly,
    places: reader.places,
    units: reader.units,
    frame: document.frame ?? null,
    parameters: parameters.list,
    slots: parameters.slots,
    frames,
    growth,
    states,
    parts,
    limits,
    sweeps,
  };
}

const UNIT_KINDS: readonly [keyof FileUnits, Dimension][] = [
  ['length', LENGTH],
  ['mass', MASS],
  ['angle', ANGLE],
  ['density', DENSITY],
  ['inertia', INERTIA],
];

function readUnits(document: AssemblyDocument, reader: FileReader): FileUnits {
  const units: { -readonly [K in keyof FileUnits]: FileUnits[K] } = { ...SI_UNITS };
  for (const [key, dimension] of UNIT_KINDS) {
    const text = (document.units as Record<string, string | undefined> | undefined)?.[key];
    if (text === undefined) continue;
    const unit = readUnit(text, dimension, reader, within(within(null, 'units'), key));
    if (unit) units[key] = unit;
  }
  return units;
}

function readUnit(text: string, dimension: Dimension, reader: FileReader, where: Where): Unit | null {
  try {
    const unit = parseUnit(text);
    if (unit.dimension === dimension) return unit;
    reader.fault(where, {
      code: 'UNITS_WRONG_KIND',
      message: `expected a unit of ${aDimension(dimension)}, found '${text}', which is one of ${aDimension(unit.dimension)}`,
      hint: 'such as mm, g, deg, g/cm^3, g*mm^2',
    });
  } catch (error) {
    if (!(error instanceof TextError)) throw error;
    reader.fault(where, { code: error.code, message: error.message, ...(error.hint ? { hint: error.hint } : {}) });
  }
  return null;
}

function readMaterials(document: AssemblyDocument, reader: FileReader): Map<string, Quantity> {
  const materials = new Map<string, Quantity>();
  for (const [name, material] of Object.entries(document.materials ?? {})) {
    const where = within(within(null, 'materials'), name);
    const given =
      typeof material.density === 'string' && (material.u !== undefined || material.tol !== undefined)
        ? { value: material.density, u: material.u, tol: material.tol }
        : material.density;
    const density =
      typeof given === 'string' || typeof material.density !== 'string'
        ? reader.quantity(given, reader.unitOf(DENSITY), within(where, 'density'))
        : {
            expression: reader.expression(material.density, reader.unitOf(DENSITY), within(where, 'density')),
            where: within(where, 'density'),
            uncertainty: reader.uncertainty(given, reader.unitOf(DENSITY), where),
          };
    materials.set(name, density);
  }
  return materials;
}

/** @returns the fault of a density that no material has, or null */
export function densityFault(density: number): { code: string; message: string; hint: string } | null {
  if (density > 0 && density <= DENSITY_AT_MOST) return null;
  if (density <= 0)
    return {
      code: 'DENSITY_NOT_POSITIVE',
      message: `expected a density above zero, found ${density} kg/m^3`,
      hint: 'a cut-out takes the density of its host; write `cut: true` rather than a negative density',
    };
  return {
    code: 'DENSITY_TOO_LARGE',
    message: `expected a density of at most 25 g/cm^3 (nothing is denser than 22.6), found ${Number((density / 1000).toPrecision(6))} g/cm^3`,
    hint: 'write its unit with it, for instance 2700 kg/m^3 or 2.7 g/cm^3; a bare number is in the base units of the file',
  };
}

function readFrames(document: AssemblyDocument, reader: FileReader): FrameModel[] {
  const length = reader.unitOf(LENGTH);
  return Object.entries(document.frames ?? {}).map(([name, frame]) => {
    const where = within(within(null, 'frames'), name);
    return {
      name,
      at: reader.vector3(frame.at ?? ['0', '0', '0'], length, within(where, 'at')),
      rotate: readRotate(frame.rotate, reader, within(where, 'rotate')),
      note: frame.note ?? null,
      where,
    };
  });
}
