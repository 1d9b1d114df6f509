import { expect, it } from 'vitest';
import { distribution, tieTotals, untiedCount } from './totals.js';

it('totals tie to the cent, and what has nothing to be compared with is not checked', () => {
  const ties = tieTotals({
    closing: { foundCents: 500, controlTotalCents: 500 },
    opening: { foundCents: 400, lastPublishedCents: 401 },
    gain: { foundCents: 0, reportedEarningsCents: null },
  });
  expect(ties).toEqual([
    { code: 'closing-to-control-total', expectedCents: 500, foundCents: 500, tied: true, checked: true },
    { code: 'opening-to-last-published', expectedCents: 401, foundCents: 400, tied: false, checked: true },
    { code: 'gain-to-reported-earnings', expectedCents: 0, foundCents: 0, tied: false, checked: false },
  ]);
  expect(untiedCount(ties)).toBe(1);
});

it('bins are one percentage point wide and hold their lower bound', () => {
  expect(distribution([0, 99, 100, -1, -100, -101, NaN, 41_246_160])).toEqual([
    { fromPct: -2, count: 1 },
    { fromPct: -1, count: 2 },
    { fromPct: 0, count: 2 },
    { fromPct: 1, count: 1 },
    { fromPct: 412_461, count: 1 },
  ]);
  expect(distribution([])).toEqual([]);
  expect(Object.is(distribution([-0])[0]?.fromPct, 0)).toBe(true);
});
