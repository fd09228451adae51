import type { Browser } from 'playwright-core';
import { afterAll, beforeAll } from 'vitest';
import { buildApp, type TestApp } from './app.ts';
import { listen, openBrowser, type Listening } from './browser.ts';

/** What the browser tests of a file play on; there from the first test on. */
export interface Stage {
  readonly house: TestApp;
  readonly browser: Browser;
  /** Where the house answers. */
  readonly url: string;
}

/**
 * The house on a database of its own and a browser, brought up before the tests of a file and taken down after them.
 * @param furnish puts into the house what the tests need, before anybody comes
 */
export function setStage(furnish: (house: TestApp) => Promise<void> = () => Promise.resolve()): Stage {
  let house: TestApp;
  let server: Listening;
  let browser: Browser;
  beforeAll(async () => {
    house = await buildApp();
    await furnish(house);
    server = await listen(house.app);
    browser = await openBrowser();
  });
  afterAll(async () => {
    await browser.close();
    await server.close();
    await house.close();
  });
  return {
    get house() {
      return house;
    },
    get browser() {
      return browser;
    },
    get url() {
      return server.url;
    },
  };
}
