// The one script in plain JavaScript: it must run on a machine where nothing is installed yet but Node.js.
// It installs the packages when they do not match the lock file, then hands over to scripts/<command>.ts.
import { spawn, spawnSync } from 'node:child_process';
import { existsSync, readFileSync } from 'node:fs';
import { constants } from 'node:os';
import { dirname, join } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';

const root = dirname(dirname(fileURLToPath(import.meta.url)));

/** @returns {string | null} what to tell the person, or null when this Node.js is fit */
export function nodeComplaint(version) {
  const [major = 0, minor = 0] = version.replace(/^v/, '').split('.').map(Number);
  if (major === 20 && minor >= 19) return null;
  return `Quarterpoise needs Node.js 20, at least 20.19; this is ${version}. Install Node.js 20 and try again.`;
}

/**
 * Whether what npm installed is what the lock file asks for. npm leaves a copy of the lock in node_modules, less the root entry
 * and less packages that belong to other machines (optional ones), so those are the only differences allowed.
 * @param {{ packages?: Record<string, { version?: string, integrity?: string, optional?: boolean, link?: boolean }> }} wanted package-lock.json
 * @param {{ packages?: Record<string, { version?: string, integrity?: string }> } | null} installed node_modules/.package-lock.json
 */
export function packagesMatch(wanted, installed) {
  if (!installed?.packages || !wanted.packages) return false;
  const entries = Object.entries(wanted.packages).filter(([path]) => path.includes('node_modules/'));
  return entries.every(([path, entry]) => {
    const found = installed.packages?.[path];
    if (!found) return entry.optional === true;
    return found.version === entry.version && found.integrity === entry.integrity;
  });
}

function readJson(path) {
  return existsSync(path) ? JSON.parse(readFileSync(path, 'utf8')) : null;
}

function installPackages() {
  const wanted = readJson(join(root, 'package-lock.json'));
  if (!wanted) return fail('package-lock.json is missing; get it back from the repository.');
  if (packagesMatch(wanted, readJson(join(root, 'node_modules/.package-lock.json')))) return true;
  console.log('Installing packages (npm ci) …');
  const { status } = spawnSync('npm', ['ci', '--loglevel=error'], {
    cwd: root,
    stdio: ['ignore', 'inherit', 'inherit'],
  });
  return status === 0 || fail('npm ci failed; its own message is above.');
}

function fail(message) {
  console.error(message);
  process.exitCode = 1;
  return false;
}

function run(command, args) {
  const script = join(root, 'scripts', `${command}.ts`);
  if (!/^[a-z-]+$/.test(command) || !existsSync(script)) return fail(`There is no command "${command}".`);
  const child = spawn(process.execPath, ['--import', 'tsx', script, ...args], { cwd: root, stdio: 'inherit' });
  // Ctrl-C reaches the child by itself, as both share the terminal; this process only has to outlive it
  process.on('SIGINT', () => undefined);
  for (const signal of ['SIGTERM', 'SIGHUP']) process.on(signal, () => child.kill(signal));
  child.on('error', (error) => fail(`"${command}" could not be started: ${error.message}`));
  child.on('exit', (code, signal) => process.exit(code ?? 128 + (constants.signals[signal] ?? 0)));
  return true;
}

function main() {
  const [command = 'start', ...args] = process.argv.slice(2);
  const complaint = nodeComplaint(process.version);
  if (complaint) return fail(complaint);
  return installPackages() && run(command, args);
}

if (process.argv[1] && import.meta.url === pathToFileURL(process.argv[1]).href) main();
