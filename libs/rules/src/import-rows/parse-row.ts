import type { ImportKind, ImportRowError } from '@quarterpoise/dto';
import { type ActivityRow, type ActivityVoidRow, parseActivityRow } from './activity.row.js';
import { type BalanceRow, parseBalanceRow } from './balances.row.js';
import { parsePriceRow, type PriceRow } from './prices.row.js';
import { parseRosterRow, type RosterRow } from './roster.row.js';
import type { RawRow, RowContext } from './row-reader.js';

export interface RowOf {
  roster: RosterRow;
  activity: ActivityRow | ActivityVoidRow;
  balances: BalanceRow;
  prices: PriceRow;
}

type Parser<K extends ImportKind> = (row: RawRow, context: RowContext) => RowOf[K] | ImportRowError[];

const PARSERS: { readonly [K in ImportKind]: Parser<K> } = {
  roster: parseRosterRow,
  activity: parseActivityRow,
  balances: parseBalanceRow,
  prices: parsePriceRow,
};

/** The rules of one kind of file: a row as it stands becomes a typed row, or the list of its errors. */
export const rowParser = <K extends ImportKind>(kind: K): Parser<K> => PARSERS[kind];
