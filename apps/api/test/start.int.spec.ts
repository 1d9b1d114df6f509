import { ROUTES } from '@quarterpoise/dto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { WHOLE_API } from '../src/api.module.js';
import { startTestApi, type TestApi } from './testing/test-api.js';

describe('the whole API', () => {
  let api: TestApi;
  beforeAll(async () => {
    api = await startTestApi(WHOLE_API);
  });
  afterAll(() => api?.close());

  it('starts with a handler for every route of the table', async () => {
    expect(WHOLE_API.routes).toBe(ROUTES);
    expect((await fetch(`${api.url}/api/health/ready`)).status).toBe(200);
  });
});
