import { Client, escapeIdentifier } from 'pg';
// this one file rather than the library's entry: services must start quickly, and also while a library is being changed
import { createDatabase, provisionRoles } from '../../libs/database/src/security/provision-roles.js';

/** Roles and database, at the first start and again without harm; the schema is a matter of the migrations. */
export async function provisionDatabase(
  adminUrl: string,
  name: string,
  passwords: { readonly ownerPassword: string; readonly appPassword: string },
): Promise<{ ownerUrl: string; appUrl: string }> {
  await provisionRoles(adminUrl, { ownerPassword: passwords.ownerPassword, appPassword: passwords.appPassword });
  const client = new Client({ connectionString: adminUrl });
  await client.connect();
  const { rowCount } = await client.query('select 1 from pg_database where datname = $1', [name]);
  await client.end();
  if (!rowCount) await createDatabase(adminUrl, name);
  const as = (user: string, password: string) =>
    Object.assign(new URL(adminUrl), { username: user, password, pathname: `/${name}` }).toString();
  return {
    ownerUrl: as('quarterpoise_owner', passwords.ownerPassword),
    appUrl: as('quarterpoise_app', passwords.appPassword),
  };
}

/** Puts an empty database in the place of the one of that name. */
export async function emptyDatabase(adminUrl: string, name: string): Promise<void> {
  const client = new Client({ connectionString: adminUrl });
  await client.connect();
  await client.query(`drop database if exists ${escapeIdentifier(name)} with (force)`).finally(() => client.end());
  await createDatabase(adminUrl, name);
}
