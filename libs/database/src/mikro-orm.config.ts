import { Migrator } from '@mikro-orm/migrations';
import { defineConfig, MikroORM, type Options, UnderscoreNamingStrategy } from '@mikro-orm/postgresql';
import { types } from 'pg';
import { safeInteger } from './cents.type.js';
import { ENTITIES } from './entities.js';
import { MIGRATIONS } from './migrations/list.js';
import { grantMigrationsReading } from './security/migration-status.js';

// bigint columns of raw queries come as safe integers instead of strings; beyond them the query fails rather than rounds
types.setTypeParser(types.builtins.INT8, safeInteger);

/** Options of every connection that API, worker, scripts and tests open. */
export function ormOptions(url: string, pool: { min?: number; max?: number } = {}): Options {
  return defineConfig({
    clientUrl: url,
    entities: ENTITIES,
    namingStrategy: UnderscoreNamingStrategy,
    discovery: { warnWhenNoEntities: false },
    allowGlobalContext: false,
    forceUtcTimezone: true,
    pool: { min: pool.min ?? 0, max: pool.max ?? 10 },
    extensions: [Migrator],
    migrations: {
      migrationsList: MIGRATIONS.map((migration) => ({ name: migration.name, class: migration })),
      tableName: 'schema_migration',
      snapshot: false,
      allOrNothing: true,
      transactional: true,
      disableForeignKeys: false,
    },
  });
}

/** Brings the schema of a database up to date. Connect as the owner. Returns the names of the migrations that were applied. */
export async function migrate(ownerUrl: string): Promise<string[]> {
  const orm = await MikroORM.init({ ...ormOptions(ownerUrl, { max: 1 }), logger: () => undefined });
  try {
    const applied = await orm.getMigrator().up();
    await grantMigrationsReading(orm.em.fork());
    return applied.map((migration) => migration.name);
  } finally {
    await orm.close(true);
  }
}
