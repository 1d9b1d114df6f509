import type { QuarterState } from '@quarterpoise/dto';
import type { StateMachine } from './state-machine.js';

/**
 * A quarter's life. New data never moves a quarter in review or signed off by itself: the page says that the figures are stale, and
 * a new run is what voids the review and the sign-off.
 */
export const QUARTER_MACHINE: StateMachine<QuarterState> = {
  subject: 'The quarter',
  initial: 'collecting',
  final: ['published'],
  states: {
    collecting: { is: 'still collecting data', entry: 'data is collected only before the first run' },
    ready: { is: 'ready to run', entry: 'it becomes ready when the quarter’s balances and activity are loaded' },
    computing: {
      is: 'being computed',
      entry: 'a run can start once the balances at the quarter’s end and the quarter’s activity are loaded',
    },
    in_review: { is: 'in review', entry: 'a review needs a completed run' },
    signed_off: { is: 'signed off', entry: 'only a quarter in review can be signed off' },
    published: { is: 'published', entry: 'only a signed-off quarter can be published' },
  },
  transitions: [
    {
      from: 'collecting',
      to: 'ready',
      by: ['service'],
      reason: 'A balances file that holds the closing date and an activity file of the quarter are committed.',
    },
    { from: 'ready', to: 'collecting', by: ['service'], reason: 'A file that the quarter needs was taken back out.' },
    { from: 'ready', to: 'computing', by: ['administrator'], reason: 'A run was started.' },
    { from: 'computing', to: 'in_review', by: ['service'], reason: 'The run is complete.' },
    { from: 'computing', to: 'ready', by: ['administrator', 'service'], reason: 'The run was cancelled or failed.' },
    { from: 'in_review', to: 'computing', by: ['administrator'], reason: 'A new run was started.' },
    { from: 'in_review', to: 'signed_off', by: ['approver'], reason: 'A second person signed the run off.' },
    {
      from: 'signed_off',
      to: 'computing',
      by: ['administrator'],
      reason: 'A new run was started, which voids the sign-off.',
    },
    { from: 'signed_off', to: 'published', by: ['service'], reason: 'The statements of the signed-off run are out.' },
  ],
};
