import { describe, expect, it } from 'vitest';
import { addYears, civilParts, dayNumber, isoDate, isQuarterEnd, readDay } from './civil-date.js';

describe('civil dates', () => {
  it('count days from 1970-01-01', () => {
    expect(dayNumber('1970-01-01')).toBe(0);
    expect(dayNumber('1969-12-31')).toBe(-1);
    expect(dayNumber('2026-09-30') - dayNumber('2026-06-30')).toBe(92);
    // By the calendar of ECMAScript, in UTC.
    expect(dayNumber('2000-03-01')).toBe(Date.UTC(2000, 2, 1) / 86_400_000);
  });

  it('turn back into the same text, every day of eight centuries around leap rules', () => {
    for (let day = dayNumber('1599-12-30'); day < dayNumber('2401-01-05'); day += 1) {
      expect(dayNumber(isoDate(day))).toBe(day);
    }
  });

  it('reach from 0001 to 9999', () => {
    expect(isoDate(dayNumber('0001-01-01'))).toBe('0001-01-01');
    expect(isoDate(dayNumber('9999-12-31'))).toBe('9999-12-31');
    expect(civilParts(dayNumber('0004-02-29'))).toEqual({ year: 4, month: 2, day: 29 });
  });

  it.each([
    '2026-02-29',
    '1900-02-29',
    '2026-13-01',
    '2026-00-10',
    '2026-04-31',
    '2026-4-3',
    '0000-01-01',
    '',
    '2026-01-01T00:00',
  ])('refuse %j', (text) => {
    expect(readDay(text)).toBeNull();
    expect(() => dayNumber(text)).toThrow(RangeError);
  });

  it('have anniversaries; that of 29 February is 28 February in a common year', () => {
    expect(addYears('2024-02-29', 1)).toBe('2025-02-28');
    expect(addYears('2024-02-29', -4)).toBe('2020-02-29');
    expect(addYears('2026-09-30', -5)).toBe('2021-09-30');
  });

  it('know quarter ends', () => {
    const ends = ['2026-03-31', '2026-06-30', '2026-09-30', '2026-12-31'];
    expect(ends.every((date) => isQuarterEnd(dayNumber(date)))).toBe(true);
    expect(['2026-03-30', '2026-04-30', '2026-01-01'].some((date) => isQuarterEnd(dayNumber(date)))).toBe(false);
  });
});
