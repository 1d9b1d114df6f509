import { IMPORT_STATES, INQUIRY_STATES, QUARTER_STATES, RUN_STATES } from '@quarterpoise/dto';
import { describe, expect, it } from 'vitest';
import { IMPORT_MACHINE } from './import.states.js';
import { INQUIRY_MACHINE } from './inquiry.states.js';
import { QUARTER_MACHINE } from './quarter.states.js';
import { RUN_MACHINE } from './run.states.js';
import { checkMove, faultsOf, moveAllowed, type StateMachine } from './state-machine.js';

const MACHINES: readonly [StateMachine, readonly string[]][] = [
  [QUARTER_MACHINE, QUARTER_STATES],
  [RUN_MACHINE, RUN_STATES],
  [IMPORT_MACHINE, IMPORT_STATES],
  [INQUIRY_MACHINE, INQUIRY_STATES],
];

describe('the state tables', () => {
  it.each(MACHINES)('$subject has a sound table over exactly the states of the contract', (machine, states) => {
    expect(faultsOf(machine)).toEqual([]);
    expect(Object.keys(machine.states).toSorted()).toEqual([...states].toSorted());
  });

  it('lets through the whole life of a quarter and nothing that skips a step', () => {
    const life = ['collecting', 'ready', 'computing', 'in_review', 'signed_off', 'published'];
    for (const [index, from] of life.slice(0, -1).entries()) {
      expect(checkMove(QUARTER_MACHINE, from, life[index + 1]!)).toBeNull();
      for (const to of life.slice(index + 2)) {
        const isNewRun = to === 'computing' && from !== 'collecting';
        expect(checkMove(QUARTER_MACHINE, from, to) === null).toBe(isNewRun);
      }
    }
  });

  it('lets a new run void a review and a sign-off, but not a publication', () => {
    expect(checkMove(QUARTER_MACHINE, 'in_review', 'computing')).toBeNull();
    expect(checkMove(QUARTER_MACHINE, 'signed_off', 'computing')).toBeNull();
    expect(checkMove(QUARTER_MACHINE, 'published', 'computing')).not.toBeNull();
  });

  it('refuses with a sentence that says where it stands and what is needed', () => {
    expect(checkMove(QUARTER_MACHINE, 'in_review', 'published')).toEqual({
      from: 'in_review',
      to: 'published',
      reason: 'The quarter is in review; only a signed-off quarter can be published.',
    });
    expect(moveAllowed(RUN_MACHINE, 'completed', 'cancelled')).toEqual({
      allowed: false,
      reason: 'The run is complete, which is final.',
    });
    expect(moveAllowed(IMPORT_MACHINE, 'committing', 'committing')).toEqual({
      allowed: false,
      reason: 'The file is already being loaded.',
    });
    expect(moveAllowed(RUN_MACHINE, 'queued', 'paused')).toEqual({
      allowed: false,
      reason: 'The run has no state “paused”.',
    });
    expect(moveAllowed(INQUIRY_MACHINE, 'open', 'answered')).toEqual({ allowed: true });
  });
});

describe('faultsOf', () => {
  const state = { is: 'somewhere', entry: 'nowhere' };
  const move = (from: string, to: string) => ({ from, to, by: ['service'] as const, reason: 'test' });
  const machine = (changes: Partial<StateMachine>): StateMachine => ({
    subject: 'The thing',
    initial: 'a',
    final: ['c'],
    states: { a: state, b: state, c: state },
    transitions: [move('a', 'b'), move('b', 'c')],
    ...changes,
  });

  it.each<[string, Partial<StateMachine>, string[]]>([
    ['a sound table', {}, []],
    ['an unknown state', { transitions: [move('a', 'b'), move('b', 'c'), move('b', 'x')] }, ['unknown state x']],
    ['an unreachable state', { transitions: [move('a', 'c'), move('b', 'c')] }, ['unreachable state b']],
    ['a dead end', { transitions: [move('a', 'b'), move('a', 'c')] }, ['dead end b']],
    [
      'a final state that is left',
      { transitions: [move('a', 'b'), move('b', 'c'), move('c', 'a')] },
      ['final state c is left'],
    ],
    [
      'a circle without an end',
      {
        states: { a: state, b: state, c: state, d: state },
        transitions: [move('a', 'b'), move('b', 'd'), move('d', 'b'), move('a', 'c')],
      },
      ['state b never ends', 'state d never ends'],
    ],
    [
      'a move that stands twice',
      { transitions: [move('a', 'b'), move('b', 'c'), move('a', 'b')] },
      ['move a → b stands twice'],
    ],
    [
      'a move that goes nowhere',
      { transitions: [move('a', 'b'), move('b', 'b'), move('b', 'c')] },
      ['move b → b goes nowhere'],
    ],
  ])('finds %s', (_, changes, faults) => {
    expect(faultsOf(machine(changes))).toEqual(faults);
  });
});
