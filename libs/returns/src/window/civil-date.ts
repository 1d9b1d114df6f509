/** Days before each month in a year without leap day. */
const DAYS_BEFORE_MONTH = [0, 31, 59, 90, 120, 151, 181, 212, 243, 273, 304, 334] as const;

/** Digits `from` to before `to` as a number; NaN where one is no digit. */
function digits(text: string, from: number, to: number): number {
  let value = 0;
  for (let index = from; index < to; index += 1) {
    const digit = text.charCodeAt(index) - 48;
    if (!(digit >= 0 && digit <= 9)) return NaN;
    value = value * 10 + digit;
  }
  return value;
}

const isLeapYear = (year: number): boolean => (year % 4 === 0 && year % 100 !== 0) || year % 400 === 0;

const daysInMonth = (year: number, month: number): number =>
  month === 2 ? (isLeapYear(year) ? 29 : 28) : month === 4 || month === 6 || month === 9 || month === 11 ? 30 : 31;

/** Days from 1970-01-01 to 1 January of `year`, by the proleptic Gregorian calendar. */
const dayOfNewYear = (year: number): number => {
  const before = year - 1;
  return 365 * before + Math.floor(before / 4) - Math.floor(before / 100) + Math.floor(before / 400) - 719162;
};

const dayOf = (year: number, month: number, day: number): number =>
  dayOfNewYear(year) + DAYS_BEFORE_MONTH[month - 1]! + (month > 2 && isLeapYear(year) ? 1 : 0) + day - 1;

const write = (year: number, month: number, day: number): string =>
  `${String(year).padStart(4, '0')}-${String(month).padStart(2, '0')}-${String(day).padStart(2, '0')}`;

/**
 * Reads a civil date as days since 1970-01-01.
 *
 * Units: whole days, proleptic Gregorian calendar, no time zone and no time of day.
 * Domain: any text; years 0001 to 9999 are dates.
 * Returns: the day number, or null when the text is not an existing day written `YYYY-MM-DD`.
 * Throws: never.
 * Complexity: constant.
 * Example: `readDay('1970-01-02')` is 1, `readDay('2026-02-30')` is null.
 */
export function readDay(text: string): number | null {
  if (text.length !== 10 || text[4] !== '-' || text[7] !== '-') return null;
  const year = digits(text, 0, 4);
  const month = digits(text, 5, 7);
  const day = digits(text, 8, 10);
  if (Number.isNaN(year + month + day)) return null;
  if (year < 1 || month < 1 || month > 12 || day < 1 || day > daysInMonth(year, month)) return null;
  return dayOf(year, month, day);
}

/**
 * Days since 1970-01-01 of a civil date that is known to be one.
 *
 * Units and domain: as {@link readDay}.
 * Returns: the day number.
 * Throws: RangeError when the text is not an existing day.
 * Complexity: constant.
 * Example: `dayNumber('2026-09-30') - dayNumber('2026-06-30')` is 92.
 */
export function dayNumber(date: string): number {
  const day = readDay(date);
  if (day === null) throw new RangeError(`"${date}" is not a date such as 2026-09-30`);
  return day;
}

/** Year, month and day of a day number (days since 1970-01-01; years 0001 to 9999). */
export function civilParts(day: number): { year: number; month: number; day: number } {
  let year = Math.floor((day + 719162) / 365.2425) + 1;
  if (dayOfNewYear(year) > day) year -= 1;
  else if (dayOfNewYear(year + 1) <= day) year += 1;
  let rest = day - dayOfNewYear(year);
  let month = 1;
  while (rest >= daysInMonth(year, month)) {
    rest -= daysInMonth(year, month);
    month += 1;
  }
  return { year, month, day: rest + 1 };
}

/** Accounts of a plan share their days: a run writes each once. */
const written = new Map<number, string>();
const MOST_WRITTEN = 20_000;

/**
 * The civil date of a day number; the inverse of {@link dayNumber}.
 *
 * Units: days since 1970-01-01. Domain: whole numbers whose year lies in 0001 to 9999.
 * Returns: `YYYY-MM-DD`. Throws: never. Complexity: constant.
 * Example: `isoDate(0)` is `1970-01-01`.
 */
export function isoDate(day: number): string {
  const known = written.get(day);
  if (known !== undefined) return known;
  const parts = civilParts(day);
  const text = write(parts.year, parts.month, parts.day);
  if (written.size >= MOST_WRITTEN) written.clear();
  written.set(day, text);
  return text;
}

/**
 * The anniversary of a date, `years` later or (negative) earlier.
 *
 * Units: whole years. Domain: results within years 0001 to 9999.
 * Returns: the same day and month; the anniversary of 29 February in a common year is 28 February.
 * Throws: RangeError for what is not a date.
 * Complexity: constant.
 * Source: common practice, no source; the rule for 29 February is stated on every statement's methods page.
 * Example: `addYears('2024-02-29', 1)` is `2025-02-28`.
 */
export function addYears(date: string, years: number): string {
  const { year, month, day } = civilParts(dayNumber(date));
  return write(year + years, month, Math.min(day, daysInMonth(year + years, month)));
}

/** Whether a day is the last of March, June, September or December. */
export function isQuarterEnd(day: number): boolean {
  const next = civilParts(day + 1);
  return next.day === 1 && next.month % 3 === 1;
}
