import { existsSync, readFileSync } from 'node:fs';
import { setTimeout as pause } from 'node:timers/promises';

/**
 * Tells a process apart from a later one that was given the same number: its id and the tick at which it was started (Linux).
 * Null when there is no such process, or only its remains that nobody has collected.
 */
export function processIdentity(pid: number): string | null {
  const file = `/proc/${pid}/stat`;
  if (!existsSync(file)) return null;
  try {
    // the name stands in brackets and may hold blanks; state is the 1st field after it, the start time the 20th
    const fields = readFileSync(file, 'utf8').split(') ').at(-1)?.split(' ') ?? [];
    return fields[0] === 'Z' || fields[0] === 'X' ? null : `${pid}@${fields[19]}`;
  } catch {
    return null;
  }
}

/** The words a process was started with, '' when it is gone. */
export function commandLine(pid: number): string {
  try {
    return readFileSync(`/proc/${pid}/cmdline`, 'utf8').replaceAll('\0', ' ');
  } catch {
    return '';
  }
}

/** Sends the signals one after the other, each with its time to take effect, until the process is gone. */
export async function stopProcess(pid: number, steps: readonly (readonly [NodeJS.Signals, number])[]): Promise<void> {
  const identity = processIdentity(pid);
  if (!identity) return;
  for (const [signal, milliseconds] of steps) {
    try {
      process.kill(pid, signal);
    } catch {
      return;
    }
    const until = Date.now() + milliseconds;
    while (Date.now() < until) {
      if (processIdentity(pid) !== identity) return;
      await pause(50);
    }
  }
  throw new Error(`Process ${pid} does not stop; end it by hand: kill -9 ${pid}`);
}
