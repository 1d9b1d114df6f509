import type { EntityManager } from '@mikro-orm/postgresql';
import { MIGRATIONS } from '../migrations/list.js';
import { APPLICATION_ROLE } from './policy.js';

/** Lets the application's role see which migrations have run, so that API and worker can refuse a schema that is behind. */
export async function grantMigrationsReading(em: EntityManager): Promise<void> {
  await em.execute(`grant select on schema_migration to ${APPLICATION_ROLE}`);
}

/** Names of migrations that this build knows and the database has not had; empty when the schema is up to date. */
export async function missingMigrations(em: EntityManager): Promise<string[]> {
  const rows = await em.fork().execute<{ name: string }[]>('select name from schema_migration');
  const applied = new Set(rows.map((row) => row.name));
  return MIGRATIONS.map((migration) => migration.name).filter((name) => !applied.has(name));
}
