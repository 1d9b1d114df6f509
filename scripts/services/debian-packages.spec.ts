import { describe, expect, it } from 'vitest';
import { ensurePackages, type Machine } from './debian-packages.js';

/** A machine that has the given programs; installing brings all others unless `broken`. */
function machine(has: string[], traits: Partial<Machine> & { sudo?: boolean; broken?: boolean } = {}) {
  const calls: string[][] = [];
  const said: string[] = [];
  let installed = false;
  const made: Machine = {
    isDebian: traits.isDebian ?? true,
    isRoot: traits.isRoot ?? true,
    exists: (path) => installed || has.some((name) => path.endsWith(name)),
    run(program, args) {
      calls.push([program, ...args]);
      if (program === 'sudo' && !traits.sudo) return 1;
      if (args.includes('install')) installed = !traits.broken;
      return traits.broken ? 100 : 0;
    },
    say: (line) => said.push(line),
  };
  return { made, calls, said };
}
const packagesOf = (call: string[] | undefined) => call?.slice(call.indexOf('install') + 1);

describe('packages from Debian', () => {
  it('does nothing when all programs are there', () => {
    const { made, calls, said } = machine(['postgres', 'redis-server']);
    ensurePackages(['postgresql-15', 'redis-server'], made);
    expect([calls, said]).toEqual([[], []]);
  });

  it('installs only what is missing, as root, and says so', () => {
    const { made, calls, said } = machine(['postgres']);
    ensurePackages(['postgresql-15', 'redis-server', 'chromium'], made);
    expect(calls).toHaveLength(1);
    expect(calls[0]?.[0]).toBe('sh');
    expect(packagesOf(calls[0])).toEqual(['redis-server', 'chromium']);
    expect(said).toEqual(['Installing from Debian: redis-server, chromium …']);
  });

  it('goes through sudo where it asks for no password', () => {
    const { made, calls } = machine([], { isRoot: false, sudo: true });
    ensurePackages(['redis-server'], made);
    expect(calls.map((call) => call.slice(0, 3))).toEqual([
      ['sudo', '-n', 'true'],
      ['sudo', '-n', 'sh'],
    ]);
  });

  it('gives the one line to type where it may not install', () => {
    const { made, calls } = machine([], { isRoot: false });
    expect(() => ensurePackages(['postgresql-15', 'redis-server'], made)).toThrow(
      'sudo apt-get install --no-install-recommends postgresql-15 redis-server',
    );
    expect(calls).toHaveLength(1);
  });

  it('says what could not be installed', () => {
    const { made } = machine([], { broken: true });
    expect(() => ensurePackages(['chromium'], made)).toThrow(/^chromium could not be installed/);
  });

  it('names the way out on another system', () => {
    const { made, calls } = machine([], { isDebian: false });
    expect(() => ensurePackages(['postgresql-15'], made)).toThrow('OWNER_DATABASE_URL');
    expect(calls).toEqual([]);
  });
});
