import { checkThresholds } from '@quarterpoise/dto';
import { readdirSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { SEVERITIES, type Severity } from './check.js';
import { ACCOUNT_CHECKS, checkAccount, FLAG_CODES, sortFlags } from './checks.js';
import { outlierCheck } from './outlier.check.js';
import { accountCheckInput } from './testing/account-check-input.js';

describe('the list of checks', () => {
  it('registers every check that has a file, by its code, once', () => {
    const files = readdirSync(__dirname).filter((name) => name.endsWith('.check.ts'));
    expect(files.map((name) => name.replace('.check.ts', '')).toSorted()).toEqual(FLAG_CODES.toSorted());
    expect(new Set(FLAG_CODES).size).toBe(FLAG_CODES.length);
  });

  it('looks at every threshold of the policy', () => {
    const used = [...ACCOUNT_CHECKS, outlierCheck].flatMap(({ thresholds }) => [...thresholds]);
    expect(used).toEqual(expect.arrayContaining(Object.keys(checkThresholds.shape)));
  });

  it('stands worst first', () => {
    const severities = ACCOUNT_CHECKS.map(({ severity }) => SEVERITIES.indexOf(severity));
    expect(severities).toEqual(severities.toSorted());
  });
});

describe('checkAccount', () => {
  it('finds nothing in an ordinary account', () => {
    expect(checkAccount(accountCheckInput({ publishedClosingCents: 1_000_000 }))).toEqual([]);
  });

  it('gives all that it finds in one account, worst first', () => {
    const input = accountCheckInput({
      balances: { '2026-06-30': 1_000_000, '2026-09-30': 1_500_000 },
      activity: [['2026-09-29', 'withdrawal', 600_000]],
      publishedClosingCents: 990_000,
    });
    expect(checkAccount(input).map(({ code, severity }) => `${severity} ${code}`)).toEqual([
      'review opening-differs',
      'review extreme-return',
      'review large-flow-on-last-days',
    ]);
  });
});

it('sortFlags puts the worst first and keeps the order of equals', () => {
  const flag = (severity: Severity, code: string, id = 0) => ({ severity, code, id });
  expect(
    sortFlags([
      flag('notice', 'no-capital'),
      flag('review', 'newer-than-this'),
      flag('review', 'outlier', 1),
      flag('review', 'outlier', 2),
      flag('review', 'ambiguous'),
      flag('blocking', 'not-computed'),
    ]).map(({ code, id }) => `${code} ${id}`),
  ).toEqual(['not-computed 0', 'ambiguous 0', 'outlier 1', 'outlier 2', 'newer-than-this 0', 'no-capital 0']);
});
