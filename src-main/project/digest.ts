import { createHash } from 'node:crypto';

/** SHA-256 of bytes, or of the UTF-8 form of text, as 64 lower-case hexadecimal digits. */
export function digest(data: string | Uint8Array): string {
  return createHash('sha256').update(data).digest('hex');
}
