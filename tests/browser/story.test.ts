import { execFileSync } from 'node:child_process';
import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { axeFindings, DESK, openBrowser, openPage, PHONE } from '../support/browser.ts';
import {
  linkFromLetter,
  startBuiltServer,
  writeStoryFiles,
  type BuiltServer,
  type StoryFiles,
} from '../support/story.ts';

/** What a maker might say of a small pear; the total of round four is a slip of the tongue. */
const TRANSCRIPT = `1
00:00:02,000 --> 00:00:07,000
Round one. Six single crochet in a magic ring. That's six.

2
00:00:10,000 --> 00:00:15,000
Round two is an increase in every stitch, twelve.

3
00:00:20,000 --> 00:00:27,000
Round three: one single, then an increase, six times. Eighteen stitches.

4
00:00:32,000 --> 00:00:39,000
Round four. Two single crochet and an increase, six times. That makes twenty two.

5
00:00:45,000 --> 00:00:52,000
Rounds five to eight, one single crochet in every stitch, twenty four each.

6
00:00:58,000 --> 00:01:05,000
Round nine. Two single, then a decrease, six times, eighteen.

7
00:01:10,000 --> 00:01:16,000
Now stuff it. Round ten: one single and a decrease, six times. Twelve.

8
00:01:20,000 --> 00:01:27,000
Round eleven, decrease six times, and six are left. Then fasten off.
`;
const MAKER = { name: 'Alba Fenn', email: 'alba@seedpear.example', password: 'a long enough pass phrase' };
const CLIP_BYTES = 40_000_000;

let server: BuiltServer;
let browser: Browser;
let files: StoryFiles;

beforeAll(async () => {
  [server, browser] = await Promise.all([startBuiltServer(), openBrowser()]);
  files = writeStoryFiles(TRANSCRIPT, CLIP_BYTES);
});
afterAll(async () => {
  files.remove();
  await browser.close();
  await server.close();
});

async function signUpAndOpenStudio(page: Page): Promise<void> {
  await page.goto(`${server.url}/sign-up`);
  await page.getByLabel('Email').fill(MAKER.email);
  await page.getByLabel('Name, as others see it').fill(MAKER.name);
  await page.getByLabel('Password', { exact: true }).fill(MAKER.password);
  await page.keyboard.press('Enter');
  await page.getByText('A letter with a link is on its way').waitFor();
  await page.goto(await linkFromLetter(MAKER.email));
  await page.getByRole('button', { name: 'Confirm this address' }).click();
  await page.getByText('Your address is confirmed').waitFor();
  await page.getByLabel('Email').fill(MAKER.email);
  await page.getByLabel('Password', { exact: true }).fill(MAKER.password);
  await page.keyboard.press('Enter');
  await page.waitForURL(`${server.url}/account`);
  await page.goto(`${server.url}/studio/open`);
  await page.getByLabel('Its name, as it stands on sheets').fill('Fenn and Field');
  await page.getByRole('button', { name: 'Open the studio' }).click();
  await page.waitForURL(`${server.url}/`);
}

/** Chooses both files; the connection is lost once the third part is on its way, and comes back. */
async function giveFiles(page: Page): Promise<void> {
  await page.goto(`${server.url}/new`);
  await page.getByLabel('Name', { exact: true }).fill('Seed pear');
  const transcript = page.waitForEvent('filechooser');
  await page
    .getByRole('button', { name: /transcript/i })
    .first()
    .click();
  await (await transcript).setFiles(files.transcript);
  await page.getByText('8 captions read').waitFor();

  let cut = 0;
  await page.route('**/api/uploads/*/parts/*', async (route) => {
    if (route.request().url().endsWith('/parts/3') && cut === 0) {
      cut += 1;
      await route.abort('connectionreset');
    } else await route.continue();
  });
  const clip = page.waitForEvent('filechooser');
  await page.getByRole('button', { name: /clip/i }).first().click();
  await (await clip).setFiles(files.clip);
  // The bench waits for no clip; this maker does, to see it go on after the cut.
  await page.getByText('here whole and ready to play').waitFor({ timeout: 60_000 });
  expect(cut).toBe(1);
  await page.getByRole('button', { name: 'Open at the bench' }).click();
}

const rowOf = (page: Page, name: string) => page.locator('[data-line]').filter({ hasText: name }).first();

async function mendAtTheBench(page: Page): Promise<void> {
  await page.waitForURL(/\/patterns\/[^/]+\/bench/);
  const fourth = rowOf(page, 'R4');
  await expect.poll(() => fourth.innerText()).toContain('differs');
  await fourth.click();
  await page.getByRole('textbox', { name: 'Total said, R4' }).fill('24');
  await page.keyboard.press('Escape');
  await expect.poll(() => rowOf(page, 'R4').innerText()).toContain('agrees');
  await expect.poll(() => page.getByRole('status').allInnerTexts()).toContainEqual(expect.stringMatching(/^Saved/));
}

async function publish(page: Page): Promise<string> {
  await page.getByRole('link', { name: 'Sheet' }).click();
  await page.waitForURL(/\/sheet/);
  await page.getByRole('button', { name: 'Publish edition 1' }).click();
  await page.getByText('Edition 1 is out').waitFor();
  const { code } = await server.db('patterns').first<{ code: string }>('code');
  return code;
}

test('a maker gets from a recording to a checked sheet, and a viewer to the round they are on', async () => {
  const { page, quiet } = await openPage(browser, DESK);
  await signUpAndOpenStudio(page);
  await giveFiles(page);
  await mendAtTheBench(page);
  expect(await axeFindings(page)).toEqual([]);
  const code = await publish(page);
  quiet(/ERR_CONNECTION_RESET/);

  const sheet = await fetch(`${server.url}/api/editions/${code}/1/sheet.pdf`);
  expect(sheet.headers.get('content-type')).toBe('application/pdf');
  const printed = execFileSync('pdftotext', ['-layout', '-', '-'], {
    input: Buffer.from(await sheet.arrayBuffer()),
    encoding: 'utf8',
  });
  expect(printed).toMatch(/Seed pear/);
  expect(printed).toMatch(/R4\s+\(2 sc, inc\) ×\s?6\s+24\s/);
  expect(printed).toMatch(/R5–8\s+.*24 each/);

  const viewer = await openPage(browser, PHONE);
  await viewer.page.goto(`${server.url}/w/${code}`);
  await expect.poll(() => viewer.page.locator('.watch-where b').innerText()).toContain('Round 1 of');
  await viewer.page.locator('.watch-dock-tick').tap();
  await expect.poll(() => viewer.page.locator('.watch-where b').innerText()).toContain('Round 2 of');
  await viewer.page.goto(`${server.url}/w/${code}?t=46`);
  const clipTime = () => viewer.page.locator('video').evaluate((video) => (video as HTMLVideoElement).currentTime);
  await expect.poll(clipTime).toBeGreaterThanOrEqual(45.9);
  expect(await axeFindings(viewer.page)).toEqual([]);
  viewer.quiet();
}, 240_000);
