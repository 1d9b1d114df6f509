import { createHash, randomBytes } from 'node:crypto';
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { MikroORM } from '@mikro-orm/postgresql';
import { Client, escapeIdentifier } from 'pg';
import { migrate, ormOptions } from '../mikro-orm.config.js';
import { createDatabase, provisionRoles } from '../security/provision-roles.js';

/** A database of its own for one test file: migrated, empty, dropped afterwards. */
export interface TestDatabase {
  readonly ownerUrl: string;
  /** Connection as the unprivileged role, the way API and worker connect. */
  readonly appUrl: string;
  readonly orm: MikroORM;
  /** A plain connection as the owner, who is not bound by policies: for arranging and for looking behind the curtain. */
  readonly owner: Client;
  close(): Promise<void>;
}

const PASSWORDS = { ownerPassword: 'test-owner', appPassword: 'test-app' };
const TEMPLATE_LOCK = 727_001;

/** @throws Error with the one line to type when no test cluster is running. */
export function testServices(): { adminUrl: string; redisUrl: string } {
  const { DATABASE_ADMIN_URL: adminUrl, REDIS_URL: redisUrl } = process.env;
  if (adminUrl && redisUrl) return { adminUrl, redisUrl };
  for (let folder = process.cwd(); ; folder = join(folder, '..')) {
    const file = join(folder, '.data/dev/services.json');
    if (existsSync(file)) return JSON.parse(readFileSync(file, 'utf8')) as { adminUrl: string; redisUrl: string };
    if (folder === join(folder, '..')) break;
  }
  throw new Error('No test services: start them with "node --import tsx scripts/services-up.ts --detach"');
}

export async function createTestDatabase(): Promise<TestDatabase> {
  const { adminUrl } = testServices();
  const template = await migratedTemplate(adminUrl);
  const name = `test_${process.pid}_${randomBytes(6).toString('hex')}`;
  await createDatabase(adminUrl, name, template);
  const ownerUrl = urlFor(adminUrl, name, 'quarterpoise_owner', PASSWORDS.ownerPassword);
  const appUrl = urlFor(adminUrl, name, 'quarterpoise_app', PASSWORDS.appPassword);
  const owner = new Client({ connectionString: ownerUrl });
  await owner.connect();
  const orm = await MikroORM.init(ormOptions(appUrl, { max: 6 }));
  return {
    ownerUrl,
    appUrl,
    orm,
    owner,
    async close() {
      await orm.close(true);
      await owner.end();
      await asAdmin(adminUrl, (admin) => admin.query(`drop database ${escapeIdentifier(name)} with (force)`));
    },
  };
}

/** One template per schema: named by the sources of the migrations, so that a changed one gets a new template. */
function templateName(): string {
  const digest = createHash('sha256');
  for (const folder of ['../migrations', '../security']) {
    const path = join(__dirname, folder);
    for (const file of readdirSync(path).toSorted()) digest.update(readFileSync(join(path, file)));
  }
  return `template_${digest.digest('hex').slice(0, 16)}`;
}

async function migratedTemplate(adminUrl: string): Promise<string> {
  const name = templateName();
  await asAdmin(adminUrl, async (admin) => {
    await admin.query('select pg_advisory_lock($1)', [TEMPLATE_LOCK]);
    try {
      const { rowCount } = await admin.query('select 1 from pg_database where datname = $1', [name]);
      if (rowCount) return;
      await provisionRoles(adminUrl, PASSWORDS);
      const draft = `${name}_draft`;
      await admin.query(`drop database if exists ${escapeIdentifier(draft)} with (force)`);
      await createDatabase(adminUrl, draft);
      await migrate(urlFor(adminUrl, draft, 'quarterpoise_owner', PASSWORDS.ownerPassword));
      await admin.query(`alter database ${escapeIdentifier(draft)} rename to ${escapeIdentifier(name)}`);
    } finally {
      await admin.query('select pg_advisory_unlock($1)', [TEMPLATE_LOCK]);
    }
  });
  return name;
}

function urlFor(adminUrl: string, database: string, user: string, password: string): string {
  const url = new URL(adminUrl);
  url.pathname = `/${database}`;
  url.username = user;
  url.password = password;
  return url.toString();
}

async function asAdmin<T>(adminUrl: string, work: (admin: Client) => Promise<T>): Promise<T> {
  const admin = new Client({ connectionString: adminUrl });
  await admin.connect();
  try {
    return await work(admin);
  } finally {
    await admin.end();
  }
}
