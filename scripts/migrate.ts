import { migrate } from '@quarterpoise/database';
import { runCommand } from './run-command.js';

/** Brings the database of OWNER_DATABASE_URL up to date. A command of its own: API and worker only look whether it was run. */
runCommand(async () => {
  const { OWNER_DATABASE_URL: ownerUrl } = process.env;
  if (!ownerUrl) throw new Error('OWNER_DATABASE_URL is not set: the connection of the role that owns the schema');
  const applied = await migrate(ownerUrl);
  console.log(applied.length > 0 ? `Applied: ${applied.join(', ')}` : 'The schema is up to date.');
});
