import { describe, expect, it } from 'vitest';
import { isSameOrigin } from './same-origin.js';

const ours = 'https://statements.example.test';

describe('isSameOrigin', () => {
  it.each([
    [{}, true],
    [{ origin: ours }, true],
    [{ 'sec-fetch-site': 'same-origin', origin: ours }, true],
    [{ 'sec-fetch-site': 'none' }, true],
    [{ origin: 'http://127.0.0.1:3000', host: '127.0.0.1:3000' }, true],
    [{ origin: 'https://elsewhere.example.test', host: 'statements.example.test' }, false],
    [{ 'sec-fetch-site': 'cross-site' }, false],
    [{ 'sec-fetch-site': 'same-site', origin: ours }, false],
    [{ origin: 'null', host: 'statements.example.test' }, false],
  ])('%j → %s', (headers, expected) => {
    expect(isSameOrigin(headers, ours)).toBe(expected);
  });
});
