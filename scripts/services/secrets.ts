import { randomBytes } from 'node:crypto';
import { existsSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';

/** Made once for a data folder, kept readable for its owner only. */
export interface Secrets {
  readonly adminPassword: string;
  readonly ownerPassword: string;
  readonly appPassword: string;
  readonly redisPassword: string;
  readonly sessionSecret: string;
  /** `id:secret`, the form of CHECK_CODE_KEYS. Statements printed under a key can be checked only while it is kept. */
  readonly checkCodeKeys: string;
}

const password = () => randomBytes(24).toString('hex');

export function secretsOf(dataFolder: string): Secrets {
  const file = join(dataFolder, 'secrets.json');
  if (existsSync(file)) return JSON.parse(readFileSync(file, 'utf8')) as Secrets;
  const secrets: Secrets = {
    adminPassword: password(),
    ownerPassword: password(),
    appPassword: password(),
    redisPassword: password(),
    sessionSecret: password(),
    checkCodeKeys: `k1:${password()}`,
  };
  writePrivately(file, secrets);
  return secrets;
}

/** Writes a file that only its owner may read; a reader finds the old content or the new, never a part. */
export function writePrivately(file: string, content: object): void {
  const draft = `${file}.${process.pid}`;
  writeFileSync(draft, `${JSON.stringify(content, null, 2)}\n`, { mode: 0o600 });
  renameSync(draft, file);
}
