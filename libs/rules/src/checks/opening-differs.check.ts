import type { AccountCheck } from './check.js';

/** The quarter does not open with what the last published statement closed with. To the cent: balances are facts, not estimates. */
export const openingDiffersCheck: AccountCheck = {
  code: 'opening-differs',
  severity: 'review',
  thresholds: [],
  check: ({ result: { openingCents }, publishedClosingCents }) => {
    if (openingCents === null || publishedClosingCents === null || openingCents === publishedClosingCents) return null;
    return { openingCents, publishedClosingCents, differenceCents: openingCents - publishedClosingCents };
  },
};
