import 'reflect-metadata';
import fastifyHelmet from '@fastify/helmet';
import fastifyMultipart from '@fastify/multipart';
import { NestFactory } from '@nestjs/core';
import { FastifyAdapter, type NestFastifyApplication } from '@nestjs/platform-fastify';
import { SwaggerModule } from '@nestjs/swagger';
import type { Redis } from 'ioredis';
import { Logger } from 'nestjs-pino';
import { randomUUID } from 'node:crypto';
import { ApiModule, type Composition, WHOLE_API } from './api.module.js';
import type { Environment } from './config/env.js';
import { MetricsService } from './operations/metrics.service.js';
import { openApiDocument } from './operations/open-api.document.js';
import { serveWebPages } from './operations/web-pages.js';
import { REDIS } from './platform/redis.js';
import { MULTIPART_LIMITS } from './platform/routing/upload.js';
import { setUpSessions } from './platform/session/session.setup.js';

const JSON_BODY_BYTES = 256 * 1024;

/**
 * The API, ready to listen. Tests use the same, possibly with fewer features.
 * @throws Error when routes and controllers do not fit, or the database is behind.
 */
export async function createApp(
  environment: Environment,
  composition: Composition = WHOLE_API,
): Promise<NestFastifyApplication> {
  const { trustedProxies } = environment.http;
  const adapter = new FastifyAdapter({
    genReqId: () => randomUUID(),
    requestIdHeader: false,
    trustProxy: trustedProxies.length > 0 ? [...trustedProxies] : false,
    bodyLimit: JSON_BODY_BYTES,
    forceCloseConnections: 'idle',
    exposeHeadRoutes: true,
  });
  const app = await NestFactory.create<NestFastifyApplication>(ApiModule.register(environment, composition), adapter, {
    bufferLogs: true,
    // Fastify reads JSON itself; forms are not accepted at all
    bodyParser: false,
    abortOnError: false,
  });
  app.useLogger(app.get(Logger));
  app.flushLogs();
  const instance = adapter.getInstance();
  instance.removeContentTypeParser('text/plain');
  instance.addHook('onRequest', (request, reply, done) => {
    reply.header('x-request-id', request.id);
    done();
  });
  app.get(MetricsService).watch(instance);
  await setUpHeaders(app, environment);
  await setUpSessions(app, environment, app.get<Redis>(REDIS));
  await app.register(fastifyMultipart, { limits: MULTIPART_LIMITS, throwFileSizeLimit: false });
  SwaggerModule.setup('api/docs', app, () => openApiDocument(composition.routes), {
    jsonDocumentUrl: 'api/docs/openapi.json',
    customSiteTitle: 'Quarterpoise API',
  });
  if (environment.http.webFolder !== null) await serveWebPages(app, environment.http.webFolder);
  // a stop that was asked for is a success: exit code 0
  app.enableShutdownHooks([], { useProcessExit: true });
  try {
    await app.init();
  } catch (error) {
    // what was opened on the way is closed again, so that a process that may not start ends
    await app.close().catch(() => undefined);
    throw error;
  }
  return app;
}

async function setUpHeaders(app: NestFastifyApplication, { http }: Environment): Promise<void> {
  await app.register(fastifyHelmet, {
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        baseUri: ["'self'"],
        connectSrc: ["'self'"],
        fontSrc: ["'self'", 'data:'],
        formAction: ["'self'"],
        frameAncestors: ["'none'"],
        imgSrc: ["'self'", 'data:'],
        objectSrc: ["'none'"],
        scriptSrc: ["'self'"],
        // the component library writes its styles into the page at run time
        styleSrc: ["'self'", "'unsafe-inline'"],
      },
    },
    // browsers refuse these on plain http and say so in the console
    strictTransportSecurity: http.isSecure,
    crossOriginOpenerPolicy: http.isSecure,
    originAgentCluster: http.isSecure,
    xFrameOptions: { action: 'deny' },
    referrerPolicy: { policy: 'same-origin' },
  });
}
