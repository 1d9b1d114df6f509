import { randomUUID } from 'node:crypto';
import { mkdir, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { MetricsService } from '../src/operations/metrics.service.js';
import { SchemaGate } from '../src/operations/schema.gate.js';
import { REDIS } from '../src/platform/redis.js';
import { SignInModule } from '../src/sign-in/sign-in.module.js';
import { startTestApi, type TestApi } from './testing/test-api.js';

describe('operating the API', () => {
  let api: TestApi;
  const web = join(tmpdir(), `web-${randomUUID()}`);

  beforeAll(async () => {
    await mkdir(join(web, 'assets'), { recursive: true });
    await writeFile(join(web, 'index.html'), '<!doctype html><title>pages</title>');
    await writeFile(join(web, 'assets/index-1a2b.js'), 'export {};');
    await writeFile(join(web, 'assets/index-1a2b.js.gz'), 'compressed');
    api = await startTestApi({ features: [SignInModule] }, { WEB_FOLDER: web });
  });
  afterAll(async () => {
    await api?.close();
    await rm(web, { recursive: true });
  });

  const get = (path: string, headers: Record<string, string> = {}) => fetch(`${api.url}${path}`, { headers });

  it('tells that it lives and that it is ready', async () => {
    expect(await (await get('/api/health/live')).json()).toEqual({ status: 'up' });
    const ready = await get('/api/health/ready');
    expect(ready.status).toBe(200);
    expect(await ready.json()).toEqual({ status: 'up', checks: { database: 'up', redis: 'up', schema: 'up' } });
  });

  it('is not ready on a schema that is behind, and does not start on it', async () => {
    await api.database.owner.query('begin');
    try {
      const { rows } = await api.database.owner.query<{ id: number; name: string }>(
        'delete from schema_migration where id = (select max(id) from schema_migration) returning id, name',
      );
      await api.database.owner.query('commit');
      await expect(api.app.get(SchemaGate).onModuleInit()).rejects.toThrow(rows[0]!.name);
      const ready = await get('/api/health/ready');
      expect(ready.status).toBe(503);
      expect(await ready.json()).toMatchObject({ checks: { schema: 'behind' } });
      await api.database.owner.query('insert into schema_migration (id, name) values ($1, $2)', [
        rows[0]!.id,
        rows[0]!.name,
      ]);
    } finally {
      await api.database.owner.query('rollback');
    }
  });

  it('serves the pages: hashed files for ever, everything else asked about, unknown addresses as screens', async () => {
    const asset = await get('/assets/index-1a2b.js');
    expect(asset.headers.get('cache-control')).toBe('public, max-age=31536000, immutable');
    expect(asset.headers.get('content-type')).toContain('javascript');
    for (const screen of ['/', '/plans/1/quarters/2026-Q3?tab=files']) {
      const page = await get(screen);
      expect(page.status).toBe(200);
      expect(page.headers.get('cache-control')).toBe('no-cache');
      expect(await page.text()).toContain('pages');
    }
  });

  it('prefers a file that was compressed beforehand', async () => {
    const response = await get('/assets/index-1a2b.js', { 'accept-encoding': 'gzip' });
    expect(response.headers.get('content-encoding')).toBe('gzip');
    expect(response.headers.get('vary')).toContain('accept-encoding');
    await response.body?.cancel();
  });

  it.each(['/assets/gone-1a2b.js', '/api/none', '/assets/../../etc/passwd', '/%2e%2e/%2e%2e/etc/passwd'])(
    'does not give a page for %s',
    async (path) => {
      const text = await (await get(path)).text();
      expect(text).not.toContain('root:');
      if (!path.includes('etc')) expect(text).toContain('not-found');
    },
  );

  it('sends headers that keep the page to itself', async () => {
    const { headers } = await get('/');
    const policy = headers.get('content-security-policy')!;
    expect(policy).toContain("script-src 'self';");
    expect(policy).toContain("frame-ancestors 'none'");
    expect(policy).not.toContain('upgrade-insecure-requests');
    expect(headers.get('x-content-type-options')).toBe('nosniff');
    expect(headers.get('strict-transport-security')).toBeNull();
    expect(headers.getSetCookie()).toEqual([]);
  });

  it('describes itself', async () => {
    const document = (await (await get('/api/docs/openapi.json')).json()) as { paths: object };
    expect(Object.keys(document.paths)).toContain('/api/v1/auth/sign-in');
    const page = await get('/api/docs');
    expect(page.status).toBe(200);
    expect(await page.text()).toContain('swagger-ui');
    expect((await get('/api/docs/swagger-ui.css')).status).toBe(200);
    expect((await get('/api/docs/swagger-ui-init.js')).status).toBe(200);
  });

  it('measures by route on a port of its own', async () => {
    await api.client().get('/auth/session');
    const port = await api.app.get(MetricsService).listen('127.0.0.1', 0);
    const text = await (await fetch(`http://127.0.0.1:${port}/metrics`)).text();
    expect(text).toContain(
      'http_request_duration_seconds_count{method="GET",route="/api/v1/auth/session",status="401"}',
    );
    expect((await get('/metrics')).headers.get('content-type')).toContain('text/html');
  });

  it('says that it is not available while Redis is away, and comes back by itself', async () => {
    const { email } = await api.person('auditor');
    const client = await api.signIn(email);
    const redis = api.app.get(REDIS);
    redis.disconnect();
    const away = await client.get('/auth/session');
    expect(away).toMatchObject({ status: 503, body: { code: 'service-unavailable' } });
    expect(away.headers.get('retry-after')).toBe('2');
    expect((await get('/api/health/ready')).status).toBe(503);
    await redis.connect();
    expect((await client.get('/auth/session')).status).toBe(200);
  });
});
