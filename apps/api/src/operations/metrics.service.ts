import { Injectable, type OnApplicationShutdown } from '@nestjs/common';
import type { FastifyInstance } from 'fastify';
import { createServer, type Server } from 'node:http';
import { once } from 'node:events';
import { collectDefaultMetrics, Gauge, Histogram, Registry } from 'prom-client';
import { ProgressStreams } from '../platform/answers/progress-streams.js';

/** Prometheus metrics of this process, on a port of their own. Labels are routes and statuses: no ids, no people. */
@Injectable()
export class MetricsService implements OnApplicationShutdown {
  readonly registry = new Registry();
  private server: Server | null = null;
  private readonly duration: Histogram<'method' | 'route' | 'status'>;

  constructor(streams: ProgressStreams) {
    collectDefaultMetrics({ register: this.registry });
    this.duration = new Histogram({
      name: 'http_request_duration_seconds',
      help: 'Time to answer a request, by route and status',
      labelNames: ['method', 'route', 'status'],
      buckets: [0.005, 0.01, 0.025, 0.05, 0.1, 0.25, 0.5, 1, 2.5, 5, 10],
      registers: [this.registry],
    });
    new Gauge({
      name: 'progress_streams_open',
      help: 'Event streams that are open just now',
      registers: [this.registry],
      collect() {
        this.set(streams.count);
      },
    });
  }

  /** Measures every request of the API; pages and their files count as one route. */
  watch(instance: FastifyInstance): void {
    instance.addHook('onResponse', (request, reply, done) => {
      const path = request.routeOptions.url ?? '';
      const route = path.startsWith('/api/') ? path : 'pages';
      this.duration.observe({ method: request.method, route, status: reply.statusCode }, reply.elapsedTime / 1_000);
      done();
    });
  }

  /** @returns The port that was opened, which is another one than asked for when 0 was asked for. */
  async listen(host: string, port: number): Promise<number> {
    this.server = createServer((request, response) => {
      if (request.method !== 'GET' || request.url !== '/metrics') {
        response.writeHead(404).end();
        return;
      }
      this.registry.metrics().then(
        (text) => response.writeHead(200, { 'content-type': this.registry.contentType }).end(text),
        () => response.writeHead(500).end(),
      );
    }).listen(port, host);
    await once(this.server, 'listening');
    const address = this.server.address();
    return typeof address === 'object' && address ? address.port : port;
  }

  onApplicationShutdown(): void {
    this.server?.close();
    this.server?.closeAllConnections();
    this.registry.clear();
  }
}
