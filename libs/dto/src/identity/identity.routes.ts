import { z } from 'zod';
import { defineRoute, PUBLIC, SIGNED_IN } from '../http/route.js';
import { hat } from './hat.dto.js';

export const language = z.enum(['en', 'es']);
export type Language = z.infer<typeof language>;

export const signInBody = z.object({ email: z.email().max(254), password: z.string().min(1).max(256) });

/** Who is signed in, the hat worn and the hats to choose from; `csrfToken` goes into the x-csrf-token header of every write. */
export const sessionView = z.object({
  person: z.object({ id: z.uuid(), displayName: z.string(), email: z.string(), language }),
  hat,
  hats: z.array(hat),
  csrfToken: z.string(),
});
export type SessionView = z.infer<typeof sessionView>;

export const demoAccounts = z.object({
  items: z.array(
    z.object({ hat, displayName: z.string(), email: z.string(), password: z.string(), organisation: z.string() }),
  ),
});

export const identityRoutes = {
  signIn: defineRoute({
    id: 'identity.sign-in',
    method: 'POST',
    path: '/auth/sign-in',
    access: PUBLIC,
    summary: 'Sign in with e-mail address and password',
    body: signInBody,
    response: sessionView,
  }),
  signOut: defineRoute({
    id: 'identity.sign-out',
    method: 'POST',
    path: '/auth/sign-out',
    access: SIGNED_IN,
    summary: 'End this sign-in',
    status: 204,
  }),
  session: defineRoute({
    id: 'identity.session',
    method: 'GET',
    path: '/auth/session',
    access: SIGNED_IN,
    summary: 'Who is signed in and in which role',
    response: sessionView,
  }),
  chooseHat: defineRoute({
    id: 'identity.choose-hat',
    method: 'POST',
    path: '/auth/hat',
    access: SIGNED_IN,
    summary: 'Act in another of one’s roles',
    body: z.object({ hat }),
    response: sessionView,
  }),
  chooseLanguage: defineRoute({
    id: 'identity.choose-language',
    method: 'POST',
    path: '/auth/language',
    access: SIGNED_IN,
    summary: 'Choose the language of the screens',
    body: z.object({ language }),
    response: sessionView,
  }),
  demoAccounts: defineRoute({
    id: 'identity.demo-accounts',
    method: 'GET',
    path: '/auth/demo-accounts',
    access: PUBLIC,
    summary: 'One sign-in per role; empty unless this is a demo',
    response: demoAccounts,
  }),
};
