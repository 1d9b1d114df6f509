import { createPrivateKey, X509Certificate } from 'node:crypto';
import { expect, it } from 'vitest';
import { selfSignedCertificate } from './self-signed-certificate.js';

it('makes a certificate that verifies with its own key, today', () => {
  const { privateKey, certificate } = selfSignedCertificate('Fake identity provider');
  const read = new X509Certificate(certificate);
  expect(read.subject).toBe('CN=Fake identity provider');
  expect(read.issuer).toBe(read.subject);
  expect(read.verify(read.publicKey)).toBe(true);
  expect(read.checkPrivateKey(createPrivateKey(privateKey))).toBe(true);
  expect(new Date(read.validFrom).getTime()).toBeLessThanOrEqual(Date.now());
  expect(new Date(read.validTo).getTime()).toBeGreaterThan(Date.now());
});
