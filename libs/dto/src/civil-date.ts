import { z } from 'zod';

/** A civil date, `YYYY-MM-DD`. Whether the day exists (2026-02-30 does not) is checked without any time zone. */
export const civilDate = z.iso.date();
export type CivilDate = z.infer<typeof civilDate>;

/** The last day of a calendar quarter written the way people say it: `2026-Q3`. */
export const quarterCode = z.string().regex(/^\d{4}-Q[1-4]$/, 'a quarter is written like 2026-Q3');

const LAST_DAYS = ['03-31', '06-30', '09-30', '12-31'] as const;

/** `2026-Q3` → `2026-09-30`. */
export function quarterClosesOn(code: string): CivilDate {
  const { 1: year, 2: number } = /^(\d{4})-Q([1-4])$/.exec(code) ?? [];
  const lastDay = LAST_DAYS[Number(number) - 1];
  if (year === undefined || lastDay === undefined) throw new RangeError(`"${code}" is not a quarter such as 2026-Q3`);
  return `${year}-${lastDay}`;
}

/** `2026-09-30` → `2026-Q3`. Any day of the quarter will do. */
export function quarterCodeOf(date: CivilDate): string {
  return `${date.slice(0, 4)}-Q${Math.ceil(Number(date.slice(5, 7)) / 3)}`;
}
