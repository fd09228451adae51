import type { Page } from 'playwright-core';
import { describe, expect, test } from 'vitest';
import { axeFindings, DESK, openPage, PHONE } from '../support/browser.ts';
import { setStage } from '../support/stage.ts';

const stage = setStage();

const CAP = `Cap
R1: 6 sc in magic ring (6)
R2: inc x 6 (12)
R3: (sc, inc) x 5 (18)
R4: sc in each st around
`;
const address = () => `${stage.url}/count`;
const field = (page: Page) => page.getByRole('textbox', { name: 'The pattern as written' });
const lines = (page: Page) => page.locator('[data-line]');

async function openCount(options = DESK) {
  const opened = await openPage(stage.browser, options);
  await opened.page.goto(address());
  await field(opened.page).waitFor();
  return opened;
}

async function write(page: Page, text: string) {
  await field(page).fill(text);
  await expect.poll(() => lines(page).count()).toBeGreaterThan(0);
}

describe('somebody who pastes a pattern', () => {
  test('sees each total, where the stitches run out, and mends it with one key; undo takes it back', async () => {
    const { page, quiet } = await openCount();
    await write(page, CAP);
    await expect.poll(() => page.getByRole('list', { name: 'Verdicts' }).innerText()).toContain('does not fit');
    await field(page).press('F8');
    const open = page.getByRole('region', { name: 'R3, open' });
    await expect.poll(() => open.innerText()).toContain('(sc, inc) x 6 (18)');
    await field(page).press('Control+Enter');
    await expect.poll(() => field(page).inputValue()).toContain('R3: (sc, inc) x 6 (18)');
    await expect.poll(() => page.getByRole('list', { name: 'Verdicts' }).innerText()).not.toContain('does not fit');
    await field(page).press('Control+z');
    expect(await field(page).inputValue()).toBe(CAP);
    quiet();
    await page.context().close();
  });

  test('is offered the figure of a line without a total', async () => {
    const { page, quiet } = await openCount();
    await write(page, CAP.replace('x 5', 'x 6'));
    // The caret stands in the last line, so that one is in hand.
    await page.getByRole('region', { name: 'R4, open' }).waitFor();
    await page.getByRole('button', { name: 'Use this' }).waitFor();
    await page.keyboard.press('Control+Enter');
    await expect.poll(() => field(page).inputValue()).toContain('R4: sc in each st around (18)');
    quiet();
    await page.context().close();
  });

  test('reads the terms and why, chooses others, and says what a lone line works into', async () => {
    const { page, quiet } = await openCount();
    await write(page, '(2 sc, dec) x 6 (18)');
    await expect.poll(() => page.locator('main').innerText()).toContain('"sc" is a US name.');
    await page.getByLabel('First line works into').fill('24');
    const verdicts = page.getByRole('list', { name: 'Verdicts' });
    await expect.poll(() => verdicts.innerText()).toContain('agrees');
    await page.getByLabel('First line works into').fill('25');
    await expect.poll(() => verdicts.innerText()).toContain('does not fit');
    await page.getByText('UK terms').click();
    await expect.poll(() => page.locator('main').innerText()).toContain('As you chose.');
    quiet();
    await page.context().close();
  });

  test('goes through the lines and the ring map by keyboard', async () => {
    const { page, quiet } = await openCount();
    await write(page, CAP);
    await page.getByRole('button', { name: /^round 1,/ }).focus();
    await page.keyboard.press('Enter');
    await page.keyboard.press('ArrowDown');
    await expect.poll(() => page.getByRole('region', { name: 'R2, open' }).count()).toBe(1);
    const ring = page.getByRole('button', { name: 'Round 2, 12 stitches, agrees' });
    await ring.focus();
    await page.keyboard.press('ArrowDown');
    await page.keyboard.press('Enter');
    await expect.poll(() => page.getByRole('region', { name: 'R1, open' }).count()).toBe(1);
    quiet();
    await page.context().close();
  });
});

describe('what is pasted', () => {
  test('never leaves the browser: no request but for files of the page, and the page may connect to nothing', async () => {
    const { page, quiet } = await openCount();
    const asked: string[] = [];
    page.on('request', (request) => asked.push(request.url()));
    await write(page, CAP);
    await page.waitForTimeout(1_000);
    const elsewhere = asked.filter((url) => !/\/(?:assets\/|count|light\.js|mark\.svg)/.test(new URL(url).pathname));
    expect(elsewhere).toEqual([]);
    const answer = await page.request.get(address());
    expect(answer.headers()['content-security-policy']).toContain("connect-src 'none'");
    quiet();
    await page.context().close();
  });

  test('is there again after the network is gone and the page is opened anew', async () => {
    const { page, quiet } = await openCount();
    await page.evaluate(async () => {
      await navigator.serviceWorker.ready;
    });
    await write(page, CAP);
    await expect.poll(() => page.evaluate(() => localStorage.getItem('roundelay.count'))).toContain('magic ring');
    await page.context().setOffline(true);
    await page.reload();
    await expect.poll(() => field(page).inputValue()).toBe(CAP);
    await expect.poll(() => lines(page).count()).toBe(4);
    quiet();
    await page.context().close();
  });

  test('goes along in a link, compressed, and opens from it with what was chosen', async () => {
    const { page, quiet } = await openCount();
    await write(page, CAP);
    await page.getByText('UK terms').click();
    await page.getByRole('button', { name: 'Share' }).click();
    const link = page.getByRole('textbox', { name: 'The link' });
    await expect.poll(() => link.inputValue()).toContain('#z=');
    const address2 = await link.inputValue();
    await page.context().close();
    const other = await openPage(stage.browser, PHONE);
    await other.page.goto(address2);
    await expect.poll(() => field(other.page).inputValue()).toBe(CAP);
    await expect.poll(() => other.page.locator('main').innerText()).toContain('As you chose.');
    await other.page.goto(address2.slice(0, 60));
    await expect.poll(() => other.page.getByRole('alert').innerText()).toContain('came in pieces');
    quiet();
    other.quiet();
    await other.page.context().close();
  });
});

describe('for everybody', () => {
  test.each([
    ['a desk', DESK, 'light' as const],
    ['a desk in the dark', DESK, 'dark' as const],
    ['a phone', PHONE, 'light' as const],
  ])('axe finds nothing on %s, empty, with a slip open, and with the link', async (_what, options, colorScheme) => {
    const { page, quiet } = await openCount({ ...options, colorScheme });
    expect(await axeFindings(page)).toEqual([]);
    await write(page, CAP);
    await page.getByRole('button', { name: /^round 3,/ }).click();
    await page.getByRole('button', { name: 'Use this' }).waitFor();
    expect(await axeFindings(page)).toEqual([]);
    await page.getByRole('button', { name: 'Share' }).click();
    await page.getByRole('textbox', { name: 'The link' }).waitFor();
    expect(await axeFindings(page)).toEqual([]);
    quiet();
    await page.context().close();
  });

  test.each([320, 390, 720])('nothing runs out at the side at %i px', async (width) => {
    const { page, quiet } = await openCount({ viewport: { width, height: 640 } });
    await write(page, CAP);
    await page.getByRole('button', { name: /^round 3,/ }).click();
    expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(width);
    quiet();
    await page.context().close();
  });
});
