import { expect, test } from 'vitest';
import { axeFindings, DESK, PHONE } from '../support/browser.ts';
import { buildHouse, type Household } from '../support/builders.ts';
import { openAs } from '../support/open-as.ts';
import { setStage } from '../support/stage.ts';

let studio: Household;
const stage = setStage(async (house) => {
  studio = await buildHouse(house.db);
});

const TEXT = `Oval basket

Hook: 4 mm

Base
R1: 6 sc in magic ring (6)
R2: inc x 6 (12)
R3: (sc, inc) x 6,
(18)
Work the next part firmly, about 12 cm tall
R4: (2 sc, inc) x 6 (22)

Handle (make 2)
Row 1: ch 11, sc in 2nd ch from hook and in each ch across (10)
`;

async function openDesk(options = DESK) {
  const opened = await openAs(stage.browser, stage.url, studio.creator, options);
  await opened.page.goto(`${stage.url}/new/written`);
  await opened.page.getByRole('textbox', { name: 'The pattern as written' }).waitFor();
  return opened;
}

test('a written pattern comes in by keyboard alone: pasted, confirmed, and open at the bench with its verdicts', async () => {
  const { page, quiet } = await openDesk();
  await page.keyboard.insertText(TEXT);
  await expect.poll(() => page.locator('main').innerText()).toContain('to confirm');
  expect(await page.getByRole('textbox', { name: 'Name' }).inputValue()).toBe('Oval basket');
  await page.keyboard.press('Tab');
  const next = page.getByRole('button', { name: 'Next', exact: true });
  while (!(await next.evaluate((button) => button === document.activeElement))) await page.keyboard.press('Tab');
  await page.keyboard.press('Enter');
  for (let i = 0; i < 12 && (await next.isVisible()); i += 1) await page.keyboard.press('y');
  await expect.poll(() => page.locator('main').innerText()).not.toContain('to confirm');
  await page.keyboard.press('Control+Enter');
  await page.waitForURL(/\/patterns\/[^/]+\/bench/);
  await expect.poll(() => page.getByRole('button', { name: /^round 4,.*written 22, worked out 24/ }).count()).toBe(1);
  await expect.poll(() => page.locator('main').innerText()).toContain('Handle');
  quiet();
  await page.context().close();
});

test('an empty, a huge and a binary file are refused in words, and what stood there stays', async () => {
  const { page, quiet } = await openDesk();
  await page.getByRole('textbox', { name: 'The pattern as written' }).fill(TEXT);
  for (const [buffer, words] of [
    [Buffer.from(' \n'), 'nothing written'],
    [Buffer.alloc(1_000_001, 'a'), 'larger than 1 MB'],
    [Buffer.from([0x25, 0x50, 0x44, 0x46, 0, 1, 2, 3, 0, 0, 0, 9]), 'not a text file'],
  ] as const) {
    await page.getByLabel('Text file').setInputFiles({ name: 'pattern.txt', mimeType: 'text/plain', buffer });
    await expect.poll(() => page.getByRole('alert').innerText()).toContain(words);
  }
  expect(await page.getByRole('textbox', { name: 'The pattern as written' }).inputValue()).toBe(TEXT);
  quiet();
  await page.context().close();
});

test.each([
  ['a desk', DESK],
  ['a phone', PHONE],
])('axe finds nothing on %s while a cut is confirmed, and nothing runs out at the side', async (_what, options) => {
  const { page, quiet } = await openDesk(options);
  await page.getByRole('textbox', { name: 'The pattern as written' }).fill(TEXT);
  await page.getByRole('button', { name: 'Next', exact: true }).click();
  await page.getByRole('button', { name: 'Right as it is' }).waitFor();
  expect(await axeFindings(page)).toEqual([]);
  expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(
    page.viewportSize()!.width,
  );
  quiet();
  await page.context().close();
});
