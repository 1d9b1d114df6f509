import { execFileSync, spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { chmodSync, chownSync, mkdirSync, rmSync } from 'node:fs';
import { join } from 'node:path';

/** Under whose name a service runs; null means under the name of whoever started us. */
export interface ServiceAccount {
  readonly uid: number;
  readonly gid: number;
}

/**
 * PostgreSQL refuses to run as root and Redis should not. Started by root, each runs as the user that its Debian package creates;
 * started by anybody else, it simply runs as that person.
 */
export function serviceAccount(user: string): ServiceAccount | null {
  if (process.getuid?.() !== 0) return null;
  const number = (flag: string) => Number(execFileSync('id', [flag, user], { encoding: 'utf8', stdio: 'pipe' }));
  try {
    return { uid: number('-u'), gid: number('-g') };
  } catch {
    throw new Error(`The user "${user}" does not exist; reinstall the Debian package that brings it`);
  }
}

/**
 * The folder that a service keeps its data in: in the data folder when its account can get there, otherwise (a project below a
 * home folder that is closed to others) below /var/lib, told apart by the data folder's name.
 */
export function serviceFolder(dataFolder: string, service: string, account: ServiceAccount | null): string {
  const inside = ownedFolder(join(dataFolder, service), account);
  if (!account || reaches(account, inside)) return inside;
  rmSync(inside, { recursive: true });
  const outside = outsideFolder(dataFolder);
  mkdirSync(outside, { recursive: true, mode: 0o755 });
  return ownedFolder(join(outside, service), account);
}

/** Where a data folder's services keep what its own place does not allow. */
export function outsideFolder(dataFolder: string): string {
  const digest = createHash('sha256').update(dataFolder).digest('hex').slice(0, 12);
  return `/var/lib/quarterpoise/${digest}`;
}

/** Makes the folder if need be and gives it to the account, closed to everybody else. */
export function ownedFolder(path: string, account: ServiceAccount | null): string {
  mkdirSync(path, { recursive: true });
  if (account) chownSync(path, account.uid, account.gid);
  chmodSync(path, 0o700);
  return path;
}

function reaches(account: ServiceAccount, path: string): boolean {
  return spawnSync('test', ['-w', path], { ...account, cwd: '/' }).status === 0;
}
