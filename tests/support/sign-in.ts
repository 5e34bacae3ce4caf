/** Signs in on the sign-in page with an account of the demonstration. */
import type { Page } from 'playwright-core';
import { DEMO_PASSWORD } from '@/lib/people/demo-accounts';
import type { Visit } from './browse-app';

export type DemoName = 'depositor' | 'manager' | 'curator' | 'admin';

/** A page in a browser of its own, signed in. */
export async function signedIn({ newPage, url }: Visit, name: DemoName): Promise<Page> {
  const page = await newPage({});
  await page.goto(url('/sign-in?next=/methods'));
  const main = page.getByRole('main');
  await main.getByLabel('E-mail address').fill(`${name}@demo.example`);
  await main.getByLabel('Password').fill(DEMO_PASSWORD);
  await main.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL(url('/methods'));
  return page;
}
