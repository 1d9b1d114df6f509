import type { ImportKind } from '@quarterpoise/dto';

export const IMPORT_KINDS = ['roster', 'activity', 'balances', 'prices'] as const satisfies readonly ImportKind[];

/** Files whose amounts are summed as a control total; roster and prices have rows only. */
export const HAS_SUM: Record<ImportKind, boolean> = { roster: false, activity: true, balances: true, prices: false };

/** The kind that a file's name speaks of, or null when it speaks of none or of several. */
export function kindOfName(fileName: string): ImportKind | null {
  const name = fileName.toLowerCase();
  const hints: Record<ImportKind, RegExp> = {
    roster: /roster|participants?\b|census/,
    activity: /activity|transaction/,
    balances: /balance/,
    prices: /price/,
  };
  const found = IMPORT_KINDS.filter((kind) => hints[kind].test(name));
  return found.length === 1 ? (found[0] ?? null) : null;
}

/** A plain decimal with at most two places, thousands separators and a dollar sign forgiven; null when it is none. */
export function plainAmount(text: string): string | null {
  const plain = text
    .trim()
    .replace(/^\$/, '')
    .replace(/^(-|−)\$?/, '-')
    .replace(/[,\s]/g, '');
  return /^-?\d{1,15}(\.\d{1,2})?$/.test(plain) ? plain : null;
}

/** A whole number of rows, thousands separators forgiven; null when it is none. */
export function plainCount(text: string): number | null {
  const plain = text.trim().replace(/[,\s]/g, '');
  return /^\d{1,10}$/.test(plain) ? Number(plain) : null;
}
