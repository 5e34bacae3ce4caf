'use server';

import { cookies } from 'next/headers';
import { parseTheme, THEME_COOKIE } from '@/components/layout/theme';

const ONE_YEAR_SECONDS = 31_536_000;

/** Remembers the reader's choice of light, dark or the system's preference. The page follows in the same answer. */
export async function setTheme(form: FormData): Promise<void> {
  const theme = parseTheme(form.get('theme'));
  const jar = await cookies();
  if (theme === 'system') jar.delete(THEME_COOKIE);
  else jar.set(THEME_COOKIE, theme, { path: '/', sameSite: 'lax', httpOnly: true, maxAge: ONE_YEAR_SECONDS });
}
