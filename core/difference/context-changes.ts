import type { InputRecord, LimitResult, ParameterRecord, RollUpRecord } from '../record/record.ts';
import type { ConventionChange, InputChange, LimitChange, LimitSide, ValueChange } from './types.ts';

/** Keys of both in the order of A, then what only B has. */
const keysOf = <T>(a: ReadonlyMap<string, T>, b: ReadonlyMap<string, T>): string[] => [
  ...a.keys(),
  ...[...b.keys()].filter((key) => !a.has(key)),
];

/** Parameters whose value or unit differs, SI. */
export function parameterChanges(
  a: Record<string, ParameterRecord>,
  b: Record<string, ParameterRecord>,
): ValueChange[] {
  const [before, after] = [new Map(Object.entries(a)), new Map(Object.entries(b))];
  return keysOf(before, after).flatMap((name) => {
    const p = before.get(name) ?? null;
    const q = after.get(name) ?? null;
    if (p && q && p.value === q.value && p.unit === q.unit) return [];
    const change = p && q && p.unit === q.unit ? q.value - p.value : null;
    return [{ name, a: p && { ...p }, b: q && { ...q }, change }];
  });
}

/** Files by path whose content differs, is new or is gone. */
export function inputChanges(a: readonly InputRecord[], b: readonly InputRecord[]): InputChange[] {
  const shas = (inputs: readonly InputRecord[]) => new Map(inputs.map((one) => [one.path, one.sha256]));
  const [before, after] = [shas(a), shas(b)];
  return keysOf(before, after).flatMap((path) => {
    const p = before.get(path) ?? null;
    const q = after.get(path) ?? null;
    if (p === q) return [];
    return [{ path, change: p === null ? 'added' : q === null ? 'removed' : 'changed', a: p, b: q } as const];
  });
}

/** Every limit of either side with its change; matched by id, else by name, quantity, part and frame. */
export function limitChanges(a: readonly LimitResult[], b: readonly LimitResult[]): LimitChange[] {
  const [before, after] = [byIdentity(a), byIdentity(b)];
  return keysOf(before, after).map((key) => {
    const p = before.get(key);
    const q = after.get(key);
    const limit = (q ?? p)!;
    const same = p && q && p.unit === q.unit;
    const change = (x: number | null, y: number | null) => (x === null || y === null ? null : y - x);
    return {
      name: limit.name,
      id: limit.id,
      quantity: limit.quantity,
      a: p ? sideOf(p) : null,
      b: q ? sideOf(q) : null,
      valueChange: same ? change(p.value, q.value) : null,
      marginChange: same ? change(p.margin, q.margin) : null,
      verdict: !p
        ? 'added'
        : !q
          ? 'removed'
          : p.verdict === q.verdict
            ? 'same'
            : q.verdict === 'outside'
              ? 'now outside'
              : 'now within',
    };
  });
}

function byIdentity(limits: readonly LimitResult[]): Map<string, LimitResult> {
  const out = new Map<string, LimitResult>();
  for (const limit of limits) {
    const identity =
      limit.id !== null ? [limit.id] : [limit.name, limit.quantity, limit.of ?? '', limit.frame ?? ''];
    let key = JSON.stringify(identity);
    while (out.has(key)) key += '+';
    out.set(key, limit);
  }
  return out;
}

const sideOf = (limit: LimitResult): LimitSide => ({
  on: limit.on,
  unit: limit.unit,
  shown: { ...limit.shown },
  value: limit.value,
  min: limit.min,
  max: limit.max,
  margin: limit.margin,
  verdict: limit.verdict,
  at: { ...limit.at },
});

/** What the two records do not say alike about themselves. */
export function conventionChanges(a: RollUpRecord, b: RollUpRecord): ConventionChange[] {
  const [before, after] = [saidBy(a), saidBy(b)];
  return before.flatMap(({ what, text, bearing, word }, i) => {
    const other = after[i]!.text;
    if (text === other) return [];
    const say = (side: string | null) => (side === null ? 'nothing' : `"${side}"`);
    return [
      { what, a: text, b: other, bearing, sentence: `${word}: A says ${say(text)}, B says ${say(other)}.` },
    ];
  });
}

interface Said {
  what: string;
  text: string | null;
  bearing: 'figures' | 'display';
  word: string;
}

function saidBy({ assembly, state, conventions: c }: RollUpRecord): Said[] {
  const figures = (what: string, text: string | null, word: string): Said => ({
    what,
    text,
    bearing: 'figures',
    word,
  });
  const units = (['length', 'mass', 'angle', 'density', 'inertia'] as const).map(
    (kind): Said => ({
      what: `fileUnits.${kind}`,
      text: c.fileUnits[kind],
      bearing: 'display',
      word: `Unit of bare figures of ${kind} in the file`,
    }),
  );
  return [
    figures('assembly', assembly, 'Assembly'),
    figures('state', state, 'State'),
    figures('frame.origin', c.frame?.origin ?? null, 'Origin of the body axes'),
    ...(['x', 'y', 'z'] as const).map((k) => figures(`frame.${k}`, c.frame?.[k] ?? null, `Body axis ${k}`)),
    figures('products', c.products, 'Sign of the products of inertia'),
    figures('units', c.units, 'Units of the record'),
    figures('coreVersion', c.coreVersion, 'Version of the core'),
    figures('growth', c.growth ? 'a growth table' : 'no growth table', 'Growth allowance'),
    ...units,
  ];
}
