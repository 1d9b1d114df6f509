import { expect, it } from 'vitest';
import { openingDiffersCheck } from './opening-differs.check.js';
import { accountCheckInput } from './testing/account-check-input.js';

it('fires on a single cent', () => {
  expect(openingDiffersCheck.check(accountCheckInput({ publishedClosingCents: 1_000_001 }))).toEqual({
    openingCents: 1_000_000,
    publishedClosingCents: 1_000_001,
    differenceCents: -1,
  });
});

it('does not fire when the balance continues, or when nothing was published before', () => {
  expect(openingDiffersCheck.check(accountCheckInput({ publishedClosingCents: 1_000_000 }))).toBeNull();
  expect(openingDiffersCheck.check(accountCheckInput())).toBeNull();
});
