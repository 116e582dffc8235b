import type { DisplayUnits, ProductsSign } from '../../core/figures/index.ts';
import type { RollUpRecord } from '../../core/record/record.ts';
import type { Sheet } from './sheet.ts';

/** What every section of a run's report is given. */
export interface ReportContext {
  readonly record: RollUpRecord;
  readonly sheet: Sheet;
  readonly units: DisplayUnits;
  readonly products: ProductsSign;
  readonly digits: number;
  /** Predicted where the file has a growth table, else basic: what limits are judged on. */
  readonly on: 'basic' | 'predicted';
  /** YYYY-MM-DD, for waivers. */
  readonly today: string;
}

export const place = (at: { file: string; line: number }): string => `${at.file}:${at.line}`;

/** `I_xy = −∫xy dm`, for products as they are printed. */
export const productsText = (products: ProductsSign): string =>
  products === 'negative' ? 'products negative, I_xy = −∫xy dm' : 'products positive, P_xy = +∫xy dm';
