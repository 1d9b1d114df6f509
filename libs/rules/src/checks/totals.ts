import type { RunTotals } from '@quarterpoise/dto';

/** A total of the run beside one that does not come from it; null where there is none to compare with. */
export interface TieInput {
  readonly closing: { readonly foundCents: number; readonly controlTotalCents: number | null };
  readonly opening: { readonly foundCents: number; readonly lastPublishedCents: number | null };
  readonly gain: { readonly foundCents: number; readonly reportedEarningsCents: number | null };
}

/** The totals that must tie, to the cent. What has nothing to be compared with is not checked, and never counts as tied. */
export function tieTotals({ closing, opening, gain }: TieInput): RunTotals['ties'] {
  return [
    tie('closing-to-control-total', closing.foundCents, closing.controlTotalCents),
    tie('opening-to-last-published', opening.foundCents, opening.lastPublishedCents),
    tie('gain-to-reported-earnings', gain.foundCents, gain.reportedEarningsCents),
  ];
}

function tie(
  code: RunTotals['ties'][number]['code'],
  foundCents: number,
  expectedCents: number | null,
): RunTotals['ties'][number] {
  const isChecked = expectedCents !== null;
  return {
    code,
    expectedCents: expectedCents ?? 0,
    foundCents,
    tied: isChecked && expectedCents === foundCents,
    checked: isChecked,
  };
}

/** How many totals were compared and differ: these stand in the way of a sign-off. */
export const untiedCount = (ties: RunTotals['ties']): number =>
  ties.filter(({ tied, checked }) => checked && !tied).length;

/**
 * Returns in bins one percentage point wide, ascending: the lower bound (which belongs to the bin) and the count. Bins without any
 * return are left out, since one account may lie thousands of bins away.
 * @param basisPoints Hundredths of a percent; NaN where an account has no return.
 */
export function distribution(basisPoints: Iterable<number>): RunTotals['distribution'] {
  const counts = new Map<number, number>();
  for (const value of basisPoints) {
    if (Number.isNaN(value)) continue;
    // no negative zero: -0.5 % is in the bin that starts at -1
    const fromPct = Math.floor(value / 100) + 0;
    counts.set(fromPct, (counts.get(fromPct) ?? 0) + 1);
  }
  return [...counts].map(([fromPct, count]) => ({ fromPct, count })).toSorted((a, b) => a.fromPct - b.fromPct);
}
