import { createSign, generateKeyPairSync, randomBytes } from 'node:crypto';

/** DER, the byte form of ASN.1 (ITU-T X.690): a tag, a length, the content. */
function der(tag: number, ...contents: readonly Buffer[]): Buffer {
  const content = Buffer.concat(contents);
  const { length } = content;
  if (length < 128) return Buffer.concat([Buffer.from([tag, length]), content]);
  const bytes = Buffer.from(length.toString(16).padStart(length > 0xffff ? 6 : length > 0xff ? 4 : 2, '0'), 'hex');
  return Buffer.concat([Buffer.from([tag, 0x80 | bytes.length]), bytes, content]);
}

const sequence = (...contents: readonly Buffer[]) => der(0x30, ...contents);
// object identifiers, encoded: 1.2.840.113549.1.1.11 (RSA with SHA-256, its parameters null) and 2.5.4.3 (common name)
const RSA_WITH_SHA256 = sequence(Buffer.from('06092a864886f70d01010b', 'hex'), Buffer.from('0500', 'hex'));
const COMMON_NAME = Buffer.from('0603550403', 'hex');

function utcTime(moment: Date): Buffer {
  const digits = moment.toISOString().replaceAll(/[-:T]/g, '').slice(2, 14);
  return der(0x17, Buffer.from(`${digits}Z`, 'ascii'));
}

/** A key and a certificate that vouches only for itself, valid for ten years: for fakes on loopback, which nobody trusts by it. RFC 5280, version 1. */
export function selfSignedCertificate(commonName: string): { privateKey: string; certificate: string } {
  const { privateKey, publicKey } = generateKeyPairSync('rsa', { modulusLength: 2048 });
  const name = sequence(der(0x31, sequence(COMMON_NAME, der(0x0c, Buffer.from(commonName, 'utf8')))));
  const from = new Date();
  const until = new Date(from);
  until.setUTCFullYear(from.getUTCFullYear() + 10);
  // the first byte keeps the serial number positive and without a leading zero
  const serialNumber = der(0x02, Buffer.from([0x01]), randomBytes(8));
  const body = sequence(
    serialNumber,
    RSA_WITH_SHA256,
    name,
    sequence(utcTime(from), utcTime(until)),
    name,
    publicKey.export({ type: 'spki', format: 'der' }),
  );
  const signature = createSign('sha256').update(body).sign(privateKey);
  const certificate = sequence(body, RSA_WITH_SHA256, der(0x03, Buffer.from([0x00]), signature));
  const lines = certificate.toString('base64').match(/.{1,64}/g) ?? [];
  return {
    privateKey: privateKey.export({ type: 'pkcs8', format: 'pem' }).toString(),
    certificate: `-----BEGIN CERTIFICATE-----\n${lines.join('\n')}\n-----END CERTIFICATE-----\n`,
  };
}
