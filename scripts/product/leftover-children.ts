import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { processIdentity, stopProcess } from '../services/process-identity.js';
import type { RunningService } from '../services/running-service.js';

const fileIn = (dataFolder: string) => join(dataFolder, 'children.json');

/** Notes which processes belong to a launcher, so that the next one finds them should this one be killed. */
export function noteChildren(dataFolder: string, children: readonly RunningService[]): void {
  writeFileSync(fileIn(dataFolder), JSON.stringify(children.map((child) => processIdentity(child.pid))));
}

/** Stops what a killed launcher has left running. */
export async function stopLeftoverChildren(dataFolder: string): Promise<void> {
  const file = fileIn(dataFolder);
  if (!existsSync(file)) return;
  const identities = JSON.parse(readFileSync(file, 'utf8')) as (string | null)[];
  for (const identity of identities) {
    const pid = Number(identity?.split('@')[0]);
    if (identity && processIdentity(pid) === identity) {
      await stopProcess(pid, [
        ['SIGTERM', 10_000],
        ['SIGKILL', 5_000],
      ]);
    }
  }
  rmSync(file);
}
