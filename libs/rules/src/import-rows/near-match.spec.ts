import { ACTIVITY_KINDS } from '@quarterpoise/dto';
import { expect, it } from 'vitest';
import { nearMatch } from './near-match.js';

it.each([
  ['withdrawl', 'withdrawal'],
  ['WITHDRAWAL', 'withdrawal'],
  ['Loan Issued', 'loan_issued'],
  ['forfeit', 'forfeiture'],
  ['fees', 'fee'],
  // two kinds hold the word, and neither is nearer
  ['contribution', null],
  ['rollover', null],
  ['gift', null],
  ['', null],
])('the kind that “%s” most likely stands for is %s', (text, kind) => {
  expect(nearMatch(text, ACTIVITY_KINDS)).toBe(kind);
});
