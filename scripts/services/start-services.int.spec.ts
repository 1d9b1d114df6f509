import { existsSync, mkdtempSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Redis } from 'ioredis';
import { Client } from 'pg';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { discardData } from './discard-data.js';
import { processIdentity } from './process-identity.js';
import { type Services, startServices } from './start-services.js';

let dataFolder: string;
const running: Services[] = [];
beforeAll(() => {
  dataFolder = mkdtempSync(join(tmpdir(), 'qp-services-'));
});
afterAll(async () => {
  for (const services of running) await services.stop();
  await discardData(dataFolder);
});

const start = async (onCrash: (name: string) => void = () => undefined) => {
  const services = await startServices({
    dataFolder,
    with: ['postgres', 'redis'],
    durable: false,
    environment: {},
    onCrash,
  });
  running.push(services);
  return services;
};
const query = async (url: string | null, text: string) => {
  const client = new Client({ connectionString: url ?? '' });
  await client.connect();
  try {
    return (await client.query<Record<string, unknown>>(text)).rows;
  } finally {
    await client.end();
  }
};
const withRedis = async <T>(url: string | null, work: (redis: Redis) => Promise<T>) => {
  const redis = new Redis(url ?? '');
  try {
    return await work(redis);
  } finally {
    redis.disconnect();
  }
};
const asPostgres = (services: Services) => services.processes.PostgreSQL ?? 0;

it('runs both as an unprivileged user on loopback, with a database that the owner owns and the application does not', async () => {
  const services = await start();
  for (const pid of Object.values(services.processes)) {
    expect(readFileSync(`/proc/${pid}/status`, 'utf8')).toMatch(/^Uid:\t(?!0\t)/m);
  }
  expect(await query(services.adminUrl, 'show listen_addresses')).toEqual([{ listen_addresses: '127.0.0.1' }]);
  await query(services.ownerUrl, 'create table kept (id int); insert into kept values (7)');
  await expect(query(services.appUrl, 'create table own (id int)')).rejects.toThrow('permission denied');
  await expect(query(services.appUrl?.replace(/:[^:@]+@/, ':wrong@') ?? '', 'select 1')).rejects.toThrow('password');
  await withRedis(services.redisUrl, (redis) => redis.set('kept', 'yes'));
  for (const file of ['services.json', 'secrets.json']) {
    expect(statSync(join(dataFolder, file)).mode & 0o077, file).toBe(0);
  }
});

it('is not started twice for one data folder', async () => {
  await expect(start()).rejects.toThrow('Already running');
});

it('keeps the data over a clean stop', async () => {
  await running[0]?.stop();
  expect(existsSync(join(dataFolder, 'services.json'))).toBe(false);
  const services = await start();
  expect(await query(services.ownerUrl, 'select id from kept')).toEqual([{ id: 7 }]);
  expect(await withRedis(services.redisUrl, (redis) => redis.get('kept'))).toBe('yes');
});

it('tells when a service ends by itself, and starts over the note of a process that is gone', async () => {
  await running[1]?.stop();
  let crashed: (name: string) => void = () => undefined;
  const crash = new Promise<string>((resolve) => (crashed = resolve));
  const services = await start(crashed);
  process.kill(asPostgres(services), 'SIGKILL');
  expect(await crash).toBe('PostgreSQL');
  await services.stop();
  expect(await query((await start()).ownerUrl, 'select id from kept')).toEqual([{ id: 7 }]);
});

it('takes over from a launcher that was killed and left its services running', async () => {
  const services = running.at(-1) as Services;
  // as if the process that holds the folder had been killed
  writeFileSync(join(dataFolder, 'launcher'), '4194305@1\n');
  const next = await start();
  expect(processIdentity(asPostgres(services))).toBeNull();
  expect(await query(next.ownerUrl, 'select id from kept')).toEqual([{ id: 7 }]);
});

it('leaves nothing behind when the data are discarded', async () => {
  const last = running.at(-1) as Services;
  await discardData(dataFolder);
  expect(processIdentity(asPostgres(last))).toBeNull();
  expect(existsSync(dataFolder)).toBe(false);
  rmSync(dataFolder, { recursive: true, force: true });
});
