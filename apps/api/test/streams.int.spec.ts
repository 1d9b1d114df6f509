import type { RouteDefinition } from '@quarterpoise/dto';
import { createHash } from 'node:crypto';
import { connect } from 'node:net';
import { setTimeout as pause } from 'node:timers/promises';
import { afterAll, beforeAll, beforeEach, describe, expect, it, vi } from 'vitest';
import { ProgressStreams } from '../src/platform/answers/progress-streams.js';
import { SignInModule } from '../src/sign-in/sign-in.module.js';
import { SampleModule, sampleRoutes, SampleState } from './testing/sample-feature.js';
import { routesOf, startTestApi, type TestApi } from './testing/test-api.js';
import { problemWith, type TestClient } from './testing/test-client.js';

const composition = () => {
  const features = [SignInModule, SampleModule];
  return { features, routes: [...routesOf([SignInModule]), ...Object.values<RouteDefinition>(sampleRoutes)] };
};

describe('streams', () => {
  let api: TestApi;
  let state: SampleState;
  let client: TestClient;
  let personId: string;

  beforeAll(async () => {
    api = await startTestApi(composition());
    state = api.app.get(SampleState);
    const person = await api.person('administrator');
    personId = person.personId;
    client = await api.signIn(person.email);
  });
  afterAll(() => api?.close());
  beforeEach(() => Object.assign(state, new SampleState()));

  describe('of progress', () => {
    it('send what changes, and end with "finished"', async () => {
      const response = await client.send('GET', '/sample/events/own');
      expect(response.headers.get('content-type')).toBe('text/event-stream');
      const text = response.text();
      await pause(700);
      state.count = 5;
      await pause(700);
      state.isFinal = true;
      expect(await text).toBe(
        'event: progress\ndata: {"count":0}\n\nevent: progress\ndata: {"count":5}\n\nevent: finished\ndata: {"count":5}\n\n',
      );
    });

    it('answer a stranger with a problem and not with a stream', async () => {
      expect(await client.get('/sample/events/foreign')).toMatchObject({ status: 404, body: problemWith('not-found') });
      expect((await api.client().get('/sample/events/own')).status).toBe(401);
    });

    it('stop looking when the page has gone', async () => {
      const leaving = new AbortController();
      const response = await client.send('GET', '/sample/events/own', { signal: leaving.signal });
      await response.body!.getReader().read();
      expect(api.app.get(ProgressStreams).count).toBe(1);
      leaving.abort();
      await vi.waitFor(() => expect(api.app.get(ProgressStreams).count).toBe(0), { timeout: 5_000 });
      const looks = state.looks;
      await pause(1_200);
      expect(state.looks).toBe(looks);
    });

    it('end without "finished" when the person may no longer look', async () => {
      const response = await client.send('GET', '/sample/events/own');
      await api.database.owner.query('update person set disabled_at = now() where id = $1', [personId]);
      try {
        expect(await response.text()).not.toContain('finished');
      } finally {
        await api.database.owner.query('update person set disabled_at = null where id = $1', [personId]);
      }
    });

    it('end without "finished" when the person signs out', async () => {
      const leaving = await api.signIn((await api.person('auditor')).email);
      const response = await leaving.send('GET', '/sample/events/own');
      await leaving.post('/auth/sign-out');
      expect(await response.text()).not.toContain('finished');
    });

    it('end when the service stops, which does not wait for them', async () => {
      const stopping = await startTestApi(composition());
      const reader = await stopping.signIn((await stopping.person('administrator')).email);
      const response = await reader.send('GET', '/sample/events/own');
      const text = response.text();
      const startedAt = performance.now();
      await stopping.close();
      expect(performance.now() - startedAt).toBeLessThan(5_000);
      expect(await text).not.toContain('finished');
    });
  });

  describe('of an upload', () => {
    const fields = { kind: 'read', rows: '3' };

    it('reach the handler whole, with the fields before the file', async () => {
      const content = 'a,b\r\n'.repeat(1_000_000);
      const answer = await client.upload('/sample/uploads', fields, { name: 'päd.csv', content });
      expect(answer.body).toEqual({
        kind: 'read',
        rows: 3,
        name: 'päd.csv',
        bytes: content.length,
        sha256: createHash('sha256').update(content).digest('hex'),
      });
    });

    it.each([
      ['a faulty field', { kind: 'read', rows: 'x' }, 422, 'validation-failed'],
      ['a missing field', { kind: 'read' }, 422, 'validation-failed'],
      ['a handler that refuses', { kind: 'fail', rows: '1' }, 409, 'illegal-move'],
    ] as const)('are run out after %s, so that the sender can read why', async (_, faulty, status, code) => {
      const content = 'x'.repeat(20_000_000);
      const answer = await client.upload('/sample/uploads', { ...faulty }, { name: 'a.csv', content });
      expect(answer).toMatchObject({ status, body: problemWith(code) });
    });

    it('may be ignored by the handler', async () => {
      const file = { name: 'a.csv', content: 'x'.repeat(5_000_000) };
      expect(await client.upload('/sample/uploads', { ...fields, kind: 'ignore' }, file)).toMatchObject({
        status: 200,
        body: { bytes: 0 },
      });
    });

    it('need a file, and multipart', async () => {
      const form = new FormData();
      form.append('kind', 'read');
      const withoutFile = await client.send('POST', '/sample/uploads', { body: form });
      expect(withoutFile.status).toBe(400);
      expect(await client.post('/sample/uploads', fields)).toMatchObject({
        status: 400,
        body: problemWith('malformed-request'),
      });
    });

    it('fail in the handler when the sender goes away half-way, so that nothing is taken for whole', async () => {
      const { port } = new URL(api.url);
      const socket = connect(Number(port), '127.0.0.1');
      const head = [
        'POST /api/v1/sample/uploads HTTP/1.1',
        'host: localhost',
        `cookie: ${client.cookie}`,
        `x-csrf-token: ${client.csrfToken}`,
        'content-type: multipart/form-data; boundary=cut',
        'content-length: 1000000',
        '',
        '',
      ].join('\r\n');
      const part = (name: string, value: string) =>
        `--cut\r\ncontent-disposition: form-data; name="${name}"\r\n\r\n${value}\r\n`;
      const file = '--cut\r\ncontent-disposition: form-data; name="file"; filename="a.csv"\r\n\r\nx,y\r\n';
      socket.write(head + part('kind', 'read') + part('rows', '1') + file);
      await pause(300);
      socket.destroy();
      await vi.waitFor(() => expect(state.uploadFailure).not.toBeNull(), { timeout: 5_000 });
    });
  });
});
