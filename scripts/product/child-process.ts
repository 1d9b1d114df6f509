import { spawn } from 'node:child_process';
import { closeSync, openSync } from 'node:fs';
import { PROJECT_ROOT } from '../project-root.js';
import { lastWords } from '../services/last-words.js';
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
