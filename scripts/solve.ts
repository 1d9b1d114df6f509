/**
 * Solves windows, one JSON object a line, from standard input to standard output: `npm run --silent solve < windows.jsonl`.
 * A line that is no valid window is answered with status `invalid` and the reason; the rest goes on. Blank lines are passed over.
 */
import { once } from 'node:events';
import { type Answer, InvalidWindow, solveWindow, toAnswer, type WindowInput } from '../libs/returns/src/index.js';

type Identifier = string | number | null;
type Line = { id: Identifier } & Omit<Answer, 'status'> & { status: Answer['status'] | 'invalid' };

function lineOf(id: Identifier, { status, ...rest }: Omit<Line, 'id'>): Line {
  const { periodReturnPct, annualReturnPct, firstEstimatePct, factorLow, factorHigh } = rest;
  const { roots, spanDays, iterations, reason } = rest;
  return {
    id,
    status,
    periodReturnPct,
    annualReturnPct,
    firstEstimatePct,
    factorLow,
    factorHigh,
    roots,
    spanDays,
    iterations,
    reason,
  };
}

const invalid = (id: Identifier, reason: string): Line =>
  lineOf(id, {
    status: 'invalid',
    periodReturnPct: null,
    annualReturnPct: null,
    firstEstimatePct: null,
    factorLow: null,
    factorHigh: null,
    roots: [],
    spanDays: null,
    iterations: null,
    reason,
  });

function idOf(value: unknown): Identifier {
  if (typeof value !== 'object' || value === null) return null;
  const { id } = value as { id?: unknown };
  return typeof id === 'string' || typeof id === 'number' ? id : null;
}

const ID_WITHIN = /"id"\s*:\s*("(?:[^"\\]|\\.)*"|-?\d+(?:\.\d+)?)/;

/** The id of a line that is broken elsewhere, so that its sender can find it. */
function idWithin(text: string): Identifier {
  const found = ID_WITHIN.exec(text)?.[1];
  try {
    return found === undefined ? null : idOf({ id: JSON.parse(found) as unknown });
  } catch {
    return null;
  }
}

function answerLine(text: string): Line {
  let value: unknown;
  try {
    value = JSON.parse(text);
  } catch {
    return invalid(idWithin(text), 'line is not JSON; give one JSON object a line');
  }
  const id = idOf(value);
  try {
    return lineOf(id, toAnswer(solveWindow(value as WindowInput)));
  } catch (error) {
    if (error instanceof InvalidWindow) return invalid(id, error.message);
    throw error;
  }
}

async function main(): Promise<void> {
  // Whoever reads us may stop early (`| head`): that is no failure.
  process.stdout.on('error', (error: NodeJS.ErrnoException) => {
    if (error.code === 'EPIPE') process.exit(0);
    process.stderr.write(`Cannot write the answers: ${error.message}\n`);
    process.exit(1);
  });
  process.stdin.setEncoding('utf8');
  let rest = '';
  for await (const chunk of process.stdin as AsyncIterable<string>) {
    const lines = `${rest}${chunk}`.split('\n');
    rest = lines.pop() ?? '';
    // One write per chunk read: few system calls on files, and no answer is held back from a slow sender.
    await write(lines);
  }
  await write([rest]);
}

async function write(lines: readonly string[]): Promise<void> {
  let answers = '';
  for (const line of lines) {
    // A byte order mark may head the first line, a carriage return end every one.
    const text = line.replace(/^\uFEFF/, '').trim();
    if (text !== '') answers += `${JSON.stringify(answerLine(text))}\n`;
  }
  if (answers !== '' && !process.stdout.write(answers)) await once(process.stdout, 'drain');
}

main().catch((error: unknown) => {
  process.stderr.write(`Solving stopped: ${error instanceof Error ? error.message : String(error)}\n`);
  process.exit(1);
});
