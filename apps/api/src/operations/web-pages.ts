import fastifyStatic from '@fastify/static';
import { NotFoundException } from '@nestjs/common';
import type { NestFastifyApplication } from '@nestjs/platform-fastify';
import { existsSync } from 'node:fs';
import { join, resolve, sep } from 'node:path';

const HOUR = 3_600;
const FOR_EVER = `public, max-age=${365 * 24 * HOUR}, immutable`;

/**
 * Serves the built web pages: files with a digest in their name for ever, everything else asked about each time. Any other address
 * outside /api is a screen of the single page. Files already compressed beside the original (`.br`, `.gz`) are preferred.
 * @throws Error when there are no built pages in the folder.
 */
export async function serveWebPages(app: NestFastifyApplication, folder: string): Promise<void> {
  const root = resolve(folder);
  if (!existsSync(join(root, 'index.html')))
    throw new Error(`There are no built web pages in ${root}; build them first.`);
  const hashed = join(root, 'assets') + sep;
  await app.register(fastifyStatic, {
    root,
    wildcard: false,
    index: false,
    preCompressed: true,
    cacheControl: false,
    setHeaders: (reply, path) => {
      void reply.header('cache-control', path.startsWith(hashed) ? FOR_EVER : 'no-cache');
    },
  });
  const instance = app.getHttpAdapter().getInstance();
  for (const url of ['/', '/*']) {
    instance.get(url, (request, reply) => {
      const [path = '/'] = request.url.split('?', 1);
      // a missing file is a missing file: a page in its place would be kept as script or style
      if (/^\/(api|assets)(\/|$)/.test(path)) throw new NotFoundException();
      return reply.sendFile('index.html');
    });
  }
}
