import type { InquiryState } from '@quarterpoise/dto';
import type { StateMachine } from './state-machine.js';

/** A participant's question, from asking to closing; handed over while the sponsor looks at the data. */
export const INQUIRY_MACHINE: StateMachine<InquiryState> = {
  subject: 'The inquiry',
  initial: 'open',
  final: ['closed'],
  states: {
    open: { is: 'open', entry: 'only an inquiry that was handed over can come back' },
    answered: { is: 'answered', entry: 'only an open inquiry can be answered' },
    handed_over: { is: 'with the sponsor', entry: 'only an open inquiry can be handed over' },
    closed: { is: 'closed', entry: 'only an answered inquiry can be closed' },
  },
  transitions: [
    { from: 'open', to: 'answered', by: ['support'], reason: 'Support replied.' },
    { from: 'open', to: 'handed_over', by: ['support'], reason: 'Support asks the sponsor about the data.' },
    { from: 'handed_over', to: 'open', by: ['administrator'], reason: 'The sponsor answered the data question.' },
    {
      from: 'answered',
      to: 'closed',
      by: ['participant', 'support', 'service'],
      reason: 'The question is settled.',
    },
  ],
};
