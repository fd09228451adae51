import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import AxeBuilder from '@axe-core/playwright';
import type { Express } from 'express';
import { chromium, type Browser, type BrowserContextOptions, type Page } from 'playwright-core';
import { expect } from 'vitest';

const ARGS = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
  '--autoplay-policy=no-user-gesture-required',
];

/** Debian's Chromium without a window. */
export const openBrowser = (): Promise<Browser> =>
  chromium.launch({ executablePath: '/usr/bin/chromium', headless: true, args: ARGS });

export const PHONE: BrowserContextOptions = { viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true };
export const DESK: BrowserContextOptions = { viewport: { width: 1440, height: 900 } };

export interface Listening {
  readonly url: string;
  close(): Promise<void>;
}

/** Serves an app on a port that is free. */
export async function listen(app: Express): Promise<Listening> {
  const server: Server = createServer((req, res) => void app(req, res));
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  return {
    url: `http://127.0.0.1:${(server.address() as AddressInfo).port}`,
    close: () =>
      new Promise((resolve) => {
        server.closeAllConnections();
        server.close(() => resolve());
      }),
  };
}

/** Opens a page whose every complaint is kept; `quiet` fails when there was one besides those that a test brings about. */
export async function openPage(
  browser: Browser,
  options: BrowserContextOptions,
): Promise<{ page: Page; quiet: (meant?: RegExp) => void }> {
  const context = await browser.newContext(options);
  const page = await context.newPage();
  const complaints: string[] = [];
  page.on('console', (message) => {
    if (message.type() === 'error') complaints.push(message.text());
  });
  page.on('pageerror', (error) => complaints.push(error.message));
  return { page, quiet: (meant) => expect(complaints.filter((each) => !meant?.test(each))).toEqual([]) };
}

/** Whatever axe finds that would keep somebody out, told by rule and place. */
export async function axeFindings(page: Page): Promise<readonly string[]> {
  const { violations } = await new AxeBuilder({ page }).analyze();
  return violations.flatMap(({ id, nodes }) => nodes.map(({ target }) => `${id}: ${target.join(' ')}`));
}
