import { createHash, randomBytes } from 'node:crypto';

/** A secret of 32 random bytes for a link or a cookie, and what is stored of it. */
export function newToken(): { readonly token: string; readonly tokenHash: string } {
  const token = randomBytes(32).toString('base64url');
  return { token, tokenHash: hashToken(token) };
}

/** Such secrets are beyond guessing, so that a fast hash serves. */
export const hashToken = (token: string): string => createHash('sha256').update(token).digest('hex');
