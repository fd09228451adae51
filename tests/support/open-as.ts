import type { Browser, Page } from 'playwright-core';
import { openPage, type DESK } from './browser.ts';
import { TEST_PASSWORD, type PersonRow } from './builders.ts';

/** A page of somebody who has signed in as everybody does. */
export async function openAs(
  browser: Browser,
  serverUrl: string,
  person: PersonRow,
  options: typeof DESK,
): Promise<{ page: Page; quiet: (meant?: RegExp) => void }> {
  const opened = await openPage(browser, options);
  const { page } = opened;
  await page.goto(`${serverUrl}/sign-in`);
  await page.getByLabel(/e-?mail/i).fill(person.email);
  await page.getByLabel('Password', { exact: true }).fill(TEST_PASSWORD);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL((url) => !url.pathname.startsWith('/sign-in'));
  return opened;
}
