/** How whatever lets somebody in is kept: as its SHA-256, which is enough for 128 random bits or more. */
import { createHash, randomBytes } from 'node:crypto';

/** SHA-256 of a token, hex. */
export function hashToken(token: string): string {
  return createHash('sha256').update(token).digest('hex');
}

/** A new identifier that nobody can guess: 128 random bits, base64url. */
export function newId(): string {
  return randomBytes(16).toString('base64url');
}
