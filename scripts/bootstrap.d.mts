interface LockEntry {
  readonly version?: string;
  readonly integrity?: string;
  readonly optional?: boolean;
  readonly link?: boolean;
}
interface LockFile {
  readonly packages?: Readonly<Record<string, LockEntry>>;
}

export function nodeComplaint(version: string): string | null;
export function packagesMatch(wanted: LockFile, installed: LockFile | null): boolean;
