import { spawn } from 'node:child_process';
import { chownSync, closeSync, existsSync, openSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { Redis } from 'ioredis';
import { freePort } from './free-port.js';
import { lastWords } from './last-words.js';
import { commandLine, stopProcess } from './process-identity.js';
import { serviceAccount, type ServiceAccount, serviceFolder } from './service-account.js';
import type { RunningService } from './running-service.js';

export const REDIS_PROGRAM = '/usr/bin/redis-server';
const READY_WITHIN = 30_000;
const STOP_STEPS = [
  ['SIGTERM', 10_000],
  ['SIGKILL', 5_000],
] as const;

export interface RedisOptions {
  readonly dataFolder: string;
  readonly password: string;
  readonly port?: number;
}

export interface RunningRedis extends RunningService {
  readonly redisUrl: string;
  readonly folder: string;
}

/** Starts Redis for one data folder, on loopback only, with a password; what it holds outlives a restart. */
export async function startRedis(options: RedisOptions): Promise<RunningRedis> {
  const account = serviceAccount('redis');
  const folder = serviceFolder(options.dataFolder, 'redis', account);
  await stopLeftoverRedis(folder);
  for (let attempt = 1; ; attempt++) {
    try {
      return await launch(folder, account, options.port ?? (await freePort()), options);
    } catch (error) {
      // somebody may have taken the port between the look and the start
      if (attempt === 3 || options.port) throw error;
    }
  }
}

/** A killed launcher leaves the server running, a power cut leaves its note of its process id. */
export async function stopLeftoverRedis(folder: string): Promise<void> {
  const note = join(folder, 'redis.pid');
  if (!existsSync(note)) return;
  const pid = Number(readFileSync(note, 'utf8'));
  // Redis shows its address in its command line; a process that was given the number later does not
  const port = /^port (\d+)$/m.exec(readFileSync(join(folder, 'redis.conf'), 'utf8'))?.[1];
  if (commandLine(pid).includes(`redis-server 127.0.0.1:${port}`)) await stopProcess(pid, STOP_STEPS);
  rmSync(note, { force: true });
}

async function launch(
  folder: string,
  account: ServiceAccount | null,
  port: number,
  options: RedisOptions,
): Promise<RunningRedis> {
  const settings = join(folder, 'redis.conf');
  // in a file rather than on the command line, where everybody on the machine could read the password
  writeFileSync(
    settings,
    [
      'bind 127.0.0.1',
      `port ${port}`,
      `requirepass ${options.password}`,
      `dir ${JSON.stringify(folder)}`,
      `pidfile ${JSON.stringify(join(folder, 'redis.pid'))}`,
      'appendonly yes',
      'save ""',
      // jobs may never be thrown out to make room
      'maxmemory-policy noeviction',
      '',
    ].join('\n'),
    { mode: 0o600 },
  );
  if (account) chownSync(settings, account.uid, account.gid);
  const logFile = join(options.dataFolder, 'redis.log');
  const log = openSync(logFile, 'w', 0o600);
  // a process group of its own: Ctrl-C in the terminal must not stop it before those who use it
  const child = spawn(REDIS_PROGRAM, [settings], {
    ...account,
    cwd: '/',
    env: { PATH: '/usr/bin:/bin' },
    detached: true,
    stdio: ['ignore', log, log],
  });
  closeSync(log);
  const exited = new Promise<string>((resolve) => {
    child.once('error', (error) => resolve(error.message));
    child.once('exit', () => resolve(lastWords(logFile)));
  });
  child.unref();
  const redisUrl = `redis://:${options.password}@127.0.0.1:${port}`;
  await Promise.race([
    ready(redisUrl),
    exited.then((reason) => {
      throw new Error(`Redis did not start: ${reason} (all of it: ${logFile})`);
    }),
  ]);
  const pid = child.pid as number;
  return { name: 'Redis', pid, redisUrl, folder, exited, stop: () => stopProcess(pid, STOP_STEPS) };
}

async function ready(redisUrl: string): Promise<void> {
  const until = Date.now() + READY_WITHIN;
  for (;;) {
    const client = new Redis(redisUrl, { lazyConnect: true, retryStrategy: null, maxRetriesPerRequest: 0 });
    client.on('error', () => undefined);
    try {
      await client.connect();
      // answers only when a kept append-only file has been read back
      await client.ping();
      return;
    } catch (error) {
      if (Date.now() > until) throw new Error(`Redis does not answer: ${(error as Error).message}`, { cause: error });
      await pause(50);
    } finally {
      client.disconnect();
    }
  }
}
