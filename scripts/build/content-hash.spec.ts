import { mkdirSync, mkdtempSync, renameSync, rmSync, utimesSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, expect, it } from 'vitest';
import { contentHash } from './content-hash.js';

let root: string;
beforeEach(() => {
  root = mkdtempSync(join(tmpdir(), 'qp-hash-'));
  mkdirSync(join(root, 'src/deep'), { recursive: true });
  writeFileSync(join(root, 'src/one.ts'), 'one');
  writeFileSync(join(root, 'src/deep/two.ts'), 'two');
  writeFileSync(join(root, 'settings.json'), '{}');
});
afterEach(() => rmSync(root, { recursive: true }));

const hash = () => contentHash(root, ['src', 'settings.json', 'absent'], (path) => path.endsWith('.spec.ts'));

it('stays the same when only times change or what is left out', () => {
  const before = hash();
  utimesSync(join(root, 'src/one.ts'), 1, 1);
  writeFileSync(join(root, 'src/one.spec.ts'), 'a test');
  expect(hash()).toBe(before);
});

it.each([
  ['a file changes', () => writeFileSync(join(root, 'src/deep/two.ts'), 'too')],
  ['a setting changes', () => writeFileSync(join(root, 'settings.json'), '[]')],
  ['a file is added', () => writeFileSync(join(root, 'src/three.ts'), '')],
  ['a file is gone', () => rmSync(join(root, 'src/one.ts'))],
  ['a file is renamed', () => renameSync(join(root, 'src/one.ts'), join(root, 'src/won.ts'))],
])('changes when %s', (_, change) => {
  const before = hash();
  change();
  expect(hash()).not.toBe(before);
});
