import { spawn } from 'node:child_process';
import { existsSync, readFileSync } from 'node:fs';
import { inProject, PROJECT_ROOT } from './project-root.js';
import { environmentFileIn } from './product/start-product.js';
import { runCommand } from './run-command.js';
import { launcherOf } from './services/launcher-lock.js';

/** `npm run quarter-end -- …`: the terminal's way to run a quarter, against the product that `npm start` runs here or the one of the environment variables. */
runCommand(async (args) => {
  const program = inProject('apps/api/dist/cli/quarter-end.js');
  const environment = process.env.DATABASE_URL ? process.env : runningEnvironment();
  if (!existsSync(program)) throw new Error('The quarter-end command is not built; build it with:  npm run build');
  const child = spawn(process.execPath, [program, ...args], {
    cwd: PROJECT_ROOT,
    env: { ...process.env, ...environment },
    stdio: 'inherit',
  });
  // Ctrl-C reaches the child by itself
  process.on('SIGINT', () => undefined);
  process.on('SIGTERM', () => child.kill('SIGTERM'));
  return await new Promise<number>((resolve, reject) => {
    child.once('error', reject);
    child.once('exit', (code) => resolve(code ?? 1));
  });
});

function runningEnvironment(): NodeJS.ProcessEnv {
  const folder = process.env.DATA_FOLDER || inProject('.data/start');
  const file = environmentFileIn(folder);
  if (launcherOf(folder) === null || !existsSync(file)) {
    throw new Error('Quarterpoise does not run here: start it with "npm start", or give DATABASE_URL and REDIS_URL');
  }
  return JSON.parse(readFileSync(file, 'utf8')) as NodeJS.ProcessEnv;
}
