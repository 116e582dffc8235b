import { type Body, inertiaAboutCentre, inertiaAboutPoint } from '../inertia/body.ts';
import type { Placement } from '../inertia/placement.ts';
import { principalAxes } from '../inertia/principal-axes.ts';
import { bodyInFrame } from '../inertia/quantities.ts';
import { transpose } from '../linalg/matrix3.ts';
import { quaternionFromAxes } from '../linalg/quaternion.ts';
import { type Symmetric3, toRows } from '../linalg/symmetric3.ts';
import type { MeshReport } from '../mesh/mesh-body.ts';
import type { FileModel } from '../model/model.ts';
import { leafBody } from '../rollup/leaf-body.ts';
import { frameNamed, type JudgedLimit, judgeLimits } from '../rollup/limits.ts';
import type { RollUp } from '../rollup/roll-up.ts';
import type { Leaf, Member } from '../rollup/tree.ts';
import { baseUnitText, DENSITY, INERTIA, unitFor } from '../units/index.ts';
import { CORE_VERSION } from '../version.ts';
import { groupTotals } from './group-totals.ts';
import type {
  BodyRecord,
  Conventions,
  FrameTotals,
  InputRecord,
  LimitResult,
  MeshRecord,
  OverrideRecord,
  ParameterRecord,
  PartBody,
  PartRecord,
  Provenance,
  RollUpRecord,
  Rows3,
  Totals,
} from './record.ts';
import { type HashText, stampOf } from './stamp.ts';

/**
 * The record of a roll-up: everything a face shows and anyone needs to compute it again.
 *
 * @param hash SHA-256 of a text, lower-case hex
 */
export function buildRecord(roll: RollUp, provenance: Provenance, hash: HashText): RollUpRecord {
  const { root } = roll.project;
  const inputs = inputsOf(roll);
  const parameters = parametersOf(roll);
  const leafBodies = roll.leaves.map((leaf) => {
    const basic = leafBody(leaf, 'basic');
    return { leaf, basic, predicted: grows(leaf) ? leafBody(leaf, 'predicted') : basic };
  });
  return withoutNegativeZero({
    schema: 'steelyard-record/1',
    stamp: stampOf(inputs, root.path, roll.state, parameters, CORE_VERSION, hash),
    assembly: root.assembly,
    state: roll.state,
    conventions: conventionsOf(root),
    basic: totalsOf(roll.total.basic),
    predicted: totalsOf(roll.total.predicted),
    frames: framesOf(roll),
    byCategory: groupTotals(leafBodies, (leaf) => leaf.node.category, roll.total),
    byBasis: groupTotals(leafBodies, (leaf) => leaf.node.basis, roll.total),
    uncertainty: null,
    limits: judgeLimits(roll).map((judged) => limitResult(judged, root)),
    parts: leafBodies.map((b) => partRecord(b, roll.total.predicted)),
    overrides: overridesOf(roll.members, ''),
    warnings: roll.warnings.map((w) => ({ code: w.code, message: w.message, at: w.at ?? null })),
    parameters,
    inputs,
    provenance,
  });
}

const grows = ({ node, factor }: Leaf): boolean => node.growth !== 0 || factor.basic !== factor.predicted;

function conventionsOf(file: FileModel): Conventions {
  const { units } = file;
  return {
    frame: file.frame,
    products: 'negative',
    units: 'SI',
    coreVersion: CORE_VERSION,
    fileUnits: {
      length: units.length.name,
      mass: units.mass.name,
      angle: units.angle.name,
      density: unitFor(DENSITY, units).name,
      inertia: unitFor(INERTIA, units).name,
    },
    growth: file.growth !== null,
  };
}

const rows = (j: Symmetric3): Rows3 => toRows(j);

/** Mass, centre and tensors of a body in the axes it is given in. */
export const bodyRecord = (body: Body): BodyRecord => ({
  mass: body.mass,
  centre: [...body.centre],
  inertia: {
    aboutCentre: rows(inertiaAboutCentre(body)),
    aboutOrigin: rows(inertiaAboutPoint(body, [0, 0, 0])),
  },
});

/** All that a record says of a body, principal axes and gyration included. */
export function totalsOf(body: Body): Totals {
  const central = inertiaAboutCentre(body);
  const principal = principalAxes(body);
  return {
    ...bodyRecord(body),
    principal: {
      moments: [...principal.moments],
      axes: principal.axes.map((a) => [...a]) as Rows3,
      nearest: [...principal.nearest],
      free: [...principal.free],
      tilt: [...principal.tilt],
      quaternion: [...quaternionFromAxes(principal.axes)],
    },
    gyration: [0, 1, 2].map((k) => Math.sqrt(Math.max(0, central[k]!) / body.mass)),
  };
}

function framesOf(roll: RollUp): Record<string, FrameTotals> {
  const frames: Record<string, FrameTotals> = {};
  for (const { name, note } of roll.scope.file.frames) {
    const frame: Placement = frameNamed(name, roll.scope)!;
    frames[name] = {
      note,
      at: [...frame.offset],
      axes: transpose(frame.turn).map((a) => [...a]) as Rows3,
      basic: bodyRecord(bodyInFrame(frame, roll.total.basic)),
      predicted: bodyRecord(bodyInFrame(frame, roll.total.predicted)),
    };
  }
  return frames;
}

function partRecord(
  { leaf, basic, predicted }: { leaf: Leaf; basic: Body; predicted: Body },
  total: Body,
): PartRecord {
  const { node } = leaf;
  const { part, scope } = node;
  const about = inertiaAboutPoint(predicted, total.centre);
  const whole = inertiaAboutCentre(total);
  const basicRecord = partBody(basic, leaf.sign);
  const share = (k: 0 | 1 | 2) => (whole[k] === 0 ? 0 : (leaf.sign * about[k]) / whole[k]);
  return {
    path: leaf.path,
    at: { file: scope.file.path, line: part.line },
    kind: part.shape.kind === 'solid' ? part.shape.solid.name : part.shape.kind,
    cut: leaf.sign < 0,
    own: node.members.length > 0,
    maturity: node.maturity,
    category: node.category,
    basis: node.basis,
    growth: growthOfLeaf(leaf),
    basic: basicRecord,
    predicted: predicted === basic ? basicRecord : partBody(predicted, leaf.sign),
    share: { mass: (leaf.sign * predicted.mass) / total.mass, xx: share(0), yy: share(1), zz: share(2) },
    note: part.note,
    source: part.source,
    ...(node.own?.mesh && { mesh: meshRecord(node.own.mesh) }),
  };
}

const meshRecord = (report: MeshReport): MeshRecord => ({
  format: report.format,
  triangles: report.triangles,
  vertices: report.vertices,
  collapsed: report.dropped,
  shells: report.shells,
  voids: report.voids,
  openEdges: report.openEdges,
  volume: report.volume,
  area: report.area,
  size: [0, 1, 2].map((k) => report.extent.max[k]! - report.extent.min[k]!),
});

/** Predicted over basic less one, overrides around it included; from the factors, for a part may weigh nothing. */
const growthOfLeaf = ({ node, factor }: Leaf): number =>
  factor.predicted === factor.basic ? node.growth : ((1 + node.growth) * factor.predicted) / factor.basic - 1;

function partBody(body: Body, sign: 1 | -1): PartBody {
  const j = inertiaAboutCentre(body);
  return {
    mass: sign * body.mass,
    centre: [...body.centre],
    inertia: rows(sign === 1 ? j : (j.map((x) => -x) as unknown as Symmetric3)),
  };
}

function limitResult(judged: JudgedLimit, file: FileModel): LimitResult {
  const { limit } = judged;
  return {
    name: limit.name,
    id: limit.id,
    quantity: limit.text,
    of: limit.of,
    frame: limit.frame,
    on: judged.on,
    unit: limit.shown.si,
    shown: { unit: limit.shown.unit, factor: limit.shown.factor },
    value: judged.value,
    values: judged.values,
    min: judged.min,
    max: judged.max,
    nearest: judged.nearest,
    margin: judged.margin,
    marginOfLimit: judged.marginOfLimit,
    verdict: judged.verdict,
    waiver: limit.waiver,
    source: limit.source,
    owner: limit.owner,
    note: limit.note,
    at: { file: file.path, line: limit.line },
    heaviest: judged.heaviest.map(({ leaf, value }) => ({
      path: leaf.path,
      at: { file: leaf.node.scope.file.path, line: leaf.node.part.line },
      value,
    })),
  };
}

function overridesOf(members: readonly Member[], prefix: string): OverrideRecord[] {
  return members.flatMap((member) => {
    // Copies share one override: it is listed once, under the name of the set.
    const one = member.kind === 'copies' ? member.copies[0] : member;
    if (!one) return [];
    const path = prefix + member.name;
    const { part, overridden, scope } = one.node;
    const inside = overridesOf(one.node.members, `${path}/`);
    if (!overridden || !part.override) return inside;
    const at = { file: scope.file.path, line: part.override.line };
    return [{ path, reason: part.override.reason, at, ...overridden }, ...inside];
  });
}

/** Values of the top file's parameters by name, and of included files' by the path of the part that includes them. */
function parametersOf(roll: RollUp): Record<string, ParameterRecord> {
  const out: Record<string, ParameterRecord> = {};
  const put = (scope: RollUp['scope']) => {
    scope.file.parameters.forEach((p, slot) => {
      out[scope.prefix + p.name] = {
        value: scope.values[slot]!,
        unit: baseUnitText(p.value.expression.dimension) || '1',
      };
    });
  };
  put(roll.scope);
  const walk = (members: readonly Member[]) => {
    for (const member of members) {
      const one = member.kind === 'copies' ? member.copies[0] : member;
      if (!one) continue;
      const inner = one.node.members[0];
      const first = inner && (inner.kind === 'copies' ? inner.copies[0] : inner);
      if (one.node.part.shape.kind === 'include' && first) put(first.node.scope);
      walk(one.node.members);
    }
  };
  walk(roll.members);
  return out;
}

function inputsOf(roll: RollUp): InputRecord[] {
  const texts = [...roll.project.files.values()].map((file) => ({
    path: file.path,
    sha256: file.sha256,
    text: file.text,
  }));
  const meshes = [...roll.meshInputs].map(([path, { sha256, bytes }]) => ({ path, sha256, bytes }));
  const [top, ...included] = texts;
  const byPath = (a: InputRecord, b: InputRecord) => (a.path < b.path ? -1 : 1);
  return [top!, ...included.sort(byPath), ...meshes.sort(byPath)];
}

/** −0 prints as 0 in JSON but compares unequal in a typed store: a record holds none. */
function withoutNegativeZero<T>(value: T): T {
  if (typeof value === 'number') return (value + 0) as T;
  if (Array.isArray(value)) {
    for (let i = 0; i < value.length; i++) value[i] = withoutNegativeZero(value[i]);
  } else if (value !== null && typeof value === 'object') {
    for (const key of Object.keys(value)) {
      const record = value as Record<string, unknown>;
      record[key] = withoutNegativeZero(record[key]);
    }
  }
  return value;
}
