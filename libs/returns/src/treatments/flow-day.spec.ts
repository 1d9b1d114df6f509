import { describe, expect, it } from 'vitest';
import { type Close, flowDay } from './flow-day.js';

const policy = { flowDate: 'effective', lateEffective: 'posting' } as const;
/** Figures at day 100 were struck from ledger version 5. */
const close = (balanceVersion: number): Close[] => [{ day: 100, ledgerVersion: 5, balanceVersion }];

describe('the day on which a row counts', () => {
  it('is the effective day, or the posting day where the policy says so', () => {
    expect(flowDay(policy, 90, 95, 3, close(4))).toBe(90);
    expect(flowDay({ ...policy, flowDate: 'posting' }, 90, 95, 3, close(4))).toBe(95);
  });

  it('is the posting day when a close lies between, since its balance did not hold the money', () => {
    expect(flowDay(policy, 90, 101, 7, close(4))).toBe(101);
    expect(flowDay(policy, 90, 101, 4, close(4))).toBe(101);
    expect(flowDay(policy, 100, 101, 7, close(4))).toBe(101);
    expect(flowDay(policy, 101, 120, 7, close(4))).toBe(101);
    expect(flowDay(policy, 90, 100, 7, close(4))).toBe(90);
  });

  it('is the effective day all the same when the corrected balance came with the row or after it', () => {
    expect(flowDay(policy, 90, 101, 7, close(7))).toBe(90);
    expect(flowDay(policy, 90, 101, 7, close(8))).toBe(90);
    expect(flowDay(policy, 90, 101, 7, close(6))).toBe(101);
  });

  it('is the effective day throughout where the policy says so', () => {
    expect(flowDay({ ...policy, lateEffective: 'effective' }, 90, 101, 7, close(4))).toBe(90);
  });
});
