export { ENGINE_VERSION } from './engine-version.js';
export { addYears, dayNumber, isQuarterEnd, isoDate, readDay } from './window/civil-date.js';
export { FLOW_TIMINGS, InvalidWindow, readWindow } from './window/window.js';
export type { Flow, FlowTiming, WindowInput } from './window/window.js';
export { OUTCOME_REASONS, toAnswer } from './solve/outcome.js';
export type { Answer, Outcome, OutcomeReason, OutcomeStatus } from './solve/outcome.js';
export { solveWindow } from './solve/solve-window.js';
export { ACTIVITY_KINDS } from './treatments/activity-kinds.js';
export type { ActivityKind } from './treatments/activity-kinds.js';
export { DEFAULT_RETURN_POLICY, WINDOW_CODES } from './treatments/return-policy.js';
export type { ReturnPolicy, WindowCode } from './treatments/return-policy.js';
export { UNAVAILABLE_REASONS } from './windows/account.js';
export type {
  AccountContext,
  AccountHistory,
  AccountResult,
  BalanceColumns,
  Movements,
  PublishedClose,
  ResultData,
  ResultWindow,
  UnavailableReason,
} from './windows/account.js';
export { computeAccount } from './windows/compute-account.js';
export { windowOf } from './windows/window-of.js';
export { treatmentsOf } from './treatments/treatments.js';
export type { MovementLine, Treatment } from './treatments/treatments.js';
export { derive, workingOf } from './working/derive.js';
export type { Derivation, Working, WorkingStep } from './working/derive.js';
