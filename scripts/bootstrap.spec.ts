import { describe, expect, it } from 'vitest';
import { nodeComplaint, packagesMatch } from './bootstrap.mjs';

describe('Node.js version', () => {
  it.each(['v20.19.0', 'v20.20.2'])('takes %s', (version) => expect(nodeComplaint(version)).toBeNull());
  it.each(['v20.18.3', 'v18.20.0', 'v22.1.0', 'v21.0.0'])('refuses %s in one line', (version) => {
    expect(nodeComplaint(version)).toMatch(new RegExp(`^Quarterpoise needs Node.js 20.*${version}.*$`));
  });
});

describe('installed packages', () => {
  const entry = { version: '1.0.0', integrity: 'sha512-a' };
  const wanted = {
    packages: {
      '': { version: '0.1.0' },
      'libs/dto': { version: '0.1.0' },
      'node_modules/one': entry,
      'libs/dto/node_modules/two': entry,
      'node_modules/@quarterpoise/dto': { link: true },
      'node_modules/for-another-machine': { ...entry, optional: true },
    },
  };
  const installed = (changes: Record<string, object | undefined> = {}) => {
    const { '': _root, 'libs/dto': _library, 'node_modules/for-another-machine': _other, ...rest } = wanted.packages;
    const packages = Object.entries({ ...rest, ...changes }).filter(([, value]) => value !== undefined);
    return { packages: Object.fromEntries(packages) };
  };

  it('match when they are those of the lock file', () => expect(packagesMatch(wanted, installed())).toBe(true));
  it('do not match when nothing is installed', () => expect(packagesMatch(wanted, null)).toBe(false));
  it.each([
    ['one is missing', { 'node_modules/one': undefined }],
    ['a nested one is missing', { 'libs/dto/node_modules/two': undefined }],
    ['a workspace is not linked', { 'node_modules/@quarterpoise/dto': undefined }],
    ['one has another version', { 'node_modules/one': { ...entry, version: '1.0.1' } }],
    ['one has other bytes', { 'node_modules/one': { ...entry, integrity: 'sha512-b' } }],
    ['an optional one is outdated', { 'node_modules/for-another-machine': { ...entry, version: '0.9.0' } }],
  ])('do not match when %s', (_, changes) => expect(packagesMatch(wanted, installed(changes))).toBe(false));
});
