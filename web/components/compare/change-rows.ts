import type { Difference, QuantityChange } from '#core/difference/index.ts';
import {
  type DisplayUnit,
  type DisplayUnits,
  decimalsFor,
  formatFixed,
  formatPercent,
  NO_FIGURE,
  PLAIN_ROOM,
  readFigure,
  scaleFor,
  TENSOR_ROOM,
} from '#core/figures/index.ts';

/** One line of A, B and the change, as printed: B is A and the change together. */
export interface ChangeRow {
  readonly name: string;
  readonly unit: string;
  readonly a: string;
  readonly b: string;
  readonly change: string;
  readonly ofA: string;
}

export function unitOfQuantity({ unit }: Pick<QuantityChange, 'unit'>, units: DisplayUnits): DisplayUnit {
  if (unit === 'kg') return units.mass;
  if (unit === 'm') return units.length;
  return unit === 'rad' ? units.angle : units.inertia;
}

/** One more than elsewhere: a change is small beside what changes. */
const DIGITS_COMPARED = 6;

type Moved = Pick<QuantityChange, 'name' | 'unit' | 'a' | 'b' | 'ofA'>;

/** Quantities of one kind share scale and decimals, so that rounding noise prints as zero. */
export function changeRows(quantities: readonly Moved[], units: DisplayUnits): ChangeRow[] {
  return quantities.map((q) => {
    const kind = quantities.filter((other) => kindOf(other) === kindOf(q));
    const values = kind.flatMap((k) => [k.a ?? 0, k.b ?? 0]);
    const scale = scaleFor(unitOfQuantity(q, units), values, q.unit === 'kg*m^2' ? TENSOR_ROOM : PLAIN_ROOM);
    const decimals = decimalsFor(
      values.map((x) => x / scale.factor),
      DIGITS_COMPARED,
    );
    const print = (x: number | null) => formatFixed(x === null ? null : x / scale.factor, decimals);
    const [a, b] = [print(q.a), print(q.b)];
    return {
      name: q.name,
      unit: scale.head,
      a,
      b,
      change: printedChange(a, b, decimals),
      ofA: ofAText(q.ofA),
    };
  });
}

const kindOf = ({ name }: Moved): string => name.split('.')[0]!;

/** From the printed figures, so that a reader who subtracts finds the same. */
function printedChange(a: string, b: string, decimals: number): string {
  if (a === NO_FIGURE || b === NO_FIGURE) return NO_FIGURE;
  return signed(formatFixed(readFigure(b) - readFigure(a), decimals));
}

/** `+` before what grew; nothing before a printed zero. */
export const signed = (figure: string): string =>
  figure === NO_FIGURE || figure.startsWith('−') || readFigure(figure) === 0 ? figure : `+${figure}`;

function ofAText(share: number | null): string {
  if (share === null || share === 0) return '';
  const text = formatPercent(share);
  return `${share > 0 && !text.startsWith('under') ? '+' : ''}${text} %`;
}

/** The rows of the table: mass, centre, tensor about each side's own centre. */
export const totalsRows = (d: Difference, units: DisplayUnits): ChangeRow[] =>
  changeRows(
    d.quantities.filter((q) => /^(mass|centre|inertia)\b/.test(q.name)),
    units,
  );
