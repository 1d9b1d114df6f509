import { Decimal } from 'decimal.js';
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { solveWindow, toAnswer, type WindowInput } from '../../src/index.js';

interface Vector extends WindowInput {
  readonly id: string;
  readonly expected: {
    readonly status: string;
    readonly spanDays: number;
    readonly roots?: readonly string[];
    readonly periodReturnPct?: string;
    readonly annualReturnPct?: string | null;
  };
}

// Answers found at 60 decimal digits by a solver that proves how many roots there are.
const vectors = readFileSync(join(__dirname, 'windows.jsonl'), 'utf8')
  .trim()
  .split('\n')
  .map((line) => JSON.parse(line) as Vector);
const families = new Map<string, Vector[]>();
for (const vector of vectors) {
  const family = vector.id.split('/')[0]!;
  families.set(family, [...(families.get(family) ?? []), vector]);
}
const Wide = Decimal.clone({ precision: 60, maxE: 9e15, minE: -9e15 });

describe('windows with proven answers', () => {
  it('are 954', () => {
    expect(vectors.length).toBe(954);
  });

  it.each([...families])('%s', (_family, members) => {
    for (const { id, expected, ...window } of members) {
      const answer = toAnswer(solveWindow(window));
      expect({ id, ...answer }).toMatchObject({
        id,
        status: expected.status,
        spanDays: expected.spanDays,
        ...(expected.periodReturnPct === undefined ? {} : { periodReturnPct: expected.periodReturnPct }),
        ...(expected.annualReturnPct === undefined ? {} : { annualReturnPct: expected.annualReturnPct }),
      });
      const roots = expected.roots ?? [];
      expect(answer.roots.length, id).toBe(roots.length);
      roots.forEach((root, index) => {
        const error = new Wide(answer.roots[index]!).div(root).minus(1).abs().toNumber();
        expect(error, `${id}, root ${index}`).toBeLessThan(1e-17);
      });
    }
  });
});
