import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { processIdentity } from './process-identity.js';

const fileIn = (dataFolder: string) => join(dataFolder, 'launcher');

/** The process that runs the services of a data folder, or null. */
export function launcherOf(dataFolder: string): number | null {
  const file = fileIn(dataFolder);
  if (!existsSync(file)) return null;
  const identity = readFileSync(file, 'utf8').trim();
  const pid = Number(identity.split('@')[0]);
  return processIdentity(pid) === identity ? pid : null;
}

/**
 * Makes this process the only one that runs services for the data folder.
 * @returns what gives the folder free again
 * @throws Error when another process has it
 */
export function takeDataFolder(dataFolder: string): () => void {
  const holder = launcherOf(dataFolder);
  if (holder !== null) {
    throw new Error(`Already running for ${dataFolder} as process ${holder}; stop that one first (kill ${holder})`);
  }
  writeFileSync(fileIn(dataFolder), `${processIdentity(process.pid)}\n`);
  return () => rmSync(fileIn(dataFolder), { force: true });
}
