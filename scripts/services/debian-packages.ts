import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';
import { POSTGRES_PROGRAMS } from './postgres.js';
import { REDIS_PROGRAM } from './redis.js';

export const CHROMIUM_PROGRAM = '/usr/bin/chromium';

/** What the product takes from Debian: the package, and the program by whose presence it is known to be there. */
const PROGRAMS = {
  'postgresql-15': `${POSTGRES_PROGRAMS}/postgres`,
  'redis-server': REDIS_PROGRAM,
  chromium: CHROMIUM_PROGRAM,
} as const;
export type DebianPackage = keyof typeof PROGRAMS;

/** What the decision needs to know of the machine; given by tests. */
export interface Machine {
  readonly isDebian: boolean;
  readonly isRoot: boolean;
  exists(path: string): boolean;
  /** Runs a program and returns its exit code. */
  run(program: string, args: readonly string[]): number;
  say(line: string): void;
}

/**
 * Installs those of the packages that are missing: as root, or through sudo where it asks for no password.
 * @throws Error with the one line to type where neither is possible.
 */
export function ensurePackages(packages: readonly DebianPackage[], machine: Machine = thisMachine()): void {
  const missing = packages.filter((name) => !machine.exists(PROGRAMS[name]));
  if (missing.length === 0) return;
  const byHand = `sudo apt-get install --no-install-recommends ${missing.join(' ')}`;
  if (!machine.isDebian) {
    throw new Error(
      `${missing.join(', ')} must be installed, and this is no Debian system; external services can be given as DATABASE_URL, OWNER_DATABASE_URL and REDIS_URL`,
    );
  }
  if (!machine.isRoot && machine.run('sudo', ['-n', 'true']) !== 0) {
    throw new Error(`Missing: ${missing.join(', ')}. Type this once and start again:  ${byHand}`);
  }
  machine.say(`Installing from Debian: ${missing.join(', ')} …`);
  const script = ['sh', '-c', INSTALL, 'install', ...missing];
  const [program, ...args] = machine.isRoot ? script : ['sudo', '-n', ...script];
  const code = machine.run(program as string, args);
  const still = missing.filter((name) => !machine.exists(PROGRAMS[name]));
  if (code !== 0 || still.length > 0) {
    throw new Error(
      `${(still.length > 0 ? still : missing).join(', ')} could not be installed. Try by hand:  ${byHand}`,
    );
  }
}

/**
 * The packages would start services of their own, on the standard ports, now and at every boot. Debian's two switches against that
 * are set for the time of the installation: policy-rc.d (nothing is started; an administrator's own one is left alone) and
 * createcluster.d (no PostgreSQL cluster is made). Services that run already are not touched.
 */
const INSTALL = `
set -e
export DEBIAN_FRONTEND=noninteractive
policy=/usr/sbin/policy-rc.d
clusters=/etc/postgresql-common/createcluster.d/quarterpoise.conf
made=
cleanup() { rm -f "$clusters"; rmdir "\${clusters%/*}" 2>/dev/null || true; [ -z "$made" ] || rm -f "$policy"; }
trap cleanup EXIT
trap 'exit 130' INT TERM HUP
if [ ! -e "$policy" ]; then made=1; printf '#!/bin/sh\\nexit 101\\n' > "$policy"; chmod 755 "$policy"; fi
mkdir -p "\${clusters%/*}"
echo 'create_main_cluster = false' > "$clusters"
get() { apt-get -qq -o DPkg::Lock::Timeout=300 "$@" >&2; }
get install --yes --no-install-recommends "$@" || { get update; get install --yes --no-install-recommends "$@"; }
if [ -d /run/systemd/system ]; then
  for name in "$@"; do
    case "$name" in redis-server) systemctl disable --quiet redis-server ;; esac
  done
fi
`;

function thisMachine(): Machine {
  return {
    isDebian: existsSync('/etc/debian_version') && existsSync('/usr/bin/apt-get'),
    isRoot: process.getuid?.() === 0,
    exists: existsSync,
    // apt's own messages are kept for the case that it fails
    run(program, args) {
      const { status, stderr } = spawnSync(program, args, { stdio: ['ignore', 'ignore', 'pipe'], encoding: 'utf8' });
      if (status !== 0 && program !== 'sudo') process.stderr.write(stderr ?? '');
      return status ?? 1;
    },
    say: (line) => console.log(line),
  };
}
