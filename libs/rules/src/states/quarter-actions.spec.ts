import {
  HATS,
  quarterRoutes,
  QUARTER_STATES,
  type QuarterState,
  runRoutes,
  signOffRoutes,
  importRoutes,
} from '@quarterpoise/dto';
import { describe, expect, it } from 'vitest';
import { type QuarterAction, quarterActions, type QuarterSituation } from './quarter-actions.js';

const inReview: QuarterSituation = {
  state: 'in_review',
  hat: 'administrator',
  missing: [],
  goingRun: null,
  newestRunId: 'run-1',
  undecidedFlags: 0,
  untiedTotals: 0,
  secondPersonRefusal: null,
  signOff: null,
  hasPublication: false,
};
const approving: QuarterSituation = { ...inReview, hat: 'approver' };
const signed: QuarterSituation = { ...inReview, state: 'signed_off', signOff: { runId: 'run-1' } };

const refusal = (action: QuarterAction['action'], situation: QuarterSituation) =>
  quarterActions(situation).find((entry) => entry.action === action)?.reason;

const allowedActions = (situation: QuarterSituation) =>
  quarterActions(situation)
    .filter(({ allowed }) => allowed)
    .map(({ action }) => action);

describe('quarterActions', () => {
  it('lists every action of the contract once, with a reason just where it is refused', () => {
    const names = quarterRoutes.view.response.shape.actions.element.shape.action.options;
    for (const state of QUARTER_STATES) {
      for (const hat of HATS) {
        const actions = quarterActions({ ...inReview, state, hat });
        expect(actions.map(({ action }) => action)).toEqual(names);
        for (const { allowed, reason } of actions) expect(reason === null).toBe(allowed);
      }
    }
  });

  it('gives no role more than the routes do', () => {
    const routes = {
      import: importRoutes.upload,
      run: runRoutes.start,
      rehearse: runRoutes.start,
      'cancel-run': runRoutes.cancel,
      'sign-off': signOffRoutes.sign,
      publish: signOffRoutes.publish,
    };
    for (const hat of HATS) {
      for (const { action, reason } of quarterActions({ ...inReview, hat })) {
        const { access } = routes[action];
        const isOpen = access.kind === 'hats' && access.hats.includes(hat);
        expect(`${action} ${hat} ${reason?.startsWith('Only the plan’s') ?? false}`).toBe(
          `${action} ${hat} ${!isOpen}`,
        );
      }
    }
  });

  it.each<[QuarterState, string[]]>([
    ['collecting', ['import']],
    ['ready', ['import', 'run', 'rehearse']],
    ['computing', ['import', 'cancel-run']],
    ['in_review', ['import', 'run', 'rehearse']],
    ['signed_off', ['import', 'run', 'rehearse', 'publish']],
    ['published', ['rehearse']],
  ])('offers the administrator of a quarter that is %s: %j', (state, expected) => {
    const situation: QuarterSituation = {
      ...signed,
      state,
      missing: state === 'collecting' ? ['activity'] : [],
      goingRun: state === 'computing' ? { isRehearsal: false } : null,
    };
    expect(allowedActions(situation)).toEqual(expected);
  });

  it('says what is missing before a run', () => {
    const collecting: QuarterSituation = { ...inReview, state: 'collecting', missing: ['activity', 'balances'] };
    expect(refusal('run', collecting)).toBe('The quarter’s activity and balances files are not loaded yet.');
    expect(refusal('rehearse', { ...collecting, missing: ['balances'] })).toBe(
      'The quarter’s balances file is not loaded yet.',
    );
  });

  it('starts nothing beside a run that is going, and can cancel a rehearsal too', () => {
    const going: QuarterSituation = { ...inReview, goingRun: { isRehearsal: true } };
    expect(refusal('run', going)).toBe('A rehearsal is going; wait for it to end or cancel it.');
    expect(allowedActions(going)).toEqual(['import', 'cancel-run']);
  });

  it('lets a second person sign once flags are decided and totals tie', () => {
    expect(allowedActions(approving)).toEqual(['sign-off']);
    expect(refusal('sign-off', { ...approving, undecidedFlags: 3 })).toBe('3 flags are not decided yet.');
    expect(refusal('sign-off', { ...approving, untiedTotals: 1 })).toBe('One total does not tie.');
    expect(refusal('sign-off', { ...approving, secondPersonRefusal: 'You started this run.' })).toBe(
      'You started this run.',
    );
    expect(refusal('sign-off', { ...approving, state: 'ready' })).toBe(
      'The quarter is ready to run; only a quarter in review can be signed off.',
    );
    expect(refusal('sign-off', inReview)).toBe('Only the plan’s approver can sign off.');
  });

  it('publishes only what is signed off, from the newest run, and once', () => {
    expect(refusal('publish', inReview)).toBe('The quarter is in review; only a signed-off quarter can be published.');
    expect(refusal('publish', { ...signed, newestRunId: 'run-2' })).toMatch(/^The sign-off is not for the newest run/);
    expect(refusal('publish', { ...signed, hasPublication: true })).toBe('Publication is under way.');
    expect(refusal('publish', { ...signed, state: 'published', hasPublication: true })).toBe(
      'The quarter is already published.',
    );
  });
});
