import { describe, expect, it } from 'vitest';
import { currentStep, standingOf, STEPS } from './steps';

const run = (undecidedFlagCount: number) => ({ undecidedFlagCount }) as never;
const blocking = (code: string) => ({ code, severity: 'blocking' }) as never;

describe('the step to work on', () => {
  it('follows the state of the quarter', () => {
    expect(currentStep({ state: 'collecting', findings: [], currentRun: null })).toBe('collect');
    expect(currentStep({ state: 'ready', findings: [], currentRun: null })).toBe('run');
    expect(currentStep({ state: 'signed_off', findings: [], currentRun: run(0) })).toBe('publish');
    expect(currentStep({ state: 'published', findings: [], currentRun: run(0) })).toBeNull();
  });

  it('stays at the data checks while something there forbids a run', () => {
    expect(currentStep({ state: 'ready', findings: [blocking('balance-missing')], currentRun: null })).toBe('check');
  });

  it('passes from review to sign-off when every flag is decided', () => {
    expect(currentStep({ state: 'in_review', findings: [], currentRun: run(3) })).toBe('review');
    expect(currentStep({ state: 'in_review', findings: [], currentRun: run(0) })).toBe('sign-off');
  });

  it('tells done from later steps', () => {
    expect(STEPS.map((step) => standingOf(step, 'run'))).toEqual([
      'done',
      'done',
      'current',
      'later',
      'later',
      'later',
    ]);
    expect(STEPS.map((step) => standingOf(step, null))).toEqual(STEPS.map(() => 'done'));
  });
});
