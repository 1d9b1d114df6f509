import { defineEntity, type InferEntity, p } from '@mikro-orm/core';

/** Somebody who can sign in. Password hashes lie in a table of their own, out of the application's reach except through `app.credentials_of`. */
export const PersonEntity = defineEntity({
  name: 'Person',
  tableName: 'person',
  properties: {
    id: p.uuid().primary(),
    email: p.string(),
    displayName: p.string(),
    language: p.string().$type<'en' | 'es'>(),
    disabledAt: p.datetime().nullable(),
    createdAt: p.datetime(),
  },
});
export type Person = InferEntity<typeof PersonEntity>;
