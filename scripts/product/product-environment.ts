import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { inProject } from '../project-root.js';
import type { Secrets } from '../services/secrets.js';
import type { ServiceAddresses } from '../services/start-services.js';

export type Environment = Readonly<Record<string, string>>;

export interface ProductPorts {
  readonly http: number;
  readonly apiMetrics: number;
  readonly workerMetrics: number;
}

export const accountsFileIn = (dataFolder: string) => join(dataFolder, 'demo-accounts.json');

/** Variables of the machine that a child needs; everything else it gets is named below. */
function inherited(): Environment {
  const names = [
    'PATH',
    'HOME',
    'LANG',
    'TZ',
    'LOG_LEVEL',
    'DATABASE_POOL_SIZE',
    'MAIL_FROM',
    'PUBLIC_URL',
    'TRUSTED_PROXIES',
  ];
  return Object.fromEntries(
    names.flatMap((name) => (process.env[name] === undefined ? [] : [[name, process.env[name]]])),
  );
}

/** What API, worker and the quarter-end command read, as one set: each takes what it knows. */
export function productEnvironment(
  dataFolder: string,
  services: ServiceAddresses,
  secrets: Secrets,
  ports: ProductPorts,
): Environment {
  return {
    MAIL_FROM: 'statements@quarterpoise.example',
    PUBLIC_URL: `http://127.0.0.1:${ports.http}`,
    ...inherited(),
    NODE_ENV: 'production',
    DATABASE_URL: services.appUrl ?? '',
    REDIS_URL: services.redisUrl ?? '',
    SMTP_URL: services.smtpUrl ?? '',
    HOST: '127.0.0.1',
    PORT: String(ports.http),
    METRICS_PORT: String(ports.apiMetrics),
    SESSION_SECRET: process.env.SESSION_SECRET || secrets.sessionSecret,
    CHECK_CODE_KEYS: process.env.CHECK_CODE_KEYS || secrets.checkCodeKeys,
    WEB_FOLDER: inProject('apps/web/dist'),
    DEMO: existsSync(accountsFileIn(dataFolder)) ? '1' : '0',
    DEMO_ACCOUNTS_FILE: accountsFileIn(dataFolder),
    ...(services.identityProviderUrl ? { IDENTITY_PROVIDER_URL: services.identityProviderUrl } : {}),
  };
}

/** The schema's owner besides: for migrating and seeding only. */
export function ownerEnvironment(environment: Environment, services: ServiceAddresses): Environment {
  return { ...environment, OWNER_DATABASE_URL: services.ownerUrl ?? '' };
}
