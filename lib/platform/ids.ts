import 'server-only';
import { createHash, randomBytes } from 'node:crypto';

const ALPHABET = '0123456789abcdefghijklmnopqrstuvwxyz';

/** A short random public id: ten of 36 characters, some 51 bits, without modulo bias. */
export function publicId(): string {
  let id = '';
  while (id.length < 10) {
    for (const byte of randomBytes(16)) {
      if (byte < 252 && id.length < 10) id += ALPHABET[byte % 36];
    }
  }
  return id;
}

/** A secret for a cookie or a mailed link: 32 random bytes; only its hash is ever stored. */
export function secretToken(): string {
  return randomBytes(32).toString('base64url');
}

export function sha256(content: string | Uint8Array): string {
  return createHash('sha256').update(content).digest('hex');
}
