import { rmSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { stopLeftoverPostgres } from './postgres.js';
import { stopLeftoverRedis } from './redis.js';
import { outsideFolder } from './service-account.js';

/** Removes everything that services have kept for a data folder, and stops what a killed launcher left running there. */
export async function discardData(folder: string): Promise<void> {
  const dataFolder = resolve(folder);
  const outside = outsideFolder(dataFolder);
  for (const place of [dataFolder, outside]) {
    await stopLeftoverPostgres(join(place, 'postgres'));
    await stopLeftoverRedis(join(place, 'redis'));
    rmSync(place, { recursive: true, force: true });
  }
}
