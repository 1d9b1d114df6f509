import { randomUUID } from 'node:crypto';
import { existsSync, readFileSync } from 'node:fs';
import { createServer, type IncomingMessage } from 'node:http';
import type { AddressInfo } from 'node:net';
import { join } from 'node:path';
import { inflateRawSync } from 'node:zlib';
import { Constants, IdentityProvider, SamlLib, ServiceProvider, setSchemaValidator } from 'samlify';
import { escapeHtml, page } from './html-page.js';
import { writePrivately } from './secrets.js';
import { selfSignedCertificate } from './self-signed-certificate.js';

export interface RunningIdentityProvider {
  /** Its start page; metadata at `/metadata`, sign-in at `/sign-in`. */
  readonly url: string;
  stop(): Promise<void>;
}

interface Person {
  readonly displayName: string;
  readonly email: string;
}

/** Invented. */
const PEOPLE: readonly Person[] = [
  { displayName: 'Wanda Ostrander', email: 'wanda.ostrander@example.com' },
  { displayName: 'Iker Belaústegui', email: 'iker.belaustegui@example.com' },
  { displayName: 'Łucja Marzec', email: 'lucja.marzec@example.com' },
];

const EMAIL_FORMAT = Constants.namespace.format.emailAddress;
const POST_BINDING = Constants.namespace.binding.post;
const REDIRECT_BINDING = Constants.namespace.binding.redirect;
const HTML = 'text/html; charset=utf-8';

// Requests reach this fake from loopback only, and it grants nothing of value: XML schemas are not checked
setSchemaValidator({ validate: () => Promise.resolve('skipped') });

/** SAML 2.0 response with its one assertion; samlify fills the tags in braces and signs. */
const RESPONSE = `<samlp:Response xmlns:samlp="urn:oasis:names:tc:SAML:2.0:protocol" xmlns:saml="urn:oasis:names:tc:SAML:2.0:assertion" ID="{ID}" Version="2.0" IssueInstant="{IssueInstant}" Destination="{Destination}" InResponseTo="{InResponseTo}"><saml:Issuer>{Issuer}</saml:Issuer><samlp:Status><samlp:StatusCode Value="urn:oasis:names:tc:SAML:2.0:status:Success"/></samlp:Status><saml:Assertion ID="{AssertionID}" Version="2.0" IssueInstant="{IssueInstant}"><saml:Issuer>{Issuer}</saml:Issuer><saml:Subject><saml:NameID Format="{NameIDFormat}">{NameID}</saml:NameID><saml:SubjectConfirmation Method="urn:oasis:names:tc:SAML:2.0:cm:bearer"><saml:SubjectConfirmationData NotOnOrAfter="{NotOnOrAfter}" Recipient="{Destination}" InResponseTo="{InResponseTo}"/></saml:SubjectConfirmation></saml:Subject><saml:Conditions NotBefore="{IssueInstant}" NotOnOrAfter="{NotOnOrAfter}"><saml:AudienceRestriction><saml:Audience>{Audience}</saml:Audience></saml:AudienceRestriction></saml:Conditions><saml:AuthnStatement AuthnInstant="{IssueInstant}" SessionIndex="{AssertionID}"><saml:AuthnContext><saml:AuthnContextClassRef>urn:oasis:names:tc:SAML:2.0:ac:classes:PasswordProtectedTransport</saml:AuthnContextClassRef></saml:AuthnContext></saml:AuthnStatement></saml:Assertion></samlp:Response>`;

/**
 * A SAML identity provider whose people sign in by clicking on their name, for the demo and for tests. Answers every service
 * provider on loopback; response and assertion are signed. Its key is kept in the data folder, so that its metadata stay the same.
 */
export async function startIdentityProvider(options: {
  dataFolder: string;
  port?: number;
}): Promise<RunningIdentityProvider> {
  const { privateKey, certificate } = keyOf(options.dataFolder);
  const http = createServer((request, response) => {
    answer(request).then(
      (body) => response.writeHead(200, { 'content-type': body.type }).end(body.content),
      (error: Error) => {
        const body = page('Sign-in is not possible', `<p>${escapeHtml(error.message)}</p>`);
        response.writeHead(400, { 'content-type': HTML }).end(body);
      },
    );
  });
  await new Promise<void>((resolve, reject) => {
    http.once('error', reject);
    http.listen(options.port ?? 0, '127.0.0.1', resolve);
  });
  const url = `http://127.0.0.1:${(http.address() as AddressInfo).port}`;
  const provider = IdentityProvider({
    metadata: metadataOf(url, certificate),
    privateKey,
    isAssertionEncrypted: false,
    requestSignatureAlgorithm: Constants.algorithms.signature.RSA_SHA256,
    loginResponseTemplate: { context: RESPONSE, attributes: [] },
  });

  async function answer(request: IncomingMessage): Promise<{ type: string; content: string }> {
    const address = new URL(request.url ?? '/', url);
    if (address.pathname === '/metadata')
      return { type: 'application/samlmetadata+xml', content: provider.getMetadata() };
    if (address.pathname !== '/sign-in') {
      return { type: HTML, content: page('Identity provider', '<p><a href="/metadata">Metadata</a></p>') };
    }
    const form = request.method === 'POST' ? await formOf(request) : new URLSearchParams();
    const field = (name: string) => form.get(name) ?? address.searchParams.get(name);
    const wanted = field('SAMLRequest');
    if (!wanted) throw new Error('The address lacks a SAMLRequest; start at the product’s own sign-in page.');
    const binding = address.searchParams.has('SAMLRequest') ? 'redirect' : 'post';
    const email = form.get('email');
    return {
      type: HTML,
      content: email
        ? await signedIn(wanted, form.get('binding') ?? binding, field('RelayState'), email)
        : choosePerson(wanted, binding, field('RelayState')),
    };
  }

  async function signedIn(samlRequest: string, binding: string, relayState: string | null, email: string) {
    const requester = serviceProviderOf(samlRequest, binding);
    const { extract } = await provider.parseLoginRequest(requester.provider, binding, {
      [binding === 'redirect' ? 'query' : 'body']: { SAMLRequest: samlRequest },
    });
    const request = extract.request as { id: string };
    const id = `_${randomUUID()}`;
    const { context } = await provider.createLoginResponse(
      requester.provider,
      { extract: { request } },
      'post',
      { email },
      (template: string) => ({
        id,
        context: SamlLib.replaceTagsByValue(template, {
          ID: id,
          AssertionID: `_${randomUUID()}`,
          IssueInstant: new Date().toISOString(),
          NotOnOrAfter: new Date(Date.now() + 5 * 60_000).toISOString(),
          Destination: requester.address,
          InResponseTo: request.id,
          Issuer: provider.entityMeta.getEntityID(),
          Audience: requester.entityId,
          NameIDFormat: EMAIL_FORMAT,
          NameID: email,
        }),
      }),
    );
    return autoPost(requester.address, { SAMLResponse: context, ...(relayState ? { RelayState: relayState } : {}) });
  }

  return {
    url,
    async stop() {
      http.closeAllConnections();
      await new Promise<void>((resolve) => http.close(() => resolve()));
    },
  };
}

function metadataOf(url: string, certificate: string): string {
  const base64 = certificate.replaceAll(/-----[A-Z ]+-----|\s/g, '');
  const signIn = [REDIRECT_BINDING, POST_BINDING].map(
    (binding) => `<SingleSignOnService Binding="${binding}" Location="${url}/sign-in"/>`,
  );
  return `<EntityDescriptor xmlns="urn:oasis:names:tc:SAML:2.0:metadata" entityID="${url}/metadata"><IDPSSODescriptor WantAuthnRequestsSigned="false" protocolSupportEnumeration="urn:oasis:names:tc:SAML:2.0:protocol"><KeyDescriptor use="signing"><KeyInfo xmlns="http://www.w3.org/2000/09/xmldsig#"><X509Data><X509Certificate>${base64}</X509Certificate></X509Data></KeyInfo></KeyDescriptor><NameIDFormat>${EMAIL_FORMAT}</NameIDFormat>${signIn.join('')}</IDPSSODescriptor></EntityDescriptor>`;
}

/** Who asks, as the request itself says: this fake knows nobody beforehand, and answers to loopback only. */
function serviceProviderOf(samlRequest: string, binding: string) {
  const packed = Buffer.from(samlRequest, 'base64');
  const xml = binding === 'redirect' ? inflateRawSync(packed).toString('utf8') : packed.toString('utf8');
  const address = /AssertionConsumerServiceURL="([^"]+)"/.exec(xml)?.[1] ?? '';
  const entityId = /<(?:\w+:)?Issuer[^>]*>([^<]+)</.exec(xml)?.[1] ?? '';
  if (!URL.canParse(address) || !['127.0.0.1', 'localhost'].includes(new URL(address).hostname)) {
    throw new Error(`This identity provider answers programs on this machine only, not “${address}”.`);
  }
  const provider = ServiceProvider({
    entityID: entityId,
    authnRequestsSigned: false,
    wantAssertionsSigned: true,
    wantMessageSigned: true,
    assertionConsumerService: [{ Binding: POST_BINDING, Location: address }],
  });
  return { provider, address, entityId };
}

function choosePerson(samlRequest: string, binding: string, relayState: string | null): string {
  const hidden = Object.entries({ SAMLRequest: samlRequest, binding, RelayState: relayState ?? '' })
    .map(([name, value]) => `<input type="hidden" name="${name}" value="${escapeHtml(value)}">`)
    .join('');
  const buttons = PEOPLE.map(
    (person) =>
      `<p><button name="email" value="${escapeHtml(person.email)}">${escapeHtml(person.displayName)}</button></p>`,
  );
  return page('Sign in as', `<form method="post" action="/sign-in">${hidden}${buttons.join('')}</form>`);
}

function autoPost(address: string, fields: Readonly<Record<string, string>>): string {
  const inputs = Object.entries(fields).map(
    ([name, value]) => `<input type="hidden" name="${name}" value="${escapeHtml(value)}">`,
  );
  return page(
    'Signing in',
    `<form method="post" action="${escapeHtml(address)}">${inputs.join('')}<button>Continue</button></form><script>document.forms[0].submit()</script>`,
  );
}

async function formOf(request: IncomingMessage): Promise<URLSearchParams> {
  const chunks: Buffer[] = [];
  for await (const chunk of request) chunks.push(chunk as Buffer);
  return new URLSearchParams(Buffer.concat(chunks).toString('utf8'));
}

function keyOf(dataFolder: string): { privateKey: string; certificate: string } {
  const file = join(dataFolder, 'identity-provider.json');
  if (!existsSync(file)) writePrivately(file, selfSignedCertificate('Fake identity provider'));
  return JSON.parse(readFileSync(file, 'utf8')) as { privateKey: string; certificate: string };
}
