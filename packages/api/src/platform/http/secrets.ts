import { createHash, randomBytes } from 'node:crypto';

/** A secret for a link in a letter: 256 random bits as URL-safe text. Only its hash is kept. */
export function newToken(): { token: string; tokenHash: string } {
  const token = randomBytes(32).toString('base64url');
  return { token, tokenHash: hashToken(token) };
}

export function hashToken(token: string): string {
  return createHash('sha256').update(token).digest('hex');
}
