import { Client, escapeIdentifier, escapeLiteral } from 'pg';
import { APPLICATION_ROLE, OWNER_ROLE } from './policy.js';

/**
 * Creates the two roles that the product uses, or sets their passwords anew. `quarterpoise_owner` owns the schema and migrates it;
 * `quarterpoise_app` is what API and worker connect as: it owns nothing and never bypasses row-level security.
 * @param adminUrl Connection of a role that may create roles.
 */
export async function provisionRoles(
  adminUrl: string,
  passwords: { ownerPassword: string; appPassword: string },
): Promise<void> {
  const client = new Client({ connectionString: adminUrl });
  await client.connect();
  try {
    for (const [role, password] of [
      [OWNER_ROLE, passwords.ownerPassword],
      [APPLICATION_ROLE, passwords.appPassword],
    ] as const) {
      const { rowCount } = await client.query('select 1 from pg_roles where rolname = $1', [role]);
      await client.query(
        `${rowCount ? 'alter' : 'create'} role ${escapeIdentifier(role)} login nosuperuser nobypassrls nocreatedb nocreaterole password ${escapeLiteral(password)}`,
      );
    }
  } finally {
    await client.end();
  }
}

/** Creates an empty database that `quarterpoise_owner` owns and that only the application's role may connect to besides. */
export async function createDatabase(adminUrl: string, name: string, template?: string): Promise<void> {
  const client = new Client({ connectionString: adminUrl });
  await client.connect();
  try {
    const database = escapeIdentifier(name);
    await client.query(
      `create database ${database} owner ${escapeIdentifier(OWNER_ROLE)}${template ? ` template ${escapeIdentifier(template)}` : ''}`,
    );
    await client.query(`revoke all on database ${database} from public`);
    await client.query(`grant connect, temporary on database ${database} to ${escapeIdentifier(APPLICATION_ROLE)}`);
  } finally {
    await client.end();
  }
}
