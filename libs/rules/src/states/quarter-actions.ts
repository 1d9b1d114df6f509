import type { Hat, ImportKind, QuarterState, QuarterView } from '@quarterpoise/dto';
import { moveAllowed } from './state-machine.js';
import { QUARTER_MACHINE } from './quarter.states.js';

export type QuarterAction = QuarterView['actions'][number];

/** What decides who may do what on a quarter's page. */
export interface QuarterSituation {
  readonly state: QuarterState;
  readonly hat: Hat;
  /** Files that the quarter needs and does not have. */
  readonly missing: readonly ImportKind[];
  /** A run of this quarter that is queued or computing, a rehearsal too. */
  readonly goingRun: { readonly isRehearsal: boolean } | null;
  /** The newest completed run that is no rehearsal. */
  readonly newestRunId: string | null;
  /** Flags of the newest run that need a decision and have none. */
  readonly undecidedFlags: number;
  /** Totals of the newest run that were compared and differ. */
  readonly untiedTotals: number;
  /** Why the reader may not be the second person of the newest run; null when nothing speaks against it. */
  readonly secondPersonRefusal: string | null;
  readonly signOff: { readonly runId: string } | null;
  readonly hasPublication: boolean;
}

type ActionName = QuarterAction['action'];

/** Who may do what at all, and the word for it in a sentence. */
const ACTIONS: Readonly<Record<ActionName, { hats: readonly Hat[]; deed: string }>> = {
  import: { hats: ['administrator'], deed: 'load files' },
  run: { hats: ['administrator'], deed: 'start a run' },
  rehearse: { hats: ['administrator'], deed: 'start a rehearsal' },
  'cancel-run': { hats: ['administrator'], deed: 'cancel a run' },
  'sign-off': { hats: ['approver'], deed: 'sign off' },
  publish: { hats: ['administrator', 'approver'], deed: 'publish' },
};

/** The first thing that stands in the way, or null: each takes the situation of the quarter, not the reader. */
const HINDRANCES: Readonly<Record<ActionName, (situation: QuarterSituation) => string | null>> = {
  import: ({ state }) =>
    state === 'published' ? 'The quarter is published; load files into the quarter that is open now.' : null,
  run: (situation) => goingRunOf(situation) ?? missingOf(situation) ?? moveTo('computing', situation),
  rehearse: (situation) => goingRunOf(situation) ?? missingOf(situation),
  'cancel-run': ({ goingRun }) => (goingRun === null ? 'No run is going.' : null),
  'sign-off': (situation) =>
    moveTo('signed_off', situation) ??
    (situation.newestRunId === null ? 'There is no completed run to sign off.' : null) ??
    undecidedOf(situation) ??
    untiedOf(situation) ??
    situation.secondPersonRefusal,
  publish: (situation) =>
    (situation.hasPublication && situation.state === 'signed_off' ? 'Publication is under way.' : null) ??
    moveTo('published', situation) ??
    (situation.signOff === null || situation.signOff.runId !== situation.newestRunId
      ? 'The sign-off is not for the newest run; the newest run has to be signed off.'
      : null),
};

/** What the reader may do now; what they may not do carries the reason in a sentence. */
export function quarterActions(situation: QuarterSituation): QuarterAction[] {
  return (Object.keys(ACTIONS) as ActionName[]).map((action) => {
    const reason = roleRefusal(action, situation.hat) ?? HINDRANCES[action](situation);
    return { action, allowed: reason === null, reason };
  });
}

function roleRefusal(action: ActionName, hat: Hat): string | null {
  const { hats, deed } = ACTIONS[action];
  return hats.includes(hat) ? null : `Only the plan’s ${hats.join(' or ')} can ${deed}.`;
}

function goingRunOf({ goingRun }: QuarterSituation): string | null {
  if (goingRun === null) return null;
  return `A ${goingRun.isRehearsal ? 'rehearsal' : 'run'} is going; wait for it to end or cancel it.`;
}

function missingOf({ missing }: QuarterSituation): string | null {
  if (missing.length === 0) return null;
  const files = missing.join(' and ');
  return `The quarter’s ${files} ${missing.length > 1 ? 'files are' : 'file is'} not loaded yet.`;
}

function undecidedOf({ undecidedFlags }: QuarterSituation): string | null {
  if (undecidedFlags === 0) return null;
  return undecidedFlags === 1 ? 'One flag is not decided yet.' : `${undecidedFlags} flags are not decided yet.`;
}

function untiedOf({ untiedTotals }: QuarterSituation): string | null {
  if (untiedTotals === 0) return null;
  return untiedTotals === 1 ? 'One total does not tie.' : `${untiedTotals} totals do not tie.`;
}

function moveTo(to: QuarterState, { state }: QuarterSituation): string | null {
  const answer = moveAllowed(QUARTER_MACHINE, state, to);
  return answer.allowed ? null : answer.reason;
}
