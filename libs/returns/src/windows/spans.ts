import type { ReturnPolicy, WindowCode } from '../treatments/return-policy.js';
import { addYears, civilParts, dayNumber } from '../window/civil-date.js';

const WHOLE_YEARS: Partial<Record<WindowCode, number>> = { one_year: 1, three_years: 3, five_years: 5, ten_years: 10 };

/** Where a window nominally opens, and the rule for its annual rate as the solve command takes it. */
export interface NominalSpan {
  readonly openedDay: number;
  readonly years: number | null;
}

/**
 * The nominal span of a window that ends at the close.
 *
 * Units: days since 1970-01-01. Domain: every code but `since_joining`, whose opening is a matter of the account.
 * Returns: quarter and year to date are never annualised (years 0), nor is the one-year window (1), in leap years too; longer ones by
 * their whole years, or by Actual/365 (null) where the policy says so.
 * Complexity: constant.
 */
export function nominalSpan(
  code: Exclude<WindowCode, 'since_joining'>,
  opensDay: number,
  closesOn: string,
  policy: Pick<ReturnPolicy, 'yearToDate' | 'planYearStartMonth' | 'wholeYears'>,
): NominalSpan {
  if (code === 'quarter') return { openedDay: opensDay, years: 0 };
  if (code === 'year_to_date') {
    const startMonth = policy.yearToDate === 'calendar' ? 1 : policy.planYearStartMonth;
    const { year, month } = civilParts(dayNumber(closesOn));
    const startYear = month >= startMonth ? year : year - 1;
    const firstDay = `${String(startYear).padStart(4, '0')}-${String(startMonth).padStart(2, '0')}-01`;
    return { openedDay: dayNumber(firstDay) - 1, years: 0 };
  }
  const years = WHOLE_YEARS[code]!;
  const isByYears = years === 1 || policy.wholeYears === 'anniversary';
  return { openedDay: dayNumber(addYears(closesOn, -years)), years: isByYears ? years : null };
}
