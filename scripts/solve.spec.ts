import { spawn } from 'node:child_process';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';

const root = join(__dirname, '..');
const FIELDS = [
  'id',
  'status',
  'periodReturnPct',
  'annualReturnPct',
  'firstEstimatePct',
  'factorLow',
  'factorHigh',
  'roots',
  'spanDays',
  'iterations',
  'reason',
];
const example =
  '{"id":"a1","openedOn":"2026-06-30","closedOn":"2026-09-30","openingCents":1800000,"closingCents":1868920,"flows":[{"date":"2026-07-10","cents":25000}],"timing":"end"}';

type Line = Record<string, unknown>;

/** Runs the command as a person would and gives back what it wrote. */
async function solve(input: string | Buffer): Promise<{ lines: Line[]; complaints: string; code: number | null }> {
  const child = spawn(process.execPath, ['--import', 'tsx', 'scripts/solve.ts'], { cwd: root });
  let output = '';
  let complaints = '';
  child.stdout.setEncoding('utf8').on('data', (text: string) => (output += text));
  child.stderr.setEncoding('utf8').on('data', (text: string) => (complaints += text));
  const closed = new Promise<number | null>((resolve) => child.on('close', resolve));
  child.stdin.end(input);
  const code = await closed;
  const lines = output.split('\n').filter((line) => line !== '');
  return { lines: lines.map((line) => JSON.parse(line) as Line), complaints, code };
}

describe('npm run solve', { timeout: 60_000 }, () => {
  it('answers every line in order with every field in order, and goes on after invalid ones', async () => {
    const { lines, complaints, code } = await solve(
      [
        `\uFEFF${example}\r`,
        '',
        'no JSON',
        '{"id":"broken","openedOn":',
        '[1]',
        example.replace('"a1"', '7').replace('2026-07-10', '2026-06-30'),
        example.replace('"id":"a1",', ''),
        example.replace('1868920', '0').replace(/"flows":\[.*\]/, '"flows":[]'),
      ].join('\n'),
    );
    expect({ complaints, code }).toEqual({ complaints: '', code: 0 });
    expect(lines.every((line) => Object.keys(line).join() === FIELDS.join())).toBe(true);
    expect(lines.map(({ id, status }) => [id, status])).toEqual([
      ['a1', 'solved'],
      [null, 'invalid'],
      ['broken', 'invalid'],
      [null, 'invalid'],
      [7, 'invalid'],
      [null, 'solved'],
      ['a1', 'total-loss'],
    ]);
    expect(lines[0]).toMatchObject({
      periodReturnPct: '2.41',
      annualReturnPct: null,
      firstEstimatePct: '2.41',
      spanDays: 92,
      reason: null,
    });
    expect(lines[1]!['reason']).toBe('line is not JSON; give one JSON object a line');
    expect(lines[3]!['reason']).toBe('window is [1]; give an object');
    expect(lines[4]).toMatchObject({
      roots: [],
      spanDays: null,
      reason: expect.stringMatching(/^flows\[0\]\.date is "2026-06-30"; /),
    });
  });

  it('keeps the order of thousands of lines, whole across chunks', async () => {
    const count = 5000;
    const { lines } = await solve(
      Array.from({ length: count }, (_, index) => example.replace('"a1"', `"é${index}"`)).join('\n'),
    );
    expect(lines.map(({ id }) => id)).toEqual(Array.from({ length: count }, (_, index) => `é${index}`));
  });

  it('answers a slow sender without waiting for the end', async () => {
    const child = spawn(process.execPath, ['--import', 'tsx', 'scripts/solve.ts'], { cwd: root });
    child.stdin.write(`${example}\n`);
    const first = await new Promise<string>((resolve) => child.stdout.setEncoding('utf8').once('data', resolve));
    expect((JSON.parse(first) as Line)['id']).toBe('a1');
    const closed = new Promise<number | null>((resolve) => child.on('close', resolve));
    child.stdin.end();
    expect(await closed).toBe(0);
  });

  it('ends quietly when its reader stops early', async () => {
    const child = spawn(process.execPath, ['--import', 'tsx', 'scripts/solve.ts'], { cwd: root });
    let complaints = '';
    child.stderr.setEncoding('utf8').on('data', (text: string) => (complaints += text));
    // The sender's pipe breaks too when the command ends; that is what is asked for here.
    child.stdin.on('error', () => undefined);
    child.stdin.write(`${example}\n`.repeat(5000));
    await new Promise((resolve) => child.stdout.once('data', resolve));
    const closed = new Promise<number | null>((resolve) => child.on('close', resolve));
    child.stdout.destroy();
    child.stdin.end(`${example}\n`.repeat(20000));
    expect({ code: await closed, complaints }).toEqual({ code: 0, complaints: '' });
  });
});
