import type { AccountCheck } from './check.js';

/** Several rates satisfy the equation, so that none is printed. */
export const ambiguousCheck: AccountCheck = {
  code: 'ambiguous',
  severity: 'review',
  thresholds: [],
  check: ({ result: { status, data } }) => {
    if (status !== 'ambiguous') return null;
    const roots = data.windows.find(({ code }) => code === 'quarter')?.answer?.roots ?? [];
    return { roots: roots.map(growthInPercent).join(', ') };
  },
};

/** A growth factor as a rate. Factors beyond what a percentage can be read from stay as they are. */
function growthInPercent(factor: string): string {
  const percent = (Number(factor) - 1) * 100;
  return Math.abs(percent) < 1e9 ? `${percent.toFixed(2)}%` : `× ${factor}`;
}
