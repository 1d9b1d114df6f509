import { describe, expect, it } from 'vitest';
import { InvalidWindow, readWindow } from './window.js';

const valid = {
  openedOn: '2026-06-30',
  closedOn: '2026-09-30',
  openingCents: 1800000,
  closingCents: 1868920,
  flows: [{ date: '2026-07-10', cents: 25000 }],
  timing: 'end',
};

const fieldOf = (value: unknown): string => {
  try {
    readWindow(value);
  } catch (error) {
    expect(error).toBeInstanceOf(InvalidWindow);
    const invalid = error as InvalidWindow;
    expect(invalid.message).toBe(`${invalid.field} ${invalid.detail}`);
    return invalid.field;
  }
  return 'none';
};

describe('reading a window', () => {
  it('keeps what is known and drops the rest', () => {
    expect(readWindow({ ...valid, id: 'a1', note: 'x' })).toEqual(valid);
    expect(readWindow({ ...valid, years: 3 })).toEqual({ ...valid, years: 3 });
    expect(readWindow({ ...valid, years: null })).toEqual(valid);
  });

  it.each<[string, unknown]>([
    ['window', null],
    ['window', []],
    ['window', 'x'],
    ['openedOn', { ...valid, openedOn: '2026-06-31' }],
    ['openedOn', { ...valid, openedOn: undefined }],
    ['closedOn', { ...valid, closedOn: 20260930 }],
    ['closedOn', { ...valid, closedOn: '2026-06-29' }],
    ['openingCents', { ...valid, openingCents: 0.5 }],
    ['openingCents', { ...valid, openingCents: '100' }],
    ['closingCents', { ...valid, closingCents: 2 ** 53 }],
    ['closingCents', { ...valid, closingCents: null }],
    ['flows', { ...valid, flows: undefined }],
    ['flows', { ...valid, flows: {} }],
    ['flows[0]', { ...valid, flows: [5] }],
    ['flows[1].date', { ...valid, flows: [valid.flows[0], { date: '2026-02-30', cents: 1 }] }],
    ['flows[0].date', { ...valid, flows: [{ date: '2026-06-30', cents: 1 }] }],
    ['flows[0].date', { ...valid, flows: [{ date: '2026-10-01', cents: 1 }] }],
    ['flows[0].cents', { ...valid, flows: [{ date: '2026-09-30', cents: Number.NaN }] }],
    ['timing', { ...valid, timing: undefined }],
    ['timing', { ...valid, timing: 'noon' }],
    ['years', { ...valid, years: -1 }],
    ['years', { ...valid, years: 2.5 }],
    ['none', { ...valid, flows: [{ date: '2026-09-30', cents: 1 }] }],
    ['none', { ...valid, closedOn: '2026-06-30', flows: [] }],
  ])('names the field: %s', (field, value) => {
    expect(fieldOf(value)).toBe(field);
  });

  it('says what is wrong and what to give', () => {
    expect(() => readWindow({ ...valid, openedOn: '2026-06-31' })).toThrow(
      'openedOn is "2026-06-31"; give an existing day such as "2026-09-30"',
    );
    expect(() => readWindow({ ...valid, flows: [{ date: '2026-06-30', cents: 1 }] })).toThrow(
      'flows[0].date is "2026-06-30"; it must lie after openedOn 2026-06-30 and not after closedOn 2026-09-30',
    );
  });
});
