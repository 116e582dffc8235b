import type { BodyDocument } from '../document/index.ts';
import { INERTIA, LENGTH, MASS, unitFor } from '../units/index.ts';
import type { FileReader, QuantityDocument } from './file-reader.ts';
import { halfUnitOfLastDigit } from './half-unit.ts';
import type { BodyModel } from './model.ts';
import { type Where, within } from './where.ts';

const SIX = ['xx', 'yy', 'zz', 'xy', 'xz', 'yz'] as const;

/** Position of xx yy zz xy xz yz in a matrix, then of the elements that mirror the products. */
const IN_MATRIX = [
  [0, 0],
  [1, 1],
  [2, 2],
  [0, 1],
  [0, 2],
  [1, 2],
] as const;
const MIRRORED = [
  [1, 0],
  [2, 0],
  [2, 1],
] as const;

/** A bought item with the maker's data. `products` at the file's head counts where the body states none. */
export function readBody(
  body: BodyDocument,
  fileProducts: 'negative' | 'positive' | null,
  reader: FileReader,
  where: Where,
): BodyModel {
  const inertia = body.inertia;
  const at = within(where, 'inertia');
  const field = unitFor(INERTIA, reader.units);
  const matrix = 'matrix' in inertia ? inertia.matrix : undefined;
  const element = ([r, c]: readonly [number, number]) => ({
    given: matrix![r]![c]! as QuantityDocument,
    where: within(within(within(at, 'matrix'), r), c),
  });
  const given = matrix
    ? IN_MATRIX.map(element)
    : SIX.map((k) => ({ given: (inertia as Record<string, QuantityDocument>)[k]!, where: within(at, k) }));
  const six = given.map((g) => reader.quantity(g.given, field, g.where));
  const products = inertia.products ?? fileProducts;
  if (!products) {
    const named = SIX.findIndex((_, i) => i > 2 && six[i]!.expression.constant !== 0);
    if (named >= 0)
      reader.fault(at, {
        code: 'BODY_PRODUCTS_UNDECLARED',
        message: `expected \`products: negative\` or \`products: positive\` beside a product of inertia that is not zero (${SIX[named]}), found neither here nor at the head of the file`,
        hint: "negative if the figure is the tensor's own element (I_xy = −∫ x y dm), positive if the table prints +∫ x y dm; the data sheet must say which",
      });
  }
  const { about } = inertia;
  return {
    mass: reader.quantity(body.mass, unitFor(MASS, reader.units), within(where, 'mass')),
    centre: body.centre
      ? reader.vector3(body.centre, unitFor(LENGTH, reader.units), within(where, 'centre'))
      : null,
    inertia: {
      six,
      halfUnits: given.map((g, i) =>
        halfUnitOfLastDigit(
          typeof g.given === 'string' ? g.given : (g.given.value ?? ''),
          field,
          six[i]!.expression.constant ?? 0,
        ),
      ),
      mirrored: matrix
        ? MIRRORED.map((k) => {
            const e = element(k);
            return reader.quantity(e.given, field, e.where);
          })
        : null,
      about:
        typeof about === 'string'
          ? about
          : reader.vector3(about, unitFor(LENGTH, reader.units), within(at, 'about')),
      products: products ?? null,
      where: at,
    },
  };
}
