export interface Counts {
  readonly passed: number;
  readonly failed: number;
}

export const NOTHING: Counts = { passed: 0, failed: 0 };

export const sum = (all: readonly Counts[]): Counts =>
  all.reduce((total, one) => ({ passed: total.passed + one.passed, failed: total.failed + one.failed }), NOTHING);

/** The part of Vitest's JSON report that is counted. */
export interface VitestReport {
  readonly numPassedTests: number;
  readonly testResults: readonly {
    readonly status: string;
    readonly assertionResults: readonly { readonly status: string }[];
  }[];
}

/** A test counts as failed unless it passed; a file that could not even be loaded counts as one failed test. */
export function countsOfVitest(report: VitestReport): Counts {
  const failed = report.testResults.map((file) => {
    const notPassed = file.assertionResults.filter((test) => test.status !== 'passed').length;
    return file.status === 'failed' ? Math.max(1, notPassed) : notPassed;
  });
  return { passed: report.numPassedTests, failed: failed.reduce((total, count) => total + count, 0) };
}

/** The part of Playwright's JSON report that is counted. */
export interface PlaywrightReport {
  readonly stats: {
    readonly expected: number;
    readonly unexpected: number;
    readonly flaky: number;
    readonly skipped: number;
  };
  readonly errors: readonly unknown[];
}

/** What was skipped or passed only at a second try has not been shown to work. */
export function countsOfPlaywright({ stats, errors }: PlaywrightReport): Counts {
  return { passed: stats.expected, failed: stats.unexpected + stats.flaky + stats.skipped + errors.length };
}

/** A tool that ended badly without a failed test to show for it, or that ran nothing at all, is itself a failure. */
export function countingTheTool(counts: Counts | null, exitCode: number): Counts {
  if (!counts) return { passed: 0, failed: 1 };
  const isUnexplained = counts.failed === 0 && (exitCode !== 0 || counts.passed === 0);
  return isUnexplained ? { ...counts, failed: 1 } : counts;
}
