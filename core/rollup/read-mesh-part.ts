import { InputError } from '../errors.ts';
import type { Body } from '../inertia/body.ts';
import { type MeshReport, meshShell, meshSolid } from '../mesh/mesh-body.ts';
import { MeshError } from '../mesh/mesh-error.ts';
import { readMesh } from '../mesh/read-mesh.ts';
import type { ShapeModel } from '../model/model.ts';
import { within } from '../model/where.ts';
import { evaluate, faultAt, type Scope } from './scope.ts';

/** A mesh file as a part uses it: unit density (or unit mass per area), in metres. */
export interface MeshReading {
  readonly body: Body;
  readonly report: MeshReport;
  readonly notes: readonly { code: string; message: string }[];
}

/** Reads a part's mesh once for each way that parts use it; a fault comes back as null. */
export function readMeshPart(shape: ShapeModel & { kind: 'mesh' }, scope: Scope): MeshReading | null {
  const { run } = scope;
  const weld = shape.weld ? evaluate(shape.weld, scope) : 0;
  try {
    const path = run.source.resolve(scope.file.path, shape.file);
    const key = [path, shape.unit.name, shape.fill, weld].join('\n');
    const known = run.meshes.get(key);
    if (known) return known;
    const { bytes, sha256 } = run.source.readBytes(path);
    run.meshInputs.set(path, { sha256, bytes: bytes.length });
    const mesh = readMesh(bytes, { unit: shape.unit.factor, weld });
    const { body, report, notes } = shape.fill === 'shell' ? meshShell(mesh) : meshSolid(mesh);
    const reading = { body, report, notes };
    run.meshes.set(key, reading);
    return reading;
  } catch (error) {
    const where = within(shape.where, 'file');
    if (error instanceof MeshError)
      faultAt(scope, where, {
        code: error.code,
        message: `${shape.file}: ${error.message}`,
        ...(error.hint ? { hint: error.hint } : {}),
      });
    else if (error instanceof InputError)
      for (const { at: _, ...fault } of error.faults) faultAt(scope, where, fault);
    else throw error;
    return null;
  }
}
