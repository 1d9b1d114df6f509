import { createServer } from 'node:net';
import { expect, it } from 'vitest';
import { freePort, freePortNear } from './free-port.js';

it('gives the preferred port when it is free and another one when it is taken', async () => {
  const port = await freePort();
  expect(await freePortNear(port)).toBe(port);
  const holder = createServer();
  await new Promise<void>((resolve) => holder.listen(port, '127.0.0.1', resolve));
  try {
    const other = await freePortNear(port);
    expect(other).not.toBe(port);
    expect(other).toBeGreaterThan(1023);
  } finally {
    holder.close();
  }
});
