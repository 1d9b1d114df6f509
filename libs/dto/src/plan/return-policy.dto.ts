import { z } from 'zod';

export const WINDOW_CODES = [
  'quarter',
  'year_to_date',
  'one_year',
  'three_years',
  'five_years',
  'ten_years',
  'since_joining',
] as const;
export const windowCode = z.enum(WINDOW_CODES);
export type WindowCode = z.infer<typeof windowCode>;

/** Thresholds of the result checks, each in the unit that its name says. */
export const checkThresholds = z.object({
  /** Gap between first estimate and solved rate, in hundredths of a percentage point. */
  estimateGapBasisPoints: z.int().min(1).default(50),
  /** Quarter's return beyond this size, in percent. */
  extremeReturnPercent: z.number().positive().default(25),
  /** Robust z-score (median and MAD) of the quarter's return among the plan's accounts. */
  outlierScore: z.number().positive().default(6),
  /** How many days at the quarter's end count as its last ones, the closing day among them. */
  lastDays: z.int().min(1).max(31).default(3),
  /** Flow on one of them beyond this share of the larger of opening and closing balance, in percent. */
  lastDaysFlowPercent: z.number().positive().default(25),
});

/** What each kind of activity means for the return, versioned by quarter. The defaults are the trade's usual choices. */
export const returnPolicy = z.object({
  flowTiming: z.enum(['start', 'mid', 'end']).default('end'),
  flowDate: z.enum(['effective', 'posting']).default('effective'),
  lateEffective: z.enum(['posting', 'effective']).default('posting'),
  fees: z.enum(['net', 'gross']).default('net'),
  loans: z.enum(['outside', 'inside']).default('outside'),
  forfeitures: z.enum(['outflow', 'loss']).default('outflow'),
  adjustments: z.enum(['earnings', 'flow']).default('earnings'),
  yearToDate: z.enum(['calendar', 'plan_year']).default('calendar'),
  planYearStartMonth: z.int().min(1).max(12).default(1),
  emptiedAndRefilled: z.enum(['whole', 'latest_spell']).default('whole'),
  wholeYears: z.enum(['anniversary', 'actual_365']).default('anniversary'),
  notComputed: z.enum(['hide', 'estimate']).default('hide'),
  windows: z
    .array(windowCode)
    .min(1)
    .default(['quarter', 'year_to_date', 'one_year', 'three_years', 'five_years', 'since_joining']),
  smallestAverageCapitalCents: z.int().min(0).default(2500),
  decimals: z.union([z.literal(1), z.literal(2)]).default(2),
  checks: checkThresholds.prefault({}),
});
export type ReturnPolicyOptions = z.infer<typeof returnPolicy>;
export type CheckThresholds = z.infer<typeof checkThresholds>;
