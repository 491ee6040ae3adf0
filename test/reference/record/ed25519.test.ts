import { createPrivateKey, sign } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { verifyEd25519 } from '../../../src-main/project/verify-ed25519.ts';
import { digest } from '../../../src-main/project/digest.ts';
import { vectors } from './rfc8032.json' with { type: 'json' };

/** Wraps a raw secret key as PKCS #8 (RFC 8410, section 7), as the identity store keeps it. */
function privateKeyFrom(secretKey: string) {
  const der = Buffer.concat([Buffer.from('302e020100300506032b657004220420', 'hex'), Buffer.from(secretKey, 'hex')]);
  return createPrivateKey({ key: der, format: 'der', type: 'pkcs8' });
}

describe('verifyEd25519 against RFC 8032', () => {
  it.each(vectors)('$test: the signature is made and accepted', ({ secretKey, publicKey, message, signature }) => {
    const bytes = Buffer.from(message, 'hex');
    expect(sign(null, bytes, privateKeyFrom(secretKey)).toString('hex')).toBe(signature);
    expect(verifyEd25519(publicKey, bytes, signature)).toBe(true);
  });

  it.each(vectors)(
    '$test: a flipped bit in message, signature or key is refused',
    ({ publicKey, message, signature }) => {
      const flipped = (hex: string, at: number) => {
        const bytes = Buffer.from(hex, 'hex');
        bytes[at] = bytes.readUInt8(at) ^ 1;
        return bytes.toString('hex');
      };
      const bytes = Buffer.from(message, 'hex');
      expect(verifyEd25519(publicKey, Buffer.concat([bytes, Buffer.from([0])]), signature)).toBe(false);
      if (bytes.length > 0)
        expect(verifyEd25519(publicKey, Buffer.from(flipped(message, 0), 'hex'), signature)).toBe(false);
      for (const at of [0, 31, 32, 63]) expect(verifyEd25519(publicKey, bytes, flipped(signature, at))).toBe(false);
      for (const at of [0, 31]) expect(verifyEd25519(flipped(publicKey, at), bytes, signature)).toBe(false);
    },
  );

  it('refuses keys and signatures of another length or form', () => {
    const [{ publicKey, signature } = { publicKey: '', signature: '' }] = vectors;
    for (const key of ['', publicKey.slice(2), `${publicKey}00`, publicKey.toUpperCase(), 'zz'.repeat(32)]) {
      expect(verifyEd25519(key, new Uint8Array(), signature)).toBe(false);
    }
    for (const wrong of ['', signature.slice(2), `${signature}00`]) {
      expect(verifyEd25519(publicKey, new Uint8Array(), wrong)).toBe(false);
    }
  });
});

describe('digest against FIPS 180-4', () => {
  // The one-block and the empty message of NIST's example values for SHA-256.
  it.each([
    ['abc', 'ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad'],
    ['', 'e3b0c44298fc1c149afbf4c8996fb92427ae41e4649b934ca495991b7852b855'],
  ])('of "%s"', (text, expected) => {
    expect(digest(text)).toBe(expected);
    expect(digest(Buffer.from(text))).toBe(expected);
  });
});
