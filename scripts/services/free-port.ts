import { createServer } from 'node:net';

/** A port on loopback that nobody listens on. Another program may take it before it is used: whoever uses it must be ready to try again. */
export function freePort(): Promise<number> {
  return tryPort(0) as Promise<number>;
}

/** The preferred port when it is free, another one when it is not. */
export async function freePortNear(preferred: number): Promise<number> {
  return (await tryPort(preferred)) ?? freePort();
}

function tryPort(port: number): Promise<number | null> {
  return new Promise((resolve, reject) => {
    const probe = createServer();
    probe.once('error', (error: NodeJS.ErrnoException) => {
      if (port !== 0 && (error.code === 'EADDRINUSE' || error.code === 'EACCES')) resolve(null);
      else reject(error);
    });
    probe.listen(port, '127.0.0.1', () => {
      const address = probe.address();
      const found = typeof address === 'object' && address ? address.port : null;
      probe.close(() => resolve(found));
    });
  });
}
