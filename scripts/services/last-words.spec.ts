import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, expect, it } from 'vitest';
import { lastWords } from './last-words.js';

const folder = mkdtempSync(join(tmpdir(), 'qp-log-'));
const file = join(folder, 'log');
afterAll(() => rmSync(folder, { recursive: true }));

it.each([
  ['the last line', 'one\ntwo\n\n', 'two'],
  [
    'an error rather than its stack',
    'start\nTypeError: x is not a function\n    at y.ts:1\n\nNode.js v20',
    'TypeError: x is not a function',
  ],
  [
    'a refusal of PostgreSQL',
    '2026-01-01 UTC [1] FATAL:  could not bind\n[1] LOG:  shut down',
    '2026-01-01 UTC [1] FATAL:  could not bind',
  ],
  [
    'the message of a structured line',
    '{"level":30,"msg":"up"}\n{"level":60,"msg":"The schema is behind"}\n',
    'The schema is behind',
  ],
  ['the error of a structured line', '{"level":50,"msg":"failed","err":{"message":"no Redis"}}', 'no Redis'],
  ['that nothing was said', '', 'it said nothing'],
])('gives %s', (_, log, words) => {
  writeFileSync(file, log);
  expect(lastWords(file)).toBe(words);
});

it('does not mind that the log is gone', () => expect(lastWords(join(folder, 'absent'))).toBe('it said nothing'));
