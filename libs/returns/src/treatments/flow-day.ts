import type { ReturnPolicy } from './return-policy.js';

/** A quarter end that figures were struck at, the version they were struck from, and the version of the balance now in force there. */
export interface Close {
  readonly day: number;
  /** Ledger version of the published figures; Infinity for the quarter in hand. */
  readonly ledgerVersion: number;
  /** Ledger version of the balance in force at the close; −Infinity when there is none. */
  readonly balanceVersion: number;
}

/**
 * The day on which a row counts.
 *
 * Units: days since 1970-01-01. Domain: any row; the closes of the account's plan, in any order.
 * Returns: the posting day when the policy dates by posting; else the effective day, unless a close lies between (effective ≤ close
 * < posted), since the balance at that close did not hold the money. The effective day stands all the same when the row came after
 * the close's figures and the balance in force there came with it or later: then the balance was corrected to hold it.
 * The quarter in hand is such a close too, or its late rows would count in it and again in the next.
 * Throws: never. Complexity: linear in the closes, none of which is looked at when both dates are the same.
 * Source: common practice, no source.
 */
export function flowDay(
  policy: Pick<ReturnPolicy, 'flowDate' | 'lateEffective'>,
  effectiveDay: number,
  postedDay: number,
  ledgerVersion: number,
  closes: readonly Close[],
): number {
  if (policy.flowDate === 'posting') return postedDay;
  if (policy.lateEffective === 'effective' || postedDay <= effectiveDay) return effectiveDay;
  for (const close of closes) {
    if (effectiveDay > close.day || postedDay <= close.day) continue;
    const isCorrected = ledgerVersion > close.ledgerVersion && close.balanceVersion >= ledgerVersion;
    if (!isCorrected) return postedDay;
  }
  return effectiveDay;
}
