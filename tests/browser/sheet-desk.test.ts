import type { Page } from 'playwright-core';
import { expect, test } from 'vitest';
import { axeFindings, DESK, PHONE } from '../support/browser.ts';
import { buildMouse, type MousePattern } from '../support/mouse-pattern.ts';
import { openAs } from '../support/open-as.ts';
import { setStage } from '../support/stage.ts';

let mouse: MousePattern;
const stage = setStage(async (house) => {
  mouse = await buildMouse(house.db);
});

const at = (rest: string) => `${stage.url}/patterns/${mouse.patternId}/${rest}`;
/** Whatever makes the page wider than the screen. */
const runningOut = (page: Page) =>
  page.evaluate(() =>
    document.documentElement.scrollWidth <= innerWidth
      ? []
      : [...document.querySelectorAll('*')]
          .filter((one) => one.getBoundingClientRect().right > innerWidth + 0.5)
          .map((one) => one.outerHTML.slice(0, 120)),
  );
const pages = (page: Page) => page.getByRole('img', { name: /^Page \d+ of/ });

test('the creator writes what a sheet says, sees the real page follow, and publishes it', async () => {
  const { page, quiet } = await openAs(stage.browser, stage.url, mouse.house.creator, DESK);
  await page.goto(at('sheet'));
  await pages(page).first().waitFor();

  const drawn = page.waitForResponse((answer) => answer.url().includes('sheet.pdf') && answer.ok());
  await page.getByLabel('Gauge', { exact: true }).fill('10 sc and 9 rounds, 4.4 cm');
  await drawn;
  await page.getByRole('button', { name: 'Add hook' }).click();
  await page.getByLabel('mm', { exact: true }).fill('2.5');
  await page.getByRole('button', { name: 'Add note' }).click();
  await page.getByLabel('Note 1', { exact: true }).fill('Right side out.');
  await expect.poll(() => page.getByRole('status').first().innerText()).toMatch(/^Saved/);
  await expect
    .poll(async () => {
      const row = await stage.house
        .db('patterns')
        .where({ id: mouse.patternId })
        .first<{ details: { gauge?: string } }>('details');
      return row.details.gauge;
    })
    .toBe('10 sc and 9 rounds, 4.4 cm');
  expect(await axeFindings(page)).toEqual([]);

  const publish = page.getByRole('button', { name: 'Publish edition 1' });
  await expect.poll(() => publish.getAttribute('aria-disabled')).toBeNull();
  await publish.click();
  await expect.poll(() => page.getByRole('heading', { name: 'Publish edition 2' }).isVisible()).toBe(true);
  expect(await stage.house.db('editions').where({ pattern_id: mouse.patternId }).select('number')).toEqual([
    { number: 1 },
  ]);

  await stage.house.workAll();
  await page.getByRole('link', { name: 'Editions' }).click();
  await page.getByRole('link', { name: /\/w\/.*\/1$/ }).waitFor();
  expect(await page.getByRole('link', { name: 'PDF in US terms' }).count()).toBe(2);
  expect(await axeFindings(page)).toEqual([]);
  quiet();
  await page.context().close();
});

test('a line that holds it back is named, with the way to it, and the button says why it waits', async () => {
  await stage.house.db('lines').where({ id: mouse.lines[1] }).update({ text: 'inc × 6 (13)' });
  const { page, quiet } = await openAs(stage.browser, stage.url, mouse.house.owner, DESK);
  await page.goto(at('sheet'));
  await expect.poll(() => page.getByText('Body, R2 differs: its totals are not equal.').isVisible()).toBe(true);
  const publish = page.getByRole('button', { name: /^Publish edition/ });
  expect(await publish.getAttribute('aria-disabled')).toBe('true');
  expect(await page.getByRole('link', { name: 'To the line' }).first().getAttribute('href')).toContain(mouse.lines[1]);
  quiet();
  await page.context().close();
});

test('on a phone the sheet, its forms and the editions fit and can be used', async () => {
  const { page, quiet } = await openAs(stage.browser, stage.url, mouse.house.editor, PHONE);
  for (const tab of ['sheet', 'editions']) {
    await page.goto(at(tab));
    await page.locator('main').waitFor();
    expect(await runningOut(page)).toEqual([]);
    expect(await axeFindings(page)).toEqual([]);
  }
  quiet();
  await page.context().close();
});
