import { existsSync, mkdirSync, readFileSync, rmSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { build } from '../build/build.js';
import { inProject } from '../project-root.js';
import { freePort, freePortNear } from '../services/free-port.js';
import type { RunningService } from '../services/running-service.js';
import { secretsOf, writePrivately } from '../services/secrets.js';
import { type Services, startServices } from '../services/start-services.js';
import { startChild } from './child-process.js';
import { noteChildren, stopLeftoverChildren } from './leftover-children.js';
import { prepareDatabase } from './prepare-database.js';
import { accountsFileIn, productEnvironment, type ProductPorts } from './product-environment.js';

export interface DemoAccount {
  readonly hat: string;
  readonly displayName: string;
  readonly email: string;
  readonly password: string;
  readonly organisation: string;
}

export interface ProductOptions {
  readonly dataFolder: string;
  /** The port to take; it must be free. Otherwise the preferred one when free, else any. */
  readonly port?: number;
  readonly preferredPort?: number;
  readonly durable?: boolean;
  readonly environment?: NodeJS.ProcessEnv;
  /** Told when any of its parts ends that nobody has stopped. */
  onCrash(reason: string): void;
  readonly say: (line: string) => void;
}

export interface Product {
  readonly url: string;
  readonly accounts: readonly DemoAccount[];
  readonly accountsFile: string;
  readonly services: Services;
  /** Programs first, then services; the data stay. */
  stop(): Promise<void>;
}

const READY_WITHIN = 90_000;
/** The environment of the running product, kept for the quarter-end command; readable for its owner only. */
export const environmentFileIn = (dataFolder: string) => join(dataFolder, 'environment.json');

/** Starts everything that the product consists of, and returns when it answers. On failure nothing is left running. */
export async function startProduct(options: ProductOptions): Promise<Product> {
  const dataFolder = resolve(options.dataFolder);
  mkdirSync(dataFolder, { recursive: true });
  const children: RunningService[] = [];
  let services: Services | null = null;
  let stopping = false;
  const stop = async () => {
    stopping = true;
    await Promise.all(children.splice(0).map((child) => child.stop()));
    rmSync(environmentFileIn(dataFolder), { force: true });
    await services?.stop();
  };
  const crashed = (name: string, lastWords: string) => {
    if (!stopping) options.onCrash(`${name} has ended: ${lastWords}`);
  };
  // begun at once, awaited when needed: it has the second processor meanwhile
  const building = build();
  building.catch(() => undefined);
  try {
    options.say('Starting services …');
    services = await startServices({
      dataFolder,
      with: ['postgres', 'redis', 'mail', 'identity-provider'],
      durable: options.durable ?? true,
      environment: options.environment ?? process.env,
      onCrash: crashed,
    });
    await stopLeftoverChildren(dataFolder);
    // after that, as they may hold the port that is wanted
    const ports = await choosePorts(options);
    const secrets = secretsOf(dataFolder);
    await prepareDatabase(dataFolder, services, productEnvironment(dataFolder, services, secrets, ports), options.say);
    // anew, as the demo's sign-ins may have come into being
    const environment = productEnvironment(dataFolder, services, secrets, ports);
    options.say('Building …');
    await building;
    options.say('Starting API and worker …');
    const start = (name: string, program: string, log: string, changes: Readonly<Record<string, string>> = {}) => {
      const child = startChild({
        name,
        args: [inProject(program)],
        environment: { ...environment, ...changes },
        logFile: join(dataFolder, log),
      });
      children.push(child);
      void child.exited.then((lastWords) => crashed(name, lastWords));
      return child;
    };
    const url = `http://127.0.0.1:${ports.http}`;
    const api = start('The API', 'apps/api/dist/main.js', 'api.log');
    const worker = start('The worker', 'apps/worker/dist/main.js', 'worker.log', {
      METRICS_PORT: String(ports.workerMetrics),
    });
    noteChildren(dataFolder, children);
    await ready(url, [api, worker]);
    writePrivately(environmentFileIn(dataFolder), environment);
    const accountsFile = accountsFileIn(dataFolder);
    return { url, accounts: readAccounts(accountsFile), accountsFile, services, stop };
  } catch (error) {
    await building.catch(() => undefined);
    await stop().catch(() => undefined);
    throw error;
  }
}

async function choosePorts(options: ProductOptions): Promise<ProductPorts> {
  const http = await freePortNear(options.port ?? options.preferredPort ?? 0);
  if (options.port !== undefined && http !== options.port) {
    throw new Error(`Port ${options.port} is taken by another program; give another one as PORT, or none`);
  }
  return { http, apiMetrics: await freePort(), workerMetrics: await freePort() };
}

async function ready(url: string, programs: readonly RunningService[]): Promise<void> {
  let ended: Error | null = null;
  for (const program of programs) {
    void program.exited.then((lastWords) => (ended = new Error(`${program.name} did not start: ${lastWords}`)));
  }
  const until = Date.now() + READY_WITHIN;
  let answer = 'nothing';
  while (Date.now() < until) {
    if (ended) throw ended as Error;
    try {
      const response = await fetch(`${url}/api/health/ready`, { signal: AbortSignal.timeout(5000) });
      if (response.ok) return;
      answer = `${response.status} ${(await response.text()).slice(0, 500)}`;
    } catch {
      // it does not listen yet
    }
    await pause(200);
  }
  throw new Error(`The API is not ready after ${READY_WITHIN / 1000} seconds; its last answer: ${answer}`);
}

function readAccounts(file: string): DemoAccount[] {
  if (!existsSync(file)) return [];
  const content = JSON.parse(readFileSync(file, 'utf8')) as DemoAccount[] | { items: DemoAccount[] };
  return Array.isArray(content) ? content : content.items;
}
