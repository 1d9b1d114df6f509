import type { RunState } from '@quarterpoise/dto';
import type { StateMachine } from './state-machine.js';

/** A run, rehearsals too; another try is always a new run. */
export const RUN_MACHINE: StateMachine<RunState> = {
  subject: 'The run',
  initial: 'queued',
  final: ['completed', 'failed', 'cancelled'],
  states: {
    queued: { is: 'waiting to start', entry: 'a run waits only before it starts' },
    computing: { is: 'computing', entry: 'only a run that waits can start' },
    completed: { is: 'complete', entry: 'only a run that is computing can complete' },
    failed: { is: 'failed', entry: 'only a run that is going can fail' },
    cancelled: { is: 'cancelled', entry: 'only a run that is going can be cancelled' },
  },
  transitions: [
    { from: 'queued', to: 'computing', by: ['service'], reason: 'A worker took the first accounts.' },
    { from: 'queued', to: 'cancelled', by: ['administrator'], reason: 'It was cancelled before it started.' },
    { from: 'queued', to: 'failed', by: ['service'], reason: 'It could not be started.' },
    {
      from: 'computing',
      to: 'completed',
      by: ['service'],
      reason: 'All accounts are done and the totals are struck.',
    },
    { from: 'computing', to: 'failed', by: ['service'], reason: 'The service could not finish it.' },
    { from: 'computing', to: 'cancelled', by: ['administrator'], reason: 'It was cancelled.' },
  ],
};
