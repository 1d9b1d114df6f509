import type { CheckThresholds, CivilDate, ReturnPolicyOptions } from '@quarterpoise/dto';
import type { AccountResult } from '@quarterpoise/returns';

/** Blocking: not to be published as it is. Review: somebody decides. Notice: good to know. */
export const SEVERITIES = ['blocking', 'review', 'notice'] as const;
export type Severity = (typeof SEVERITIES)[number];

/** Values for the sentence of a code; a name tells the unit: `…Cents`, `…Pct`, `…On`. */
export type Figures = Readonly<Record<string, string | number | null>>;

/** What a check has found. Its sentence is put together where it is read, from the code and the figures. */
export interface CheckedFlag {
  readonly code: string;
  readonly severity: Severity;
  readonly figures: Figures;
}

/** Everything that the checks of one account look at. */
export interface AccountCheckInput {
  readonly result: AccountResult;
  readonly opensOn: CivilDate;
  readonly closesOn: CivilDate;
  /** Closing balance of the statement last published for the day that this quarter opens on; null when there is none. */
  readonly publishedClosingCents: number | null;
  readonly policy: Pick<ReturnPolicyOptions, 'smallestAverageCapitalCents' | 'checks'>;
}

/** A check that needs one account only: null when there is nothing to tell, else the figures of its sentence. */
export interface AccountCheck {
  readonly code: string;
  readonly severity: Severity;
  /** The plan's thresholds that it looks at. */
  readonly thresholds: readonly (keyof CheckThresholds | 'smallestAverageCapitalCents')[];
  readonly check: (input: AccountCheckInput) => Figures | null;
}

/** A printed percentage in hundredths of a percent: `-0.03` → −3. */
export const basisPoints = (percent: string): number => Math.round(Number(percent) * 100);
