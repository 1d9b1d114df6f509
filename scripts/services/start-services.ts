import { mkdirSync, rmSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { type DebianPackage, ensurePackages } from './debian-packages.js';
import { type ExternalServices, externalServices } from './external-services.js';
import { startIdentityProvider } from './identity-provider.js';
import { takeDataFolder } from './launcher-lock.js';
import { provisionDatabase } from './local-database.js';
import { startMailServer } from './mail-server.js';
import { startPostgres } from './postgres.js';
import { startRedis } from './redis.js';
import type { RunningService } from './running-service.js';
import { secretsOf, writePrivately } from './secrets.js';

export type ServiceName = 'postgres' | 'redis' | 'mail' | 'identity-provider';

export interface ServicesOptions {
  /** Where the data, the secrets and `services.json` lie. */
  readonly dataFolder: string;
  readonly with: readonly ServiceName[];
  /** Database that the product uses; made when it is not there yet. */
  readonly database?: string;
  /** False for data that is thrown away: nothing waits for the disk then. */
  readonly durable?: boolean;
  /** Passwords of the two database roles where they must be known beforehand; otherwise generated ones. */
  readonly rolePasswords?: { readonly ownerPassword: string; readonly appPassword: string };
  readonly environment?: NodeJS.ProcessEnv;
  /** Told when a service ends that nobody has stopped. */
  onCrash?(name: string, lastWords: string): void;
}

/** How to reach what runs; null for what was not asked for. Written to `services.json` in the data folder, readable for its owner only. */
export interface ServiceAddresses {
  readonly launcher: number;
  readonly adminUrl: string | null;
  readonly ownerUrl: string | null;
  readonly appUrl: string | null;
  readonly redisUrl: string | null;
  readonly smtpUrl: string | null;
  readonly mailboxUrl: string | null;
  readonly identityProviderUrl: string | null;
  /** Process ids of the services that run as processes of their own. */
  readonly processes: Readonly<Record<string, number>>;
}

export interface Services extends ServiceAddresses {
  stop(): Promise<void>;
}

/** Starts the services that were asked for and no external one replaces. On failure nothing is left running. */
export async function startServices(options: ServicesOptions): Promise<Services> {
  const dataFolder = resolve(options.dataFolder);
  const external = externalServices(options.environment ?? process.env);
  const wanted = localServices(options.with, external);
  mkdirSync(dataFolder, { recursive: true });
  const release = takeDataFolder(dataFolder);
  const running: { stop(): Promise<void> }[] = [];
  let stopping = false;
  const stop = async () => {
    stopping = true;
    // the last started first; all are tried even if one does not stop
    const results = await Promise.allSettled(
      running
        .splice(0)
        .toReversed()
        .map((service) => service.stop()),
    );
    rmSync(join(dataFolder, 'services.json'), { force: true });
    release();
    const failed = results.find((result) => result.status === 'rejected');
    if (failed) throw failed.reason as Error;
  };
  const keep = <T extends RunningService>(service: T): T => {
    running.push(service);
    void service.exited.then((lastWords) => {
      if (!stopping) options.onCrash?.(service.name, lastWords);
    });
    return service;
  };
  try {
    ensurePackages(packagesFor(wanted));
    const secrets = secretsOf(dataFolder);
    const postgres = wanted.has('postgres')
      ? keep(
          await startPostgres({
            dataFolder,
            adminPassword: secrets.adminPassword,
            durable: options.durable ?? true,
          }),
        )
      : null;
    const database = postgres
      ? await provisionDatabase(postgres.adminUrl, options.database ?? 'quarterpoise', options.rolePasswords ?? secrets)
      : external.database;
    const redis = wanted.has('redis') ? keep(await startRedis({ dataFolder, password: secrets.redisPassword })) : null;
    const mail = wanted.has('mail') ? await startMailServer() : null;
    if (mail) running.push(mail);
    const identityProvider = wanted.has('identity-provider') ? await startIdentityProvider({ dataFolder }) : null;
    if (identityProvider) running.push(identityProvider);
    const addresses: ServiceAddresses = {
      launcher: process.pid,
      adminUrl: postgres?.adminUrl ?? external.adminUrl,
      ownerUrl: database?.ownerUrl ?? null,
      appUrl: database?.appUrl ?? null,
      redisUrl: redis?.redisUrl ?? external.redisUrl,
      smtpUrl: mail?.smtpUrl ?? external.smtpUrl,
      mailboxUrl: mail?.mailboxUrl ?? null,
      identityProviderUrl: identityProvider?.url ?? null,
      processes: Object.fromEntries([postgres, redis].flatMap((one) => (one ? [[one.name, one.pid]] : []))),
    };
    writePrivately(join(dataFolder, 'services.json'), addresses);
    return { ...addresses, stop };
  } catch (error) {
    await stop().catch(() => undefined);
    throw error;
  }
}

function localServices(asked: readonly ServiceName[], external: ExternalServices): ReadonlySet<ServiceName> {
  const replaced: Record<ServiceName, boolean> = {
    postgres: external.database !== null || external.adminUrl !== null,
    redis: external.redisUrl !== null,
    mail: external.smtpUrl !== null,
    'identity-provider': false,
  };
  return new Set(asked.filter((name) => !replaced[name]));
}

function packagesFor(services: ReadonlySet<ServiceName>): DebianPackage[] {
  return [
    ...(services.has('postgres') ? ['postgresql-15' as const] : []),
    ...(services.has('redis') ? ['redis-server' as const] : []),
  ];
}
