/** Services that somebody else runs, given as environment variables; they replace the local ones. */
export interface ExternalServices {
  readonly database: { readonly ownerUrl: string; readonly appUrl: string } | null;
  /** A superuser's connection, for tests that make databases of their own. */
  readonly adminUrl: string | null;
  readonly redisUrl: string | null;
  readonly smtpUrl: string | null;
}

/** @throws Error when only one of the two database connections is given: the schema's owner and the application never share one. */
export function externalServices(environment: NodeJS.ProcessEnv): ExternalServices {
  const { DATABASE_URL: appUrl, OWNER_DATABASE_URL: ownerUrl } = environment;
  if (Boolean(appUrl) !== Boolean(ownerUrl)) {
    const [given, wanted] = appUrl ? ['DATABASE_URL', 'OWNER_DATABASE_URL'] : ['OWNER_DATABASE_URL', 'DATABASE_URL'];
    throw new Error(
      `${given} is set and ${wanted} is not: give both, or neither for a PostgreSQL of the project’s own`,
    );
  }
  return {
    database: appUrl && ownerUrl ? { appUrl, ownerUrl } : null,
    adminUrl: environment.DATABASE_ADMIN_URL || null,
    redisUrl: environment.REDIS_URL || null,
    smtpUrl: environment.SMTP_URL || null,
  };
}
