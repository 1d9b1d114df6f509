import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { inputFaults } from './input-faults.js';

function faultsOf(schema: z.ZodType, value: unknown, prefix: '' | '/query' | '/params' = '') {
  const parsed = schema.safeParse(value);
  if (parsed.success) throw new Error('the value was expected to be refused');
  return inputFaults(parsed.error, prefix);
}

describe('inputFaults', () => {
  it('points at each faulty place, into lists as well', () => {
    const schema = z.object({ flagIds: z.array(z.uuid()), reason: z.string() });
    expect(faultsOf(schema, { flagIds: ['x'] })).toEqual([
      { pointer: '/flagIds/0', code: 'invalid-format', detail: 'Invalid UUID' },
      { pointer: '/reason', code: 'invalid-type', detail: 'This is required.' },
    ]);
  });

  it('tells the query from the body', () => {
    expect(faultsOf(z.object({ limit: z.coerce.number().max(5) }), { limit: '9' }, '/query')[0]!.pointer).toBe(
      '/query/limit',
    );
  });

  it('escapes the signs that a pointer uses itself', () => {
    expect(faultsOf(z.object({ 'a/b~c': z.string() }), {})[0]!.pointer).toBe('/a~1b~0c');
  });

  it('does not show patterns to people, but does show a sentence of our own', () => {
    expect(faultsOf(z.object({ code: z.string().regex(/^[A-Z]+$/) }), { code: '1' })[0]!.detail).not.toContain('A-Z');
    expect(faultsOf(z.object({ code: z.string().regex(/^[A-Z]+$/, 'capitals') }), { code: '1' })[0]!.detail).toBe(
      'capitals',
    );
  });
});
