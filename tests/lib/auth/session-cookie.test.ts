import { beforeAll, describe, expect, it } from 'vitest';
import { noSessionCookie, sessionCookieName, sessionIdOf } from '@/lib/auth/session';

beforeAll(() => {
  process.env.APP_URL = 'https://curves.example.org';
});

describe('over https the session cookie', () => {
  it('goes over https alone and belongs to this host alone', () => {
    expect(sessionCookieName()).toBe('__Host-curvekeep-session');
    expect(noSessionCookie().attributes).toEqual({
      path: '/',
      httpOnly: true,
      sameSite: 'lax',
      secure: true,
      maxAge: 0,
    });
  });

  it('is not read from a cookie of another name', () => {
    expect(sessionIdOf('curvekeep-session=abc')).toBeNull();
    expect(sessionIdOf('x__Host-curvekeep-session=abc')).toBeNull();
    expect(sessionIdOf('a=b;__Host-curvekeep-session=abc; c=d')).toBe('abc');
    expect(sessionIdOf(null)).toBeNull();
  });
});
