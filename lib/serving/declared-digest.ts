/** The SHA-256 that a caller declares for its body in `Content-Digest` or `Repr-Digest` (RFC 9530). */
import { failed, type Outcome } from '@/lib/errors';

const MEMBER = /(?:^|,)\s*sha-256\s*=\s*([^,]*)/i;

/**
 * The declared SHA-256 as hex; null where none is declared. Other algorithms are passed over.
 *
 * @returns a failure where one is declared that is not `sha-256=:<base64 of 32 bytes>:`, or two differ
 */
export function declaredSha256(headers: Headers): Outcome<{ sha256: string | null }> {
  const found: string[] = [];
  for (const name of ['content-digest', 'repr-digest']) {
    const member = MEMBER.exec(headers.get(name) ?? '')?.[1];
    if (member === undefined) continue;
    const base64 = /^:([A-Za-z0-9+/]{43}=):\s*(;.*)?$/.exec(member.trim())?.[1];
    if (base64 === undefined)
      return failed('bad-header', `${name} must read sha-256=:<base64 of the 32 bytes>:`);
    found.push(Buffer.from(base64, 'base64').toString('hex'));
  }
  const [first = null, second = first] = found;
  if (first !== second)
    return failed('bad-header', 'Content-Digest and Repr-Digest must name the same SHA-256.');
  return { ok: true, sha256: first };
}

/** The header member for a SHA-256 given as hex. */
export function digestMember(sha256: string): string {
  return `sha-256=:${Buffer.from(sha256, 'hex').toString('base64')}:`;
}
