import { PROBLEMS } from '@quarterpoise/dto';
import { describe, expect, it } from 'vitest';

const files = import.meta.glob<Record<string, unknown>>('./*/*.json', { eager: true, import: 'default' });

/** Every text as `area.key`, plural endings taken off: languages differ in how many plurals they have. */
function keysOf(value: unknown, path = ''): string[] {
  if (typeof value === 'string') return [path.replace(/_(one|many|other)$/, '')];
  return Object.entries(value as Record<string, unknown>).flatMap(([key, below]) =>
    keysOf(below, path === '' ? key : `${path}.${key}`),
  );
}
const keys = (file: unknown) => new Set(keysOf(file));

describe('the texts', () => {
  it('have a title and a remedy for every problem of the contract', () => {
    for (const language of ['en', 'es']) {
      const texts = files[`./${language}/problems.json`] as Record<string, { title?: string; remedy?: string }>;
      for (const code of [...Object.keys(PROBLEMS), 'unreachable']) {
        expect(texts[code]?.title, `${language} ${code}`).toBeTruthy();
        expect(texts[code]?.remedy, `${language} ${code}`).toBeTruthy();
      }
    }
  });

  it('say the same things in Spanish wherever an area exists in Spanish', () => {
    const spanish = Object.keys(files).filter((path) => path.startsWith('./es/'));
    expect(spanish.length).toBeGreaterThan(0);
    for (const path of spanish) expect(keys(files[path]), path).toEqual(keys(files[path.replace('/es/', '/en/')]));
  });
});
