import { createPublicKey, verify } from 'node:crypto';

/**
 * Whether an Ed25519 signature was made over these bytes with the private half of this key.
 *
 * @param publicKey  raw, 64 hexadecimal digits
 * @param signature  128 hexadecimal digits
 * Source  RFC 8032 (2017), §5.1.7
 * Checked test/reference/ed25519.test.ts against the RFC's §7.1 vectors
 */
export function verifyEd25519(publicKey: string, bytes: Uint8Array, signature: string): boolean {
  if (!/^[0-9a-f]{64}$/.test(publicKey) || !/^[0-9a-f]{128}$/.test(signature)) return false;
  try {
    return verify(null, bytes, publicKeyObject(publicKey), Buffer.from(signature, 'hex'));
  } catch {
    return false;
  }
}

function publicKeyObject(publicKey: string) {
  const x = Buffer.from(publicKey, 'hex').toString('base64url');
  return createPublicKey({ key: { kty: 'OKP', crv: 'Ed25519', x }, format: 'jwk' });
}
