import { Controller, Injectable, Module } from '@nestjs/common';
import { EntityManager } from '@mikro-orm/postgresql';
import { IllegalMove, withScope } from '@quarterpoise/database';
import { defineRoute, hats, idParams, PUBLIC, SIGNED_IN } from '@quarterpoise/dto';
import { createHash } from 'node:crypto';
import { z } from 'zod';
import { type CurrentPerson, Person } from '../../src/platform/access/current-person.decorator.js';
import { CsvDownload, PreparedJson, ProgressStream, Tagged } from '../../src/platform/answers/answers.js';
import { notFound } from '../../src/platform/problems/problem.exception.js';
import { Input } from '../../src/platform/routing/input.decorator.js';
import type { InputOf } from '../../src/platform/routing/route-input.js';
import { RouteOf } from '../../src/platform/routing/route-of.decorator.js';

const administrator = hats('administrator');
const counted = z.object({ count: z.int() });

/** Routes of a feature that exists for the tests of the platform alone. */
export const sampleRoutes = {
  count: defineRoute({
    id: 'sample.count',
    method: 'POST',
    path: '/sample/:id/counts',
    access: administrator,
    summary: 'Counts up',
    params: idParams,
    query: z.object({ step: z.coerce.number().int().min(1).max(9).default(1) }),
    body: z.object({ note: z.string().regex(/^[a-z]+$/), list: z.array(z.uuid()).max(2).default([]) }),
    response: counted,
    status: 201,
  }),
  nothing: defineRoute({
    id: 'sample.nothing',
    method: 'POST',
    path: '/sample/nothing',
    access: SIGNED_IN,
    summary: 'Nothing',
    status: 204,
  }),
  tagged: defineRoute({
    id: 'sample.tagged',
    method: 'GET',
    path: '/sample/tagged',
    access: SIGNED_IN,
    summary: 'Never changes',
    response: counted,
  }),
  prepared: defineRoute({
    id: 'sample.prepared',
    method: 'GET',
    path: '/sample/prepared/:id',
    access: PUBLIC,
    summary: 'JSON as the database made it',
    params: z.object({ id: z.string() }),
    response: counted,
  }),
  file: defineRoute({
    id: 'sample.file',
    method: 'GET',
    path: '/sample/file.csv',
    access: SIGNED_IN,
    summary: 'A file',
    produces: 'csv',
  }),
  events: defineRoute({
    id: 'sample.events',
    method: 'GET',
    path: '/sample/events/:id',
    access: SIGNED_IN,
    summary: 'Progress',
    params: z.object({ id: z.string() }),
    produces: 'events',
  }),
  upload: defineRoute({
    id: 'sample.upload',
    method: 'POST',
    path: '/sample/uploads',
    access: administrator,
    summary: 'A file on its way in',
    body: z.object({ kind: z.enum(['read', 'ignore', 'fail']), rows: z.coerce.number().int() }),
    consumes: 'multipart',
    response: z.object({ kind: z.string(), rows: z.int(), name: z.string(), bytes: z.int(), sha256: z.string() }),
  }),
  fault: defineRoute({
    id: 'sample.fault',
    method: 'GET',
    path: '/sample/faults/:id',
    access: PUBLIC,
    summary: 'Goes wrong',
    params: z.object({ id: z.string() }),
    response: counted,
  }),
};

/** What the tests look at and steer by. */
@Injectable()
export class SampleState {
  count = 0;
  looks = 0;
  isFinal = false;
  failure: Error | null = null;
  handlerMs = 0;
  uploadFailure: string | null = null;
}

@Controller()
export class SampleController {
  constructor(
    private readonly state: SampleState,
    private readonly em: EntityManager,
  ) {}

  @RouteOf(sampleRoutes.count)
  async count(@Input() { query }: InputOf<typeof sampleRoutes.count>) {
    await new Promise((done) => setTimeout(done, this.state.handlerMs));
    if (this.state.failure) throw this.state.failure;
    this.state.count += query.step;
    return { count: this.state.count, secret: 'not in the schema' };
  }

  @RouteOf(sampleRoutes.nothing)
  nothing(): void {
    this.state.count += 1;
  }

  @RouteOf(sampleRoutes.tagged)
  tagged() {
    return new Tagged({ count: 7 }, 'seven');
  }

  @RouteOf(sampleRoutes.prepared)
  prepared(@Input() { params }: InputOf<typeof sampleRoutes.prepared>) {
    return new PreparedJson(params.id === 'good' ? '{"count": 7}' : '{"count": "seven"}', 'seven');
  }

  @RouteOf(sampleRoutes.file)
  file() {
    return new CsvDownload('rows "of" today.csv', ['line,column\r\n', '1,"ä"\r\n']);
  }

  @RouteOf(sampleRoutes.events)
  events(@Person() person: CurrentPerson, @Input() { params }: InputOf<typeof sampleRoutes.events>) {
    return new ProgressStream(async () => {
      this.state.looks += 1;
      if (params.id === 'foreign') throw notFound();
      await withScope(this.em, person, (tx) => tx.execute('select 1'));
      return { data: { count: this.state.count }, isFinal: this.state.isFinal };
    });
  }

  @RouteOf(sampleRoutes.upload)
  async upload(@Input() { body, file }: InputOf<typeof sampleRoutes.upload>) {
    const digest = createHash('sha256');
    let bytes = 0;
    if (body.kind === 'fail') throw new IllegalMove('import', 'refused', 'checking', 'No.');
    if (body.kind === 'read') {
      try {
        for await (const chunk of file.stream as AsyncIterable<Buffer>) {
          digest.update(chunk);
          bytes += chunk.length;
        }
      } catch (error) {
        this.state.uploadFailure = String(error);
        throw error;
      }
    }
    return { ...body, name: file.fileName, bytes, sha256: digest.digest('hex') };
  }

  @RouteOf(sampleRoutes.fault)
  async fault(@Input() { params }: InputOf<typeof sampleRoutes.fault>) {
    if (params.id === 'unforeseen') throw new TypeError('the secret is plum');
    if (params.id === 'contract') return { count: 'seven' } as unknown as { count: number };
    if (params.id === 'move') throw new IllegalMove('run', 'completed', 'cancelled', 'The run has ended.');
    if (params.id === 'database') await this.em.fork().execute(`select 'Ada'::int`);
    throw notFound();
  }
}

@Module({ controllers: [SampleController], providers: [SampleState] })
export class SampleModule {}
