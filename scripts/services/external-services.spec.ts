import { expect, it } from 'vitest';
import { externalServices } from './external-services.js';

it('takes nothing from an empty environment', () => {
  expect(externalServices({ REDIS_URL: '' })).toEqual({
    database: null,
    adminUrl: null,
    redisUrl: null,
    smtpUrl: null,
  });
});

it('takes both connections to a database together', () => {
  const given = { DATABASE_URL: 'postgresql://app@db/q', OWNER_DATABASE_URL: 'postgresql://owner@db/q' };
  expect(externalServices(given).database).toEqual({
    appUrl: 'postgresql://app@db/q',
    ownerUrl: 'postgresql://owner@db/q',
  });
});

it.each(['DATABASE_URL', 'OWNER_DATABASE_URL'])('refuses %s alone', (name) => {
  expect(() => externalServices({ [name]: 'postgresql://db/q' })).toThrow(`${name} is set and`);
});
