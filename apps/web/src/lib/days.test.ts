import { describe, expect, it } from 'vitest';
import { daysBetween } from './days';

describe('days between civil dates', () => {
  it('are whole days across the change of the clocks, in either direction', () => {
    expect(daysBetween('2026-03-01', '2026-04-01')).toBe(31);
    expect(daysBetween('2026-10-01', '2026-11-14')).toBe(44);
    expect(daysBetween('2026-11-14', '2026-11-02')).toBe(-12);
    expect(daysBetween('2026-11-14', '2026-11-14')).toBe(0);
  });
});
