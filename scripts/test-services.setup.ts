import { existsSync, readFileSync } from 'node:fs';
import { inProject } from './project-root.js';
import { launcherOf } from './services/launcher-lock.js';
import type { ServiceAddresses } from './services/start-services.js';

/**
 * Gives the integration tests their PostgreSQL and Redis: those of the environment (`npm test` sets them), otherwise the
 * development services that are running.
 * @throws Error with the one line to type when there are none
 */
export default function findServices(): void {
  if (process.env.DATABASE_ADMIN_URL && process.env.REDIS_URL) return;
  const folder = inProject('.data/dev');
  const file = `${folder}/services.json`;
  if (launcherOf(folder) === null || !existsSync(file)) {
    throw new Error(
      'No test services are running; start them with:  node --import tsx scripts/services-up.ts --detach',
    );
  }
  const { adminUrl, redisUrl, smtpUrl } = JSON.parse(readFileSync(file, 'utf8')) as ServiceAddresses;
  Object.assign(process.env, { DATABASE_ADMIN_URL: adminUrl, REDIS_URL: redisUrl, SMTP_URL: smtpUrl });
}
