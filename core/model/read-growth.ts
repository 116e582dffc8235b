import type { GrowthDocument } from '../document/index.ts';
import { PLAIN_UNIT } from '../units/index.ts';
import type { FileReader } from './file-reader.ts';
import type { GrowthModel, Quantity } from './model.ts';
import { type Where, within } from './where.ts';

/**
 * `growth:` by maturity (`estimated: 20 %`), by category and maturity (`structure: { estimated: 18 % }`), or both:
 * a category without a table of its own takes the plain one.
 */
export function readGrowth(growth: GrowthDocument | undefined, reader: FileReader): GrowthModel | null {
  if (growth === undefined) return null;
  const root = within(null, 'growth');
  const tables = new Map<string | null, Map<string, Quantity>>();
  const put = (category: string | null, maturity: string, text: string, where: Where) => {
    const quantity = reader.quantity(text, PLAIN_UNIT, where);
    const table = tables.get(category) ?? new Map<string, Quantity>();
    tables.set(category, table.set(maturity, quantity));
  };
  for (const [key, value] of Object.entries(growth)) {
    if (typeof value === 'string') put(null, key, value, within(root, key));
    else
      for (const [maturity, text] of Object.entries(value as Record<string, string>))
        put(key, maturity, text, within(within(root, key), maturity));
  }
  return { tables };
}
