import { createHash, randomBytes } from 'node:crypto';

/** A secret for a link, and what is stored of it. */
export function newSecretToken(): { token: string; sha256: Buffer } {
  const token = randomBytes(32).toString('base64url');
  return { token, sha256: sha256Of(token) };
}

export function sha256Of(token: string): Buffer {
  return createHash('sha256').update(token).digest();
}
