import { describe, expect, it } from 'vitest';
import { countingTheTool, countsOfPlaywright, countsOfVitest, sum } from './report.js';

const tests = (...statuses: string[]) => statuses.map((status) => ({ status }));

describe('counts of tests', () => {
  it('are those of all files', () => {
    const report = {
      numPassedTests: 3,
      testResults: [
        { status: 'passed', assertionResults: tests('passed', 'passed') },
        { status: 'failed', assertionResults: tests('passed', 'failed') },
      ],
    };
    expect(countsOfVitest(report)).toEqual({ passed: 3, failed: 1 });
  });

  it('hold a failure for a file that does not load', () => {
    const report = { numPassedTests: 0, testResults: [{ status: 'failed', assertionResults: [] }] };
    expect(countsOfVitest(report)).toEqual({ passed: 0, failed: 1 });
  });

  it('take a skipped test for a failed one', () => {
    const report = {
      numPassedTests: 1,
      testResults: [{ status: 'passed', assertionResults: tests('passed', 'skipped') }],
    };
    expect(countsOfVitest(report)).toEqual({ passed: 1, failed: 1 });
    const stats = { expected: 4, unexpected: 1, flaky: 1, skipped: 1 };
    expect(countsOfPlaywright({ stats, errors: [] })).toEqual({ passed: 4, failed: 3 });
  });

  it('hold a failure for a tool that wrote no report, failed without a failed test, or ran nothing', () => {
    expect(countingTheTool(null, 0)).toEqual({ passed: 0, failed: 1 });
    expect(countingTheTool({ passed: 9, failed: 0 }, 1)).toEqual({ passed: 9, failed: 1 });
    expect(countingTheTool({ passed: 0, failed: 0 }, 0)).toEqual({ passed: 0, failed: 1 });
    expect(countingTheTool({ passed: 9, failed: 2 }, 1)).toEqual({ passed: 9, failed: 2 });
    expect(countingTheTool({ passed: 9, failed: 0 }, 0)).toEqual({ passed: 9, failed: 0 });
  });

  it('are summed over the parts', () => {
    const parts = [
      { passed: 1, failed: 2 },
      { passed: 10, failed: 20 },
    ];
    expect(sum(parts)).toEqual({ passed: 11, failed: 22 });
    expect(sum([])).toEqual({ passed: 0, failed: 0 });
  });
});
