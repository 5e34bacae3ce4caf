import type { Metadata, Viewport } from 'next';
import { cookies } from 'next/headers';
import type { ReactNode } from 'react';
import { SiteFooter } from '@/components/layout/site-footer';
import { SiteHeader } from '@/components/layout/site-header';
import { SkipLink } from '@/components/layout/skip-link';
import { parseTheme, THEME_COOKIE } from '@/components/layout/theme';
import { type Actor, VISITOR } from '@/lib/auth/actor';
import { actorOfPage } from '@/lib/auth/current-actor';
import { log } from '@/lib/log';
import { fontClasses } from './fonts';
import './globals.css';
import { Providers } from './providers';
import { setTheme } from './set-theme';
import { signOutAction } from './sign-in/sign-out-action';

export const metadata: Metadata = {
  title: { default: 'Curvekeep: one master curve for allosteric data', template: '%s · Curvekeep' },
  description:
    'Checks activity data of allosteric proteins against the two-state master curve, from the parameters that the laboratory itself states.',
};

export const viewport: Viewport = {
  themeColor: [
    { media: '(prefers-color-scheme: light)', color: '#fafbfa' },
    { media: '(prefers-color-scheme: dark)', color: '#0f171d' },
  ],
};

/** Reading the cookie makes every page dynamic, which the nonce of the content policy needs. */
export default async function RootLayout({ children }: { children: ReactNode }) {
  const theme = parseTheme((await cookies()).get(THEME_COOKIE)?.value);
  const actor = await actorOfHeader();
  return (
    // The attribute tells the router to jump to the top of another page: gliding there, it would stop half-way.
    <html
      lang="en-GB"
      className={fontClasses}
      data-theme={theme === 'system' ? undefined : theme}
      data-scroll-behavior="smooth"
    >
      <body className="flex flex-col">
        <SkipLink />
        <SiteHeader actor={actor} signOut={signOutAction} />
        <Providers>
          <main id="main" tabIndex={-1} className="flex grow flex-col outline-none">
            {children}
          </main>
        </Providers>
        <SiteFooter theme={theme} setTheme={setTheme} />
      </body>
    </html>
  );
}

/** Without its database a page still has its header, a visitor's; the page itself says what is wrong. */
async function actorOfHeader(): Promise<Actor> {
  try {
    return await actorOfPage();
  } catch (error) {
    log().error({ err: error }, 'who is asking could not be found out');
    return VISITOR;
  }
}
