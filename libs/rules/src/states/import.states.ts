import type { ImportState } from '@quarterpoise/dto';
import type { StateMachine } from './state-machine.js';

/**
 * An uploaded file. `unchanged` can come at each step that looks, since the same file may have been loaded meanwhile; a commit
 * checks everything again and can therefore still refuse.
 */
export const IMPORT_MACHINE: StateMachine<ImportState> = {
  subject: 'The file',
  initial: 'received',
  final: ['refused', 'committed', 'discarded', 'unchanged'],
  states: {
    received: { is: 'waiting to be checked', entry: 'a file is received once; upload it again' },
    checking: { is: 'being checked', entry: 'a file is checked once, after its upload' },
    refused: { is: 'refused', entry: 'a file can be refused only while it is checked or loaded' },
    preview: { is: 'checked and waiting for a decision', entry: 'the preview comes from the check' },
    committing: { is: 'being loaded', entry: 'only a file that was checked without errors can be loaded' },
    committed: { is: 'loaded', entry: 'only a file that is being loaded can end as loaded' },
    discarded: { is: 'discarded', entry: 'only a checked file that is not loaded can be discarded' },
    unchanged: {
      is: 'known: the same file was loaded before',
      entry: 'whether a file is known is found while it is checked or loaded',
    },
  },
  transitions: [
    { from: 'received', to: 'checking', by: ['service'], reason: 'The upload is complete.' },
    { from: 'received', to: 'unchanged', by: ['service'], reason: 'The same file was loaded before.' },
    { from: 'checking', to: 'refused', by: ['service'], reason: 'The file, its rows or its control totals are wrong.' },
    { from: 'checking', to: 'preview', by: ['service'], reason: 'The file can be loaded.' },
    { from: 'checking', to: 'unchanged', by: ['service'], reason: 'The same file was loaded before.' },
    { from: 'preview', to: 'committing', by: ['administrator'], reason: 'The administrator chose to load it.' },
    { from: 'preview', to: 'discarded', by: ['administrator'], reason: 'The administrator put it away.' },
    { from: 'committing', to: 'committed', by: ['service'], reason: 'Every row is in the ledger.' },
    {
      from: 'committing',
      to: 'refused',
      by: ['service'],
      reason: 'What was loaded since the check makes rows of it wrong.',
    },
    { from: 'committing', to: 'unchanged', by: ['service'], reason: 'The same file was loaded since the check.' },
  ],
};
