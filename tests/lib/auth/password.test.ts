import { describe, expect, it } from 'vitest';
import { hashPassword, isPassword } from '@/lib/auth/password';

describe('passwords', () => {
  it('are kept as argon2id at the stated costs, each with its own salt', async () => {
    const [one, two] = await Promise.all([hashPassword('curve of ten'), hashPassword('curve of ten')]);
    expect(one).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
    expect(one).not.toBe(two);
    expect(await isPassword('curve of ten', one)).toBe(true);
    expect(await isPassword('curve of ten', two)).toBe(true);
  });

  it('count every character, spaces at the ends too', async () => {
    const kept = await hashPassword(' curve of ten ');
    expect(await isPassword('curve of ten', kept)).toBe(false);
    expect(await isPassword(' curve of ten ', kept)).toBe(true);
    expect(await isPassword('', kept)).toBe(false);
  });

  it('are one in both spellings of an accent', async () => {
    expect(await isPassword('re\u0301sume\u0301 2026', await hashPassword('r\u00e9sum\u00e9 2026'))).toBe(
      true,
    );
  });

  it('take as long to refuse where there is no account', async () => {
    const kept = await hashPassword('curve of ten');
    const timed = async (hash: string | undefined) => {
      const times: number[] = [];
      for (let i = 0; i < 9; i++) {
        const started = performance.now();
        expect(await isPassword('another one', hash)).toBe(false);
        times.push(performance.now() - started);
      }
      return times.sort((a, b) => a - b)[4] ?? 0;
    };
    const [known, unknown] = [await timed(kept), await timed(undefined)];
    // Medians of nine; without the work on nobody's hash the ratio would be thousands.
    expect(Math.max(known, unknown) / Math.min(known, unknown)).toBeLessThan(3);
  });
});
