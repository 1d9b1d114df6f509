import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Constants, IdentityProvider, ServiceProvider } from 'samlify';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { type RunningIdentityProvider, startIdentityProvider } from './identity-provider.js';

const dataFolder = mkdtempSync(join(tmpdir(), 'qp-idp-'));
let running: RunningIdentityProvider;
beforeAll(async () => {
  running = await startIdentityProvider({ dataFolder });
});
afterAll(async () => {
  await running.stop();
  rmSync(dataFolder, { recursive: true });
});

const serviceProvider = (address: string) =>
  ServiceProvider({
    entityID: 'https://product.example/saml',
    wantAssertionsSigned: true,
    wantMessageSigned: true,
    assertionConsumerService: [{ Binding: Constants.namespace.binding.post, Location: address }],
  });
const metadata = async () => IdentityProvider({ metadata: await (await fetch(`${running.url}/metadata`)).text() });

/** What a browser does: follows the redirect, clicks on a name. */
async function signIn(address: string, email: string) {
  const provider = await metadata();
  const { id, context } = serviceProvider(address).createLoginRequest(provider, 'redirect');
  const choice = await (await fetch(context)).text();
  const field = (name: string) => new RegExp(`name="${name}" value="([^"]*)"`).exec(choice)?.[1] ?? '';
  const plain = (text: string) => text.replace(/&#(\d+);/g, (_, code: string) => String.fromCharCode(Number(code)));
  const form = new URLSearchParams({ SAMLRequest: plain(field('SAMLRequest')), binding: field('binding'), email });
  const response = await fetch(`${running.url}/sign-in`, { method: 'POST', body: form });
  return { id, provider, choice, response, page: await response.text() };
}

it('answers a request with a response that its metadata verify, for the person chosen', async () => {
  const address = 'http://127.0.0.1:4600/api/v1/auth/saml/consume';
  const { id, provider, choice, page } = await signIn(address, 'wanda.ostrander@example.com');
  expect(choice).toContain('Wanda Ostrander');
  const answer = /name="SAMLResponse" value="([^"]+)"/.exec(page)?.[1] ?? '';
  const { extract } = await serviceProvider(address).parseLoginResponse(provider, 'post', {
    body: { SAMLResponse: answer.replaceAll('&#61;', '=') },
  });
  expect(extract.nameID).toBe('wanda.ostrander@example.com');
  expect(extract.response?.inResponseTo).toBe(id);
});

it('sends nothing to an address outside this machine', async () => {
  const { response, page } = await signIn('https://product.example/consume', 'wanda.ostrander@example.com');
  expect(response.status).toBe(400);
  expect(page).not.toContain('SAMLResponse');
});
