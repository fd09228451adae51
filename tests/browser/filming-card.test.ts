import type { Page } from 'playwright-core';
import { expect, test } from 'vitest';
import { axeFindings, DESK, PHONE } from '../support/browser.ts';
import { buildMouse, type MousePattern } from '../support/mouse-pattern.ts';
import { openAs } from '../support/open-as.ts';
import { setStage } from '../support/stage.ts';

let mouse: MousePattern;
const stage = setStage(async (house) => {
  mouse = await buildMouse(house.db);
  await house.db('lines').where({ id: mouse.lines[2] }).update({ from_no: 3, to_no: 6 });
});

async function openCard(options: typeof DESK): Promise<{ page: Page; quiet: (meant?: RegExp) => void }> {
  const opened = await openAs(stage.browser, stage.url, mouse.house.creator, options);
  const { page } = opened;
  await page.goto(`${stage.url}/patterns/${mouse.patternId}/bench`);
  return opened;
}
const heading = (page: Page) => page.locator('#card-now').innerText();
const fontSize = (page: Page) =>
  page.locator('section p.font-serif').evaluate((one) => parseFloat(getComputedStyle(one).fontSize));

test('the creator reads the pattern by keys and pedal, also when the connection is gone', async () => {
  const { page, quiet } = await openCard(DESK);
  await page.getByRole('link', { name: 'Filming card' }).click();
  await expect.poll(() => heading(page)).toBe('R1');
  expect(await page.getByText('6 sc in magic ring').first().isVisible()).toBe(true);
  expect(await axeFindings(page)).toEqual([]);

  await page.context().setOffline(true);
  await expect.poll(() => page.getByText('Off line: the card goes on.').isVisible()).toBe(true);
  for (const [key, name] of [
    ['PageDown', 'R2'],
    ['Space', 'R3–6'],
    ['PageUp', 'R2'],
    ['Enter', 'R3–6'],
    ['ArrowDown', 'Step'],
    ['ArrowLeft', 'R3–6'],
    ['Home', 'R1'],
  ] as const) {
    await page.keyboard.press(key);
    expect([key, await heading(page)]).toEqual([key, name]);
  }
  await page.keyboard.type('5');
  await expect.poll(() => heading(page)).toBe('R3–6');
  expect(await page.locator('.ruled-off').filter({ hasText: '18 each' }).isVisible()).toBe(true);

  await page.context().setOffline(false);
  const before = await fontSize(page);
  await page.keyboard.press('+');
  await expect.poll(() => fontSize(page)).toBeGreaterThan(before);
  await page.keyboard.press('d');
  expect(await axeFindings(page)).toEqual([]);
  await page.reload();
  await expect.poll(() => heading(page)).toBe('R3–6');
  await expect.poll(() => fontSize(page)).toBeGreaterThan(before);
  quiet(/ERR_INTERNET_DISCONNECTED/);
  await page.context().close();
});

test('a line that is too long for its size is set smaller until it fits', async () => {
  await stage.house
    .db('lines')
    .where({ id: mouse.lines[1] })
    .update({ text: `${Array.from({ length: 30 }, (_, i) => `${i + 1} sc in next st`).join(', ')} (12)` });
  const { page, quiet } = await openCard(DESK);
  await page.goto(`${stage.url}/patterns/${mouse.patternId}/card`);
  await expect.poll(() => heading(page)).toBe('R1');
  const short = await fontSize(page);
  await page.keyboard.press('ArrowRight');
  await expect.poll(() => fontSize(page)).toBeLessThan(short);
  const box = page.locator('section[aria-labelledby=card-now] > div');
  expect(await box.evaluate((one) => one.scrollHeight - one.clientHeight)).toBeLessThanOrEqual(1);
  quiet();
  await page.context().close();
});

test('on a phone it is turned with the thumb, lines are chosen from the list, and nothing runs out of the screen', async () => {
  const { page, quiet } = await openCard(PHONE);
  await page.goto(`${stage.url}/patterns/${mouse.patternId}/card`);
  await page.getByRole('button', { name: /^Next/ }).click();
  await expect.poll(() => heading(page)).toBe('R2');
  await page.getByRole('button', { name: 'All lines' }).click();
  expect(await axeFindings(page)).toEqual([]);
  await page.getByRole('button', { name: /^R3–6/ }).click();
  await expect.poll(() => heading(page)).toBe('R3–6');
  expect(await page.evaluate(() => document.documentElement.scrollWidth - innerWidth)).toBeLessThanOrEqual(0);
  quiet();
  await page.context().close();
});

test('on paper every line stands whole, black on white', async () => {
  const { page } = await openCard(DESK);
  await page.goto(`${stage.url}/patterns/${mouse.patternId}/card`);
  await page.locator('#card-now').waitFor();
  await page.emulateMedia({ media: 'print' });
  expect(await page.locator('main').isVisible()).toBe(false);
  const lines = page.locator('.card-print-line');
  expect(await lines.count()).toBe(4);
  expect(await lines.nth(2).innerText()).toMatch(/R3–6\s+\(sc, inc\) × 6\s+18 each/);
  const looks = await lines.nth(0).evaluate((one) => {
    const { color, breakInside } = getComputedStyle(one);
    return [color, breakInside];
  });
  expect(looks).toEqual(['rgb(0, 0, 0)', 'avoid']);
  await page.context().close();
});
