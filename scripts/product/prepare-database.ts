import { existsSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { Client } from 'pg';
import { inProject } from '../project-root.js';
import { emptyDatabase } from '../services/local-database.js';
import type { ServiceAddresses } from '../services/start-services.js';
import { runChild } from './child-process.js';
import { accountsFileIn, type Environment, ownerEnvironment } from './product-environment.js';

/**
 * Brings the schema up to date and, into a database that holds no sponsor yet, the demo.
 * While that is under way a file says so: a demo that was interrupted is begun anew at the next start, in an empty database.
 */
export async function prepareDatabase(
  dataFolder: string,
  services: ServiceAddresses,
  environment: Environment,
  say: (line: string) => void,
): Promise<void> {
  const forOwner = ownerEnvironment(environment, services);
  const step = (name: string, script: string, log: string) =>
    runChild({
      name,
      args: ['--import', 'tsx', inProject(script)],
      environment: forOwner,
      logFile: join(dataFolder, log),
    });
  const seeding = join(dataFolder, 'seeding');
  if (existsSync(seeding)) {
    const name = new URL(services.ownerUrl ?? '').pathname.slice(1);
    if (!services.adminUrl) {
      throw new Error(
        `Filling in the demo was interrupted; empty the database "${name}", delete ${seeding}, start again`,
      );
    }
    await emptyDatabase(services.adminUrl, name);
    rmSync(seeding);
  }
  await step('Migrating the database', 'scripts/migrate.ts', 'migrate.log');
  if (await holdsSponsor(services.ownerUrl ?? '')) return;
  say('Filling in the demo …');
  writeFileSync(seeding, '');
  rmSync(accountsFileIn(dataFolder), { force: true });
  await step('Filling in the demo', 'seeds/src/seed.ts', 'seed.log');
  rmSync(seeding);
}

async function holdsSponsor(ownerUrl: string): Promise<boolean> {
  const client = new Client({ connectionString: ownerUrl });
  await client.connect();
  try {
    const { rowCount } = await client.query('select 1 from sponsor limit 1');
    return Boolean(rowCount);
  } finally {
    await client.end();
  }
}
