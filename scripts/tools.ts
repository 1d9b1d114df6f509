import { spawn } from 'node:child_process';
import { inProject, PROJECT_ROOT } from './project-root.js';

export interface ToolOutcome {
  readonly code: number;
  readonly output: string;
}

/** Runs a program of node_modules in the project's folder (or another) and gathers what it says. Never rejects. */
export function runTool(name: string, args: readonly string[], options: { cwd?: string } = {}): Promise<ToolOutcome> {
  return new Promise((resolve) => {
    const child = spawn(inProject('node_modules/.bin', name), args, {
      cwd: options.cwd ?? PROJECT_ROOT,
      stdio: ['ignore', 'pipe', 'pipe'],
    });
    const chunks: Buffer[] = [];
    child.stdout.on('data', (chunk: Buffer) => chunks.push(chunk));
    child.stderr.on('data', (chunk: Buffer) => chunks.push(chunk));
    child.once('error', (error) => resolve({ code: 1, output: error.message }));
    child.once('close', (code) => resolve({ code: code ?? 1, output: Buffer.concat(chunks).toString('utf8') }));
  });
}

/** Works through the list, two at a time: as many as the smallest machine that we count on has processors. */
export async function twoAtATime<T, R>(items: readonly T[], work: (item: T) => Promise<R>): Promise<R[]> {
  const results: R[] = [];
  const queue = items.entries();
  const lane = async () => {
    for (const [index, item] of queue) results[index] = await work(item);
  };
  await Promise.all([lane(), lane()]);
  return results;
}
