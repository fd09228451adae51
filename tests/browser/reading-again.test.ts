import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { axeFindings, DESK, openBrowser, openPage, PHONE } from '../support/browser.ts';
import { buildHouse, buildPattern, TEST_PASSWORD, type Household } from '../support/builders.ts';
import { startBuiltServer, type BuiltServer } from '../support/story.ts';

/** What somebody says of a small bell; the recogniser has its trouble with single crochet. */
const FIRST = `[0:02] Hello, this is the bell. You need a bit of brass coloured cotton yarn and a three millimetre hook.

[0:10] Round one. Six single crow shay in a magic ring. That is six.

[0:20] Round two, an increase in every stitch, twelve.

[0:30] Round three. One single crow shay, then an increase, six times. Eighteen stitches.

[0:40] Round four, one single crochet in every stitch around. Eighteen.

[0:50] And that is all of the bell. Next comes the clapper.

[0:56] Round one. Five single crochet in a magic ring. That is five.
`;
const BETTER = FIRST.replaceAll(
  /\[0:(\d\d)\]/gu,
  (_, s: string) => `[${Math.floor((Number(s) + 6) / 60)}:${String((Number(s) + 6) % 60).padStart(2, '0')}]`,
).replace(
  'One single crow shay, then an increase, six times. Eighteen stitches.',
  'Two single crochet, then an increase, four times. Sixteen stitches.',
);

let server: BuiltServer;
let browser: Browser;
let house: Household;
let patternId: string;
beforeAll(async () => {
  [server, browser] = await Promise.all([startBuiltServer(), openBrowser()]);
  house = await buildHouse(server.db);
  patternId = (await buildPattern(server.db, { studio_id: house.studio.id, title: 'Bell' })).id;
}, 90_000);
afterAll(async () => {
  await browser.close();
  await server.close();
});

async function signIn(page: Page): Promise<void> {
  await page.goto(`${server.url}/sign-in`);
  await page.getByLabel('Email').fill(house.creator.email);
  await page.getByLabel('Password', { exact: true }).fill(TEST_PASSWORD);
  await page.keyboard.press('Enter');
  await page.waitForURL(`${server.url}/`);
}

async function giveTranscript(page: Page, text: string): Promise<void> {
  const chooser = page.waitForEvent('filechooser');
  await page.getByRole('button', { name: /Choose a transcript|Swap file/ }).click();
  await (await chooser).setFiles({ name: 'bell.txt', mimeType: 'text/plain', buffer: Buffer.from(text) });
}

const picture = async (page: Page, name: string) => {
  if (process.env.SHOTS) await page.screenshot({ path: `${process.env.SHOTS}/${name}.png`, fullPage: true });
};

test('a maker looks over a draft, puts right what was mis-heard, and takes another reading line by line', async () => {
  const { page, quiet } = await openPage(browser, DESK);
  await signIn(page);
  await page.goto(`${server.url}/patterns/${patternId}/recording`);
  await giveTranscript(page, FIRST);
  const heard = page.getByRole('region', { name: 'What was heard' });
  await heard.getByText('2 pieces, 5 rounds, 5 agree, nothing to look at.').waitFor();
  await heard.getByText('In the pattern').first().waitFor();
  await page.getByRole('region', { name: 'Words that were mis-heard' }).getByText('2 to put right').waitFor();
  await picture(page, 'recording');
  expect(await axeFindings(page)).toEqual([]);

  // A piece is left out, and taken again.
  await heard
    .getByRole('button', { name: /^Leave .* out$/ })
    .last()
    .click();
  await heard.getByText('Not in the pattern.').waitFor();
  await heard.getByRole('button', { name: /^Take / }).click();
  await expect.poll(() => heard.getByText('In the pattern').count()).toBe(2);

  // Enter writes one and goes on to the next.
  await page
    .getByRole('button', { name: /^Write single crochet for single crow shay/ })
    .first()
    .focus();
  await page.keyboard.press('Enter');
  await page.getByText('1 to put right, 1 done').waitFor();
  await page.keyboard.press('Enter');
  await page.getByText('All are put right in the captions.').waitFor();

  // At the bench somebody words one round by hand, and a better transcript comes.
  await page.goto(`${server.url}/patterns/${patternId}/bench`);
  await page.locator('[data-line]').filter({ hasText: 'R4' }).first().click();
  await page.getByRole('textbox', { name: /Instruction/ }).fill('sc evenly around');
  await page.keyboard.press('Escape');
  await expect.poll(() => page.getByRole('status').allInnerTexts()).toContainEqual(expect.stringMatching(/^Saved/));
  await page.goto(`${server.url}/patterns/${patternId}/recording`);
  await giveTranscript(page, BETTER);
  await page.getByText('2 places would read otherwise').waitFor();
  await page.getByRole('link', { name: 'Look at what would change' }).click();
  await page.waitForURL(/\/reading\//);
  await page.getByText('written by hand').waitFor();
  await picture(page, 'reading');
  expect(await axeFindings(page)).toEqual([]);
  await page.getByRole('button', { name: 'Take one line' }).click();
  await page.getByText('One line taken').waitFor();
  const texts = () =>
    server.db('lines').where({ pattern_id: patternId }).whereNull('deleted_at').pluck<string[]>('text');
  expect(await texts()).toEqual(expect.arrayContaining(['(2 sc, inc) × 4', 'sc evenly around']));
  await page.getByRole('button', { name: 'Undo' }).click();
  await page.getByText('Undone', { exact: true }).waitFor();
  expect(await texts()).toContain('(sc, inc) × 6');
  quiet();
}, 120_000);

test('words that are chosen in the transcript become what somebody says they are, by keys and by hand', async () => {
  const { page, quiet } = await openPage(browser, DESK);
  await signIn(page);
  await page.goto(`${server.url}/patterns/${patternId}/bench`);
  await page.getByText('increase in every stitch').waitFor();
  await page.keyboard.press('w');
  const bar = page.getByRole('region', { name: 'Chosen words' });
  await bar.getByText('Hello, this is the bell').waitFor();
  await picture(page, 'bench-words');
  expect(await axeFindings(page)).toEqual([]);
  await bar.getByRole('button', { name: 'A note' }).focus();
  await page.keyboard.press('Enter');
  await page.getByText('A note is made').waitFor();
  await bar.waitFor({ state: 'detached' });
  const notes = await server.db('lines').where({ pattern_id: patternId, kind: 'note' }).pluck<string[]>('text');
  expect(notes[0]).toContain('this is the bell');

  // By mouse: the words of a round, for another round that is open.
  await page.locator('[data-line]').filter({ hasText: 'R3' }).first().click();
  const words = page.locator('[data-at]').filter({ hasText: 'increase in every stitch' }).first();
  const box = (await words.boundingBox())!;
  await page.mouse.move(box.x + 2, box.y + 6);
  await page.mouse.down();
  await page.mouse.move(box.x + box.width - 2, box.y + box.height - 6, { steps: 5 });
  await page.mouse.up();
  await bar.getByRole('button', { name: 'Read R3 again as this' }).click();
  await page.getByText('Read again').first().waitFor();
  const third = await server.db('lines').where({ pattern_id: patternId, label: 'R3' }).first<{ text: string }>('text');
  expect(third.text).toMatch(/inc/);
  quiet();
}, 120_000);

test('all of it can be seen on a phone', async () => {
  const { page, quiet } = await openPage(browser, PHONE);
  await signIn(page);
  await page.goto(`${server.url}/patterns/${patternId}/recording`);
  await page.getByRole('link', { name: 'Look at what would change' }).waitFor();
  await picture(page, 'recording-phone');
  expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(390);
  await page.getByRole('link', { name: 'Look at what would change' }).tap();
  await page.getByText('As it stands, as it would read').waitFor();
  await picture(page, 'reading-phone');
  expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(390);
  expect(await axeFindings(page)).toEqual([]);
  quiet();
}, 120_000);
