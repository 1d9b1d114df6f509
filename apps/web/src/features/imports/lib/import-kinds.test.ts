import { describe, expect, it } from 'vitest';
import { kindOfName, plainAmount, plainCount } from './import-kinds';

describe('the kind of a file', () => {
  it('is read from its name', () => {
    expect(kindOfName('2026-Q3-activity.csv')).toBe('activity');
    expect(kindOfName('Closing Balances.csv')).toBe('balances');
    expect(kindOfName('fund_prices_q3.csv')).toBe('prices');
  });

  it('is left open when the name says nothing or two things', () => {
    expect(kindOfName('export.csv')).toBeNull();
    expect(kindOfName('roster-and-balances.csv')).toBeNull();
  });
});

describe('control totals as people type them', () => {
  it('forgives separators and the dollar sign, and keeps every digit', () => {
    expect(plainAmount('$1,234,567.89')).toBe('1234567.89');
    expect(plainAmount('-$7.5')).toBe('-7.5');
    expect(plainAmount('900000000000000.01')).toBe('900000000000000.01');
    expect(plainCount('12,480')).toBe(12480);
  });

  it('takes nothing else', () => {
    expect(plainAmount('1.234')).toBeNull();
    expect(plainAmount('12e3')).toBeNull();
    expect(plainAmount('')).toBeNull();
    expect(plainCount('12.5')).toBeNull();
    expect(plainCount('-3')).toBeNull();
  });
});
