import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, statSync } from 'node:fs';
import { join, relative } from 'node:path';

/** Digest of names and contents of all files at and below the paths. Equal exactly when a build from them would be. */
export function contentHash(root: string, paths: readonly string[], leaveOut: (path: string) => boolean): string {
  const digest = createHash('sha256');
  for (const path of paths.toSorted()) {
    for (const file of filesAt(join(root, path))) {
      const name = relative(root, file);
      if (leaveOut(name)) continue;
      const content = readFileSync(file);
      digest.update(`${name}\0${content.length}\0`).update(content);
    }
  }
  return digest.digest('hex');
}

function filesAt(path: string): string[] {
  if (!existsSync(path)) return [];
  if (statSync(path).isFile()) return [path];
  return readdirSync(path, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile())
    .map((entry) => join(entry.parentPath, entry.name))
    .toSorted();
}
