import { createHash, randomBytes } from 'node:crypto';

/** A new single-use token: 32 random bytes for the mail, and their SHA-256 for the table. */
export function newMailedToken(): { token: string; hash: Buffer } {
  const token = randomBytes(32).toString('base64url');
  return { token, hash: hashOfToken(token) };
}

export function hashOfToken(token: string): Buffer {
  return createHash('sha256').update(token).digest();
}
