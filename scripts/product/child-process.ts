import { spawn } from 'node:child_process';
import { closeSync, openSync, readFileSync } from 'node:fs';
import { PROJECT_ROOT } from '../project-root.js';
import { stopProcess } from '../services/process-identity.js';
import type { RunningService } from '../services/running-service.js';
import type { Environment } from './product-environment.js';

interface ChildOptions {
  readonly name: string;
  /** Arguments of Node.js: the program and its own. */
  readonly args: readonly string[];
  readonly environment: Environment;
  /** Takes what the program says. */
  readonly logFile: string;
}

/** Time to finish what is under way before a program is ended the hard way. */
const STOP_STEPS = [
  ['SIGTERM', 20_000],
  ['SIGKILL', 5_000],
] as const;

/** Starts a program of the product that runs until it is stopped. */
export function startChild(options: ChildOptions): RunningService {
  const log = openSync(options.logFile, 'w', 0o600);
  const child = spawn(process.execPath, options.args, {
    cwd: PROJECT_ROOT,
    env: options.environment,
    // a process group of its own: Ctrl-C in the terminal reaches the launcher, which stops all in order
    detached: true,
    stdio: ['ignore', log, log],
  });
  closeSync(log);
  const exited = new Promise<string>((resolve) => {
    child.once('error', (error) => resolve(error.message));
    child.once('exit', () => resolve(lastWords(options.logFile)));
  });
  const { pid } = child;
  return {
    name: options.name,
    pid: pid ?? 0,
    exited,
    stop: () => (pid === undefined ? Promise.resolve() : stopProcess(pid, STOP_STEPS)),
  };
}

/**
 * Runs a program of the product to its end.
 * @throws Error with what it said last when it fails
 */
export async function runChild(options: ChildOptions): Promise<void> {
  const log = openSync(options.logFile, 'w', 0o600);
  const child = spawn(process.execPath, options.args, {
    cwd: PROJECT_ROOT,
    env: options.environment,
    stdio: ['ignore', log, log],
  });
  closeSync(log);
  const code = await new Promise<number>((resolve) => {
    child.once('error', () => resolve(1));
    child.once('exit', (status) => resolve(status ?? 1));
  });
  if (code !== 0)
    throw new Error(`${options.name} failed: ${lastWords(options.logFile)} (all of it: ${options.logFile})`);
}

/** The line that names the error, if one does; otherwise the last one. Lines of the structured log give their message. */
export function lastWords(logFile: string): string {
  const lines = readFileSync(logFile, 'utf8')
    .split('\n')
    .filter((line) => line.trim() !== '');
  const line = lines.findLast((one) => /^\w*Error\b|"level":(50|60)/.test(one)) ?? lines.at(-1) ?? 'it said nothing';
  try {
    const { msg, err } = JSON.parse(line) as { msg?: string; err?: { message?: string } };
    return err?.message ?? msg ?? line;
  } catch {
    return line;
  }
}
