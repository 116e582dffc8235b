import type { AssemblyDocument, DocumentRead } from '../document/index.ts';
import { FaultList } from '../errors.ts';
import {
  ANGLE,
  aDimension,
  DENSITY,
  type Dimension,
  type FileUnits,
  INERTIA,
  LENGTH,
  MASS,
  parseUnit,
  SI_UNITS,
  TextError,
  type Unit,
} from '../units/index.ts';
import { densityFault } from './density-fault.ts';
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
import { type Where, within } from './where.ts';

/** Text of a file → its document: `readDocument`, or `readRightDocument` for files that are right. */
export type ReadDocument = (text: string, file: string) => DocumentRead;

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
  readDocument: ReadDocument,
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
    frame: document.frame ? { ...NOT_STATED, ...document.frame } : null,
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

const NOT_STATED = { origin: 'not stated', x: 'not stated', y: 'not stated', z: 'not stated' };

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
    reader.fault(where, {
      code: error.code,
      message: error.message,
      ...(error.hint ? { hint: error.hint } : {}),
    });
  }
  return null;
}

function readMaterials(document: AssemblyDocument, reader: FileReader): Map<string, Quantity> {
  const materials = new Map<string, Quantity>();
  const unit = reader.unitOf(DENSITY);
  for (const [name, material] of Object.entries(document.materials ?? {})) {
    const where = within(within(null, 'materials'), name);
    const density = reader.quantity(material.density, unit, within(where, 'density'));
    // `u` and `tol` may stand beside the density as well as in it.
    const uncertainty = density.uncertainty ?? reader.uncertainty(material, unit, where);
    const { constant } = density.expression;
    const fault = constant === undefined ? null : densityFault(constant);
    if (fault) reader.fault(density.where, fault);
    materials.set(name, { ...density, uncertainty });
  }
  return materials;
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
