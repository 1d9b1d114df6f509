import type { CivilDate, ImportRowError } from '@quarterpoise/dto';
import { LONGEST } from './limits.js';
import { type RawRow, type RowContext, RowReader } from './row-reader.js';

/** A unit price at the end of a day; numbers stay decimal text of up to eight places. */
export interface PriceRow {
  readonly line: number;
  readonly fund: string;
  readonly asOf: CivilDate;
  readonly unitPrice: string;
  readonly incomePerUnit: string | null;
  readonly splitFactor: string | null;
}

/** Reads a row of a price file, or tells everything that is wrong with it. Prices from before the records begin do no harm. */
export function parsePriceRow(row: RawRow, context: RowContext): PriceRow | ImportRowError[] {
  const reader = new RowReader(row, context);
  const fund = reader.text('fund', LONGEST.code);
  const asOf = reader.pastDate('as_of', { from: null, isBalance: false });
  const unitPrice = reader.price('unit_price', false);
  const incomePerUnit = reader.optionalPrice('income_per_unit', true);
  const splitFactor = reader.optionalPrice('split_factor', false);
  if (reader.errors.length > 0 || asOf === null) return reader.errors;
  return { line: row.line, fund, asOf, unitPrice, incomePerUnit, splitFactor };
}
