import { Migration20260105090000_create_scope } from './Migration20260105090000_create_scope.js';
import { Migration20260105090500_create_identity } from './Migration20260105090500_create_identity.js';
import { Migration20260105091000_create_imports_and_ledger } from './Migration20260105091000_create_imports_and_ledger.js';
import { Migration20260105091500_create_runs } from './Migration20260105091500_create_runs.js';
import { Migration20260105092000_create_statements } from './Migration20260105092000_create_statements.js';
import { Migration20260105092500_create_audit_and_outbox } from './Migration20260105092500_create_audit_and_outbox.js';

/** Every migration, oldest first. An explicit list works the same from sources and from the build. */
export const MIGRATIONS = [
  Migration20260105090000_create_scope,
  Migration20260105090500_create_identity,
  Migration20260105091000_create_imports_and_ledger,
  Migration20260105091500_create_runs,
  Migration20260105092000_create_statements,
  Migration20260105092500_create_audit_and_outbox,
];
