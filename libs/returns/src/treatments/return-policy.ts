import type { FlowTiming } from '../window/window.js';

/** The windows that a statement may show. */
export const WINDOW_CODES = [
  'quarter',
  'year_to_date',
  'one_year',
  'three_years',
  'five_years',
  'ten_years',
  'since_joining',
] as const;
export type WindowCode = (typeof WINDOW_CODES)[number];

/** What each kind of activity means for the return; a plan's choice, versioned by quarter. */
export interface ReturnPolicy {
  readonly flowTiming: FlowTiming;
  /** Which of its two dates a flow counts on. */
  readonly flowDate: 'effective' | 'posting';
  /** What holds for an effective date before a published close and a posting date after it. */
  readonly lateEffective: 'posting' | 'effective';
  /** Net: fees lower the return. Gross: a fee is an outside outflow. */
  readonly fees: 'net' | 'gross';
  /** Outside: issue is an outflow, repayment an inflow. Inside: the note is in the balance and interest is earnings. */
  readonly loans: 'outside' | 'inside';
  readonly forfeitures: 'outflow' | 'loss';
  readonly adjustments: 'earnings' | 'flow';
  readonly yearToDate: 'calendar' | 'plan_year';
  readonly planYearStartMonth: number;
  readonly emptiedAndRefilled: 'whole' | 'latest_spell';
  readonly wholeYears: 'anniversary' | 'actual_365';
  readonly notComputed: 'hide' | 'estimate';
  readonly windows: readonly WindowCode[];
  readonly smallestAverageCapitalCents: number;
  readonly decimals: 1 | 2;
}

/** The trade's usual choices (common practice, no single source). */
export const DEFAULT_RETURN_POLICY: ReturnPolicy = {
  flowTiming: 'end',
  flowDate: 'effective',
  lateEffective: 'posting',
  fees: 'net',
  loans: 'outside',
  forfeitures: 'outflow',
  adjustments: 'earnings',
  yearToDate: 'calendar',
  planYearStartMonth: 1,
  emptiedAndRefilled: 'whole',
  wholeYears: 'anniversary',
  notComputed: 'hide',
  windows: ['quarter', 'year_to_date', 'one_year', 'three_years', 'five_years', 'since_joining'],
  smallestAverageCapitalCents: 2500,
  decimals: 2,
};
