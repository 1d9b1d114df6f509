import { IMPORT_COLUMNS, type ImportKind, importRowError } from '@quarterpoise/dto';
import { describe, expect, it } from 'vitest';
import { rowParser } from './parse-row.js';
import { rowContextOf } from './row-reader.js';

const context = rowContextOf('2026-10-05', '2019-07-01');

const GOOD: Record<ImportKind, Record<string, string>> = {
  roster: {
    participant_number: '00417',
    given_name: 'Ada',
    family_name: 'Quill',
    email: 'ada.quill@example.com',
    joined_on: '2020-02-29',
    left_on: '',
    language: 'en',
    delivery: 'email',
  },
  activity: {
    reference: 'T-1',
    participant_number: '00417',
    effective_on: '2026-07-10',
    posted_on: '2026-07-13',
    kind: 'employee_contribution',
    source: 'pretax',
    fund: 'larch_balanced',
    amount: '125.5',
  },
  balances: {
    participant_number: '00417',
    as_of: '2026-09-30',
    source: 'pretax',
    fund: 'larch_balanced',
    balance: '1',
  },
  prices: { fund: 'larch_balanced', as_of: '2026-09-30', unit_price: '12.34567891' },
};

const read = (kind: ImportKind, changes: Record<string, string> = {}) =>
  rowParser(kind)({ line: 7, values: { ...GOOD[kind], ...changes } }, context);

/** The errors of a row, each as `column code`. */
const faults = (kind: ImportKind, changes: Record<string, string>) => {
  const result = read(kind, changes);
  return Array.isArray(result) ? result.map(({ column, code }) => `${column} ${code}`) : [];
};

const onlyError = (kind: ImportKind, changes: Record<string, string>) => {
  const result = read(kind, changes);
  if (!Array.isArray(result) || result.length !== 1) throw new Error(`expected one error: ${JSON.stringify(result)}`);
  return importRowError.parse(result[0]);
};

describe('good rows', () => {
  it('become typed rows with whole cents, leading zeros kept', () => {
    expect(read('activity', { group: 'G1' })).toEqual({
      line: 7,
      action: 'load',
      reference: 'T-1',
      participantNumber: '00417',
      effectiveOn: '2026-07-10',
      postedOn: '2026-07-13',
      kind: 'employee_contribution',
      kindCode: 0,
      source: 'pretax',
      fund: 'larch_balanced',
      amountCents: 12550,
      groupReference: 'G1',
    });
    expect(read('roster', { address_line_2: 'Mill Lane 3', previous_number: '00399', delivery: 'Paper' })).toEqual({
      line: 7,
      participantNumber: '00417',
      givenName: 'Ada',
      familyName: 'Quill',
      email: 'ada.quill@example.com',
      emailKind: null,
      joinedOn: '2020-02-29',
      leftOn: null,
      language: 'en',
      delivery: 'paper',
      deliveryBasis: null,
      deliveryBasisOn: null,
      postalLines: ['Mill Lane 3'],
      previousNumber: '00399',
    });
    expect(read('balances', { balance: '-0.07', earnings: '1.10' })).toMatchObject({
      balanceCents: -7,
      earningsCents: 110,
    });
    expect(read('prices', { income_per_unit: '0', split_factor: '2' })).toEqual({
      line: 7,
      fund: 'larch_balanced',
      asOf: '2026-09-30',
      unitPrice: '12.34567891',
      incomePerUnit: '0',
      splitFactor: '2',
    });
  });

  it('take a reference back with nothing but the reference', () => {
    const values = { reference: 'T-1', action: 'VOID' };
    expect(rowParser('activity')({ line: 9, values }, context)).toEqual({
      line: 9,
      action: 'void',
      reference: 'T-1',
      amountCents: 0,
    });
  });

  it('may be signed where the kind is: earnings and adjustments', () => {
    expect(read('activity', { kind: 'earnings', amount: '-3.00' })).toMatchObject({ amountCents: -300 });
    expect(read('activity', { kind: 'adjustment', amount: '-3.00' })).toMatchObject({ amountCents: -300 });
  });

  it('may hold opening balances of the eve of the records, and a loan note without a source', () => {
    expect(read('balances', { as_of: '2019-06-30' })).toMatchObject({ asOf: '2019-06-30' });
    expect(read('balances', { fund: 'loan_note', source: '' })).toMatchObject({ source: '' });
  });
});

describe('faulty rows', () => {
  it.each<[ImportKind, Record<string, string>, string[]]>([
    ['activity', { kind: 'employe_contribution' }, ['kind unknown-kind']],
    ['activity', { kind: '' }, ['kind required']],
    ['activity', { action: 'delete' }, ['action unknown-action']],
    ['activity', { action: 'void', reference: '' }, ['reference required']],
    ['activity', { effective_on: '2026-02-30' }, ['effective_on not-a-date']],
    ['activity', { effective_on: '10.07.2026' }, ['effective_on not-a-date']],
    ['activity', { posted_on: '2026-07-09' }, ['posted_on date-order']],
    ['activity', { posted_on: '2026-10-06' }, ['posted_on in-the-future']],
    ['activity', { effective_on: '2019-06-30' }, ['effective_on before-records-begin']],
    ['activity', { amount: '125.505' }, ['amount too-many-decimals']],
    ['activity', { amount: '1,250.50' }, ['amount not-an-amount']],
    ['activity', { amount: '-1.00' }, ['amount negative-amount']],
    ['activity', { kind: 'withdrawal', amount: '-1.00' }, ['amount negative-amount']],
    ['activity', { reference: 'x'.repeat(81) }, ['reference too-long']],
    ['balances', { as_of: '2019-06-29' }, ['as_of before-records-begin']],
    ['balances', { source: '' }, ['source required']],
    ['balances', { fund: 'loan_note', balance: '-5' }, ['balance negative-amount']],
    ['balances', { earnings: 'n/a' }, ['earnings not-an-amount']],
    ['prices', { unit_price: '0.00' }, ['unit_price not-a-price']],
    ['prices', { unit_price: '-1' }, ['unit_price not-a-price']],
    ['prices', { unit_price: '1.123456789' }, ['unit_price too-many-decimals']],
    ['prices', { as_of: '' }, ['as_of required']],
    ['roster', { left_on: '2019-01-01' }, ['left_on date-order']],
    ['roster', { email: 'ada at example' }, ['email not-an-email']],
    ['roster', { delivery: 'e-mail' }, ['delivery not-a-choice']],
    ['roster', { language: 'fr' }, ['language not-a-choice']],
    ['roster', { family_name: '' }, ['family_name required']],
  ])('%s %j', (kind, changes, expected) => {
    expect(faults(kind, changes)).toEqual(expected);
  });

  it('tell everything that is wrong at once', () => {
    expect(faults('activity', { reference: '', effective_on: 'x', kind: 'gift', amount: '' })).toEqual([
      'reference required',
      'effective_on not-a-date',
      'kind unknown-kind',
      'amount required',
    ]);
  });

  it('say where, what stands there, why not and how to mend it', () => {
    expect(onlyError('activity', { kind: 'Employee Contribution' })).toMatchObject({
      line: 7,
      column: 'kind',
      value: 'Employee Contribution',
      reason: '“Employee Contribution” is not a kind of activity.',
      remedy: expect.stringMatching(/^Did you mean employee_contribution\? The kinds are employee_contribution, /),
    });
    expect(onlyError('activity', { effective_on: '2026-02-30', posted_on: '2026-03-02' }).reason).toBe(
      'There is no such day as 2026-02-30.',
    );
    expect(onlyError('activity', { posted_on: '2026-07-09' }).reason).toBe(
      'posted_on 2026-07-09 is before effective_on 2026-07-10.',
    );
    expect(onlyError('roster', { delivery: 'e-mail' }).remedy).toBe('Did you mean email? Write email or paper.');
    expect(onlyError('balances', { balance: '1.234,50' }).remedy).toBe(
      'Leave the thousands separators out, such as 1234.56.',
    );
    expect(onlyError('balances', { balance: '12,50' }).remedy).toBe(
      'Write a point, not a comma, before the cents, such as 1234.56.',
    );
    expect(onlyError('balances', { balance: '$12.50' }).remedy).toMatch(/^Leave the currency sign out/);
    expect(onlyError('balances', { balance: '(12.50)' }).remedy).toMatch(
      /^Write a negative amount with a leading minus/,
    );
    expect(onlyError('balances', { balance: '1.2E+05' }).remedy).toMatch(/^Write the number out in full/);
    expect(onlyError('balances', { balance: '99999999999999' }).remedy).toMatch(/^Check the number of digits/);
  });

  it('show a long value by its beginning', () => {
    expect(onlyError('roster', { family_name: 'y'.repeat(5000) }).value).toHaveLength(201);
  });
});

it('the rules read every column of the contract and no other', () => {
  for (const [kind, { required, optional }] of Object.entries(IMPORT_COLUMNS)) {
    const asked = new Set<string>();
    const values = new Proxy({} as Record<string, string>, {
      get: (_, column) => (asked.add(String(column)), ''),
    });
    rowParser(kind as ImportKind)({ line: 2, values }, context);
    expect([...asked].toSorted()).toEqual([...required, ...optional].toSorted());
  }
});
