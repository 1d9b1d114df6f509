import { spawn } from 'node:child_process';
import { mkdirSync, openSync, readFileSync } from 'node:fs';
import { setTimeout as pause } from 'node:timers/promises';
import { inProject, PROJECT_ROOT } from './project-root.js';
import { askedToStop, runCommand } from './run-command.js';
import { launcherOf } from './services/launcher-lock.js';
import { startServices } from './services/start-services.js';

/**
 * PostgreSQL, Redis, mail server and identity provider for developing, with data in .data/dev, until Ctrl-C. Their addresses are in
 * .data/dev/services.json, where the integration tests look for them. With `--detach` they stay in the background
 * (`node --import tsx scripts/services-down.ts` stops them).
 */
const DEVELOPMENT_FOLDER = inProject('.data/dev');
const LOG_FILE = inProject('.data/dev/launcher.log');

runCommand(async (args) => {
  mkdirSync(DEVELOPMENT_FOLDER, { recursive: true });
  await (args.includes('--detach') ? detach() : stay());
});

async function stay(): Promise<void> {
  const stopAsked = askedToStop();
  let crash: (reason: Error) => void = () => undefined;
  const crashed = new Promise<never>((_, reject) => (crash = reject));
  const services = await startServices({
    dataFolder: DEVELOPMENT_FOLDER,
    with: ['postgres', 'redis', 'mail', 'identity-provider'],
    durable: false,
    // what the harness of the integration tests sets too: roles belong to the whole server, whoever sets them last wins
    rolePasswords: { ownerPassword: 'test-owner', appPassword: 'test-app' },
    // the addresses that a developer's shell may hold are those of the services to be started here
    environment: {},
    onCrash: (name, lastWords) => crash(new Error(`${name} has ended: ${lastWords}`)),
  });
  console.log(`Running; addresses in ${DEVELOPMENT_FOLDER}/services.json. Mailbox: ${services.mailboxUrl}`);
  try {
    await Promise.race([stopAsked, crashed]);
  } finally {
    await services.stop();
  }
}

async function detach(): Promise<void> {
  const already = launcherOf(DEVELOPMENT_FOLDER);
  if (already !== null) return console.log(`Already running as process ${already}.`);
  const log = openSync(LOG_FILE, 'w');
  const child = spawn(process.execPath, ['--import', 'tsx', __filename], {
    cwd: PROJECT_ROOT,
    detached: true,
    stdio: ['ignore', log, log],
  });
  child.unref();
  let ended = false;
  child.once('exit', () => (ended = true));
  while (!ended) {
    const output = readFileSync(LOG_FILE, 'utf8');
    if (output.includes('Running;')) return console.log(output.trim());
    await pause(100);
  }
  throw new Error(`The services did not start: ${readFileSync(LOG_FILE, 'utf8').trim()}`);
}
