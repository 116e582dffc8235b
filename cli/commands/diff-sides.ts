import { difference, isAttributed } from '#core/difference/index.ts';
import type { Difference, QuantityChange } from '#core/difference/types.ts';
import { InputError } from '#core/errors.ts';
import { compileExpression, ExpressionError } from '#core/expressions/index.ts';
import { nearestName } from '#core/nearest-name.ts';
import type { RollUpRecord } from '#core/record/record.ts';
import { getUnit, PLAIN_UNIT, parseUnit, SI_UNITS, type Unit } from '#core/units/index.ts';
import { EXIT } from '../exit-status.ts';
import { writeWhole } from '../io.ts';
import { renderDifference } from '../output/difference-report.ts';
import { formatDifferenceMarkdown } from '../output/formats/difference-markdown.ts';
import { formatJson, formatNdjson } from '../output/formats/json.ts';
import type { Context } from './context.ts';
import { DIFF_FORMATS, type DiffOptions } from './diff.ts';
import { loadSide, type Side } from './load-side.ts';
import { checkUnits, formatOfFile, partsOf } from './options.ts';

interface Compared {
  readonly a: RollUpRecord;
  readonly b: RollUpRecord;
  readonly difference: Difference;
}

/** The work of `diff`: both sides' records paired by state, compared, printed, and judged by `--fail-over`. */
export async function diffSides(
  nameA: string,
  nameB: string,
  options: DiffOptions,
  context: Context,
): Promise<void> {
  const outputs = options.out.map((file) => ({ file, format: formatOfFile(file, options, DIFF_FORMATS) }));
  partsOf(options.parts);
  checkUnits(options.units);
  const request = { states: options.state, set: options.set };
  const a = await loadSide(nameA, request, context);
  const b = await loadSide(nameB, request, context);
  const compared = pairStates(a, b).map(([one, other]): Compared => {
    const on = options.on ?? (one.conventions.growth || other.conventions.growth ? 'predicted' : 'basic');
    return { a: one, b: other, difference: difference(one, other, on) };
  });
  checkQuantity(options.quantity, compared);
  const over = compared.flatMap((c) => changesOver(c, options.failOver));
  for (const { file, format } of outputs) writeWhole(file, render(format, compared, options, null));
  if (outputs.length === 0) {
    const format = options.format ?? (context.io.outIsTerminal ? 'table' : 'json');
    context.io.out(render(format, compared, options, context));
  }
  for (const line of over) context.io.err(`${line}\n`);
  if (over.length > 0) context.status = EXIT.broken;
}

/** States that both sides have; two sides of one state each are compared whatever their states are called. */
function pairStates(a: Side, b: Side): [RollUpRecord, RollUpRecord][] {
  if (a.records.length === 1 && b.records.length === 1) return [[a.records[0]!, b.records[0]!]];
  const pairs = a.records.flatMap((one): [RollUpRecord, RollUpRecord][] => {
    const other = b.records.find((r) => r.state === one.state);
    return other ? [[one, other]] : [];
  });
  if (pairs.length > 0) return pairs;
  throw new InputError([
    {
      code: 'CALL_SIDES',
      message: `expected a state that both sides have, found ${statesOf(a)} in ${a.name} and ${statesOf(b)} in ${b.name}`,
      hint: 'choose one state with --state, or compare records of one state each',
    },
  ]);
}

const statesOf = ({ records }: Side): string => records.map((r) => r.state).join(', ');

function render(
  format: string,
  compared: readonly Compared[],
  options: DiffOptions,
  context: Context | null,
): string {
  if (format === 'json') return formatJson(compared.map((c) => c.difference));
  if (format === 'ndjson') return formatNdjson(compared.map((c) => c.difference));
  const parts = partsOf(options.parts);
  const shown = {
    quantity: options.quantity,
    parts: parts === 'all' ? Number.POSITIVE_INFINITY : parts,
    ...(options.units === undefined ? {} : { units: options.units }),
  };
  if (format === 'markdown')
    return compared.map(({ difference: d, b }) => formatDifferenceMarkdown(d, b, shown)).join('\n');
  return compared
    .map(({ difference: d, b }) =>
      renderDifference(d, b, {
        width: Math.max(60, Math.min(context?.io.columns ?? 80, 100)),
        colour: context?.colour ?? false,
        unicode: context?.unicode ?? true,
        ...shown,
      }),
    )
    .join('\n');
}

/** A line for each change that is larger than `--fail-over` allows. */
function changesOver({ a, difference: d }: Compared, failOver: Readonly<Record<string, string>>): string[] {
  return Object.entries(failOver).flatMap(([name, text]) => {
    const quantity = d.quantities.find((q) => q.name === name);
    if (!quantity)
      throw new InputError([
        unknownQuantity(
          `--fail-over ${name}`,
          name,
          d.quantities.map((q) => q.name),
        ),
      ]);
    const unit =
      quantity.unit === 'rad'
        ? getUnit(a.conventions.fileUnits.angle)
        : parseUnit(unitName(quantity.unit, a));
    const amount = text.includes('%')
      ? shareOf(name, text, quantity) * Math.abs(quantity.a ?? 0)
      : amountOf(name, text, unit);
    const change = quantity.change;
    if (change !== null && Math.abs(change) <= amount) return [];
    const shown =
      change === null
        ? 'cannot be told: one side has no such value'
        : `${format(change / unit.factor)} ${unit.name}`;
    return [
      `over: ${name} of ${d.b.assembly}, ${d.b.state}: the change is ${shown}, more than ${format(amount / unit.factor)} ${unit.name}`,
    ];
  });
}

const format = (value: number): string => String(Number(value.toPrecision(6)));

const unitName = (si: string, { conventions: { fileUnits } }: RollUpRecord): string =>
  si === 'kg' ? fileUnits.mass : si === 'm' ? fileUnits.length : fileUnits.inertia;

/** An amount [SI], a bare number in the unit given. */
function amountOf(name: string, text: string, unit: Unit): number {
  try {
    const { constant } = compileExpression(text, unit, () => undefined, SI_UNITS);
    if (constant !== undefined && constant >= 0) return constant;
  } catch (error) {
    if (!(error instanceof ExpressionError)) throw error;
    throw new InputError([
      {
        code: error.code,
        message: `--fail-over ${name}=${text}: ${error.message}`,
        ...(error.hint ? { hint: error.hint } : {}),
      },
    ]);
  }
  throw new InputError([
    {
      code: 'CALL_QUANTITY',
      message: `--fail-over ${name}=${text}: expected an amount of zero or more`,
      hint: 'for instance mass=5g',
    },
  ]);
}

/** A percentage is of A's value, where a share of that means something: not of places, products, angles or nothing. */
function shareOf(name: string, text: string, { a, change, ofA }: QuantityChange): number {
  const share = /^[\d.]+(e[+-]?\d+)?\s*%$/i.test(text) ? amountOf(name, text, PLAIN_UNIT) : null;
  if (share !== null && (change === null || ofA !== null)) return share;
  const found =
    share === null
      ? 'more than a number and %'
      : `a percentage of ${a === 0 ? 'zero' : 'a place, a product or an angle, which depends on where the axes lie'}`;
  throw new InputError([
    {
      code: 'CALL_QUANTITY',
      message: `--fail-over ${name}=${text}: expected one percentage of a value of A, or an amount in units, found ${found}`,
      hint: 'for instance mass=2% or centre.x=1mm',
    },
  ]);
}

/** `--quantity` names a change that is attributed to parts, in one of the pairs at least. */
function checkQuantity(name: string, compared: readonly Compared[]): void {
  const known = new Set(
    compared.flatMap(({ difference: d }) => d.quantities.map((q) => q.name).filter(isAttributed)),
  );
  if (name === 'all' || known.has(name)) return;
  throw new InputError([unknownQuantity(`--quantity ${name}`, name, ['all', ...known])]);
}

function unknownQuantity(option: string, name: string, known: readonly string[]) {
  const nearest = nearestName(name, known);
  return {
    code: 'CALL_QUANTITY',
    message: `${option}: expected a quantity whose change is told, found '${name}'`,
    hint: `${nearest ? `did you mean '${nearest}'? ` : ''}known: ${known.join(', ')}`,
  };
}
