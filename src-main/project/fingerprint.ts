import { digest } from './digest.ts';

/** A public key in a form that two people can compare by eye or over the telephone: 160 bits of its SHA-256, in fours. */
export function fingerprint(publicKey: string): string {
  const hex = digest(Buffer.from(publicKey, 'hex')).slice(0, 40);
  return hex.replace(/(.{4})(?=.)/g, '$1 ');
}
