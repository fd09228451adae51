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

const bench = () => `${stage.url}/patterns/${mouse.patternId}/bench`;
const materials = () =>
  stage.house.db('materials').where({ pattern_id: mouse.patternId }).whereNull('deleted_at').pluck('name');
const left = () =>
  stage.house.db('left_checks').where({ pattern_id: mouse.patternId }).whereNull('deleted_at').pluck('reason');

/** Walks on with the Tab key until something that is called so has the focus. */
async function tabTo(page: Page, name: string): Promise<void> {
  for (let presses = 0; presses < 60; presses += 1) {
    await page.keyboard.press('Tab');
    const here = await page.evaluate(() => document.activeElement?.textContent.trim());
    if (here === name) return;
  }
  throw new Error(`Tab never came to ${name}`);
}

test('by keyboard alone: a check is mended and undone, another left with its reason, a line reached', async () => {
  const { page, quiet } = await openAs(stage.browser, stage.url, mouse.house.creator, DESK);
  await page.goto(bench());
  await page.getByRole('button', { name: /^Checks 4/ }).waitFor();

  await page.keyboard.press('c');
  const panel = page.getByRole('region', { name: 'Automatic checks' });
  await expect.poll(() => panel.getByRole('status').innerText()).toBe('4 open, 0 left');
  expect(await axeFindings(page)).toEqual([]);

  await tabTo(page, 'Add filling');
  await page.keyboard.press('Enter');
  await expect.poll(materials).toEqual(['Filling']);
  await expect.poll(() => panel.getByRole('status').innerText()).toBe('3 open, 0 left');
  await page.keyboard.press('Control+z');
  await expect.poll(materials).toEqual([]);
  await expect.poll(() => panel.getByRole('status').innerText()).toBe('4 open, 0 left');

  await panel.focus();
  await tabTo(page, 'Leave as it is');
  await page.keyboard.press('Enter');
  await page.keyboard.type('Scraps of yarn will do.');
  await page.keyboard.press('Enter');
  await expect.poll(left).toEqual(['Scraps of yarn will do.']);
  await expect.poll(() => panel.getByRole('status').innerText()).toBe('3 open, 1 left');
  expect(await axeFindings(page)).toEqual([]);

  await tabTo(page, 'A step of Body');
  await page.keyboard.press('Enter');
  const field = page.getByRole('textbox', { name: /^Instruction/ });
  await expect.poll(() => field.evaluate((area) => (area as HTMLTextAreaElement).value)).toBe('Stuff firmly.');
  quiet();
  await page.context().close();
});

test('the reason still stands on another day, and sending to proof says what it leaves open', async () => {
  const { page, quiet } = await openAs(stage.browser, stage.url, mouse.house.editor, DESK);
  await page.goto(bench());
  const send = page.getByRole('button', { name: 'Send to proof' });
  await expect.poll(() => page.getByText(/leaves open\s+3 checks/).isVisible()).toBe(true);
  await page.getByRole('button', { name: /^Checks 3/ }).click();
  await expect.poll(() => page.getByText('Scraps of yarn will do.').isVisible()).toBe(true);
  await page.getByRole('button', { name: 'Open it again' }).click();
  await expect.poll(left).toEqual([]);
  await send.click();
  await expect.poll(() => page.getByText('Sent to proof, with 4 checks still open').isVisible()).toBe(true);
  quiet();
  await page.context().close();
});

test('on a phone the list fits and can be used', async () => {
  const { page, quiet } = await openAs(stage.browser, stage.url, mouse.house.editor, PHONE);
  await page.goto(bench());
  await page.getByRole('button', { name: /^Checks/ }).tap();
  await page.getByRole('heading', { name: 'Automatic checks' }).waitFor();
  expect(await page.evaluate(() => document.documentElement.scrollWidth <= innerWidth)).toBe(true);
  expect(await axeFindings(page)).toEqual([]);
  quiet();
  await page.context().close();
});
