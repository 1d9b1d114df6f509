import type { QuarterState, QuarterView } from '@quarterpoise/dto';

export const STEPS = ['collect', 'check', 'run', 'review', 'sign-off', 'publish'] as const;
export type Step = (typeof STEPS)[number];
export type StepStanding = 'done' | 'current' | 'later';

const CURRENT: Record<QuarterState, Step | null> = {
  collecting: 'collect',
  ready: 'run',
  computing: 'run',
  in_review: 'review',
  signed_off: 'publish',
  published: null,
};

/** The step that is to be worked on now; null when the quarter is published. Review that has nothing left to decide passes on to sign-off. */
export function currentStep(quarter: Pick<QuarterView, 'state' | 'findings' | 'currentRun'>): Step | null {
  const step = CURRENT[quarter.state];
  const isBlocked = quarter.findings.some(
    (finding) => finding.severity === 'blocking' && finding.code !== 'file-missing',
  );
  if (quarter.state === 'ready' && isBlocked) return 'check';
  if (step === 'review' && quarter.currentRun?.undecidedFlagCount === 0) return 'sign-off';
  return step;
}

export function standingOf(step: Step, current: Step | null): StepStanding {
  if (current === null) return 'done';
  const distance = STEPS.indexOf(step) - STEPS.indexOf(current);
  return distance < 0 ? 'done' : distance === 0 ? 'current' : 'later';
}
