import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, expect, it } from 'vitest';
import { launcherOf, takeDataFolder } from './launcher-lock.js';

let folder: string;
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'qp-lock-'));
});
afterEach(() => rmSync(folder, { recursive: true }));

it('lets one process at a time run services for a data folder', () => {
  const release = takeDataFolder(folder);
  expect(launcherOf(folder)).toBe(process.pid);
  expect(() => takeDataFolder(folder)).toThrow(`kill ${process.pid}`);
  release();
  expect(launcherOf(folder)).toBeNull();
  takeDataFolder(folder)();
});

it('is not held by a process that ended, nor by a later one with the same number', () => {
  writeFileSync(join(folder, 'launcher'), `${process.pid}@1\n`);
  expect(launcherOf(folder)).toBeNull();
  writeFileSync(join(folder, 'launcher'), '4194305@1\n');
  expect(launcherOf(folder)).toBeNull();
  expect(takeDataFolder(folder)).toBeTypeOf('function');
});
