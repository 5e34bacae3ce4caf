import { describe, expect, it } from 'vitest';
import { declaredSha256, digestMember } from '@/lib/serving/declared-digest';

/** SHA-256 of the JSON text in RFC 9530, appendix B.1: `{"hello": "world"}` and a line feed. */
const MEMBER = 'sha-256=:RK/0qy18MlBSVnWgjwz6lZEWjP/lF5HF9bvEF8FabDg=:';
const HEX = '44aff4ab2d7c3250525675a08f0cfa9591168cffe51791c5f5bbc417c15a6c38';

const declared = (headers: Record<string, string>) => declaredSha256(new Headers(headers));

describe('a declared digest', () => {
  it('is read from either header, among others', () => {
    for (const name of ['Content-Digest', 'Repr-Digest']) {
      expect(declared({ [name]: MEMBER })).toEqual({ ok: true, sha256: HEX });
      expect(declared({ [name]: `sha-512=:AAAA:, ${MEMBER}` })).toEqual({ ok: true, sha256: HEX });
    }
    expect(digestMember(HEX)).toBe(MEMBER);
  });

  it('need not be there', () => {
    expect(declared({})).toEqual({ ok: true, sha256: null });
    expect(declared({ 'Content-Digest': 'sha-512=:AAAA:' })).toEqual({ ok: true, sha256: null });
  });

  it.each(['sha-256=abc', 'sha-256=:abc:', `sha-256="${HEX}"`, 'sha-256=::'])('%j is refused', (value) => {
    expect(declared({ 'Content-Digest': value })).toMatchObject({
      ok: false,
      failure: { code: 'bad-header' },
    });
  });

  it('that is two different ones is refused', () => {
    const other = digestMember('00'.repeat(32));
    expect(declared({ 'Content-Digest': MEMBER, 'Repr-Digest': other })).toMatchObject({ ok: false });
    expect(declared({ 'Content-Digest': MEMBER, 'Repr-Digest': MEMBER })).toEqual({ ok: true, sha256: HEX });
  });
});
