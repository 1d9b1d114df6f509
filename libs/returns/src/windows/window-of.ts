import type { WindowCode } from '../treatments/return-policy.js';
import type { Flow, WindowInput } from '../window/window.js';
import type { ResultData } from './account.js';

/**
 * The question that a stored window answers, as the solve command takes it.
 *
 * Domain: result data, or a statement's with its policy's flow timing.
 * Returns: the window with its flows in (openedOn, closedOn]; null when the data has no such window, or its opening or closing
 * balance is not known. Solving it gives the stored answer, figure for figure, under the same engine version.
 * Throws: never. Complexity: linear in the flows.
 * Example: `solveWindow(windowOf(data, 'one_year')!)`.
 */
export function windowOf(
  data: Pick<ResultData, 'flowTiming' | 'windows' | 'flows'>,
  code: WindowCode,
): WindowInput | null {
  const window = data.windows.find((candidate) => candidate.code === code);
  if (window === undefined || window.openingCents === null || window.closingCents === null) return null;
  const flows: Flow[] = [];
  data.flows.dates.forEach((date, index) => {
    // Civil dates in this form sort as text.
    if (date > window.openedOn && date <= window.closedOn) flows.push({ date, cents: data.flows.cents[index]! });
  });
  return {
    openedOn: window.openedOn,
    closedOn: window.closedOn,
    openingCents: window.openingCents,
    closingCents: window.closingCents,
    flows,
    timing: data.flowTiming,
    ...(window.years === null ? {} : { years: window.years }),
  };
}
