import type { Browser } from 'playwright-core';
import request from 'supertest';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { buildApp, type TestApp } from '../support/app.ts';
import { axeFindings, DESK, listen, openBrowser, openPage, PHONE, type Listening } from '../support/browser.ts';
import { TEST_PASSWORD } from '../support/builders.ts';
import { buildMouse, type MousePattern } from '../support/mouse-pattern.ts';

/** The mouse as it was filmed after it was written: round three is another, round four is not written. */
const TALK = `WEBVTT

00:02:00.000 --> 00:02:06.000
Round one. Six single crochet in a magic ring. That is six.

00:02:20.000 --> 00:02:26.000
Round two. Increase in every stitch around, so twelve.

00:02:40.000 --> 00:02:46.000
Round three. Two single, then an increase, four times. That makes sixteen.

00:03:00.000 --> 00:03:06.000
Round four. One single crochet in every stitch around. Still sixteen.
`;

let house: TestApp;
let server: Listening;
let browser: Browser;
let mouse: MousePattern;

beforeAll(async () => {
  house = await buildApp();
  mouse = await buildMouse(house.db);
  await house.db('marks').where({ pattern_id: mouse.patternId }).delete();
  await request(house.app)
    .post(`/api/recordings/${mouse.recordingId}/transcripts`)
    .set(await house.as(mouse.house.creator))
    .attach('file', Buffer.from(TALK), { filename: 'mouse.vtt', contentType: 'text/vtt' });
  await house.workAll();
  server = await listen(house.app);
  browser = await openBrowser();
});
afterAll(async () => {
  await browser.close();
  await server.close();
  await house.close();
});

const marks = async () =>
  (await house.db('marks').where({ pattern_id: mouse.patternId }).whereNull('deleted_at')).length;

test.each([
  ['at a desk', DESK],
  ['on a phone', PHONE],
])('%s a written pattern is held against its recording, taken at once and given back', async (_, options) => {
  const { page, quiet } = await openPage(browser, options);
  await page.goto(`${server.url}/sign-in`);
  await page.getByLabel(/e-?mail/i).fill(mouse.house.creator.email);
  await page.getByLabel('Password', { exact: true }).fill(TEST_PASSWORD);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL((url) => !url.pathname.startsWith('/sign-in'));
  await page.goto(`${server.url}/patterns/${mouse.patternId}/recording/held`);
  const row = (name: string) => page.getByRole('main').getByRole('listitem').filter({ hasText: name }).first();
  await expect.poll(() => row('R3').innerText()).toContain('said differently');
  expect(await row('R4').innerText()).toContain('filmed, not written');
  expect(await axeFindings(page)).toEqual([]);
  expect(await page.evaluate(() => document.documentElement.scrollWidth - innerWidth)).toBeLessThanOrEqual(0);

  await page.getByRole('button', { name: 'Take all 3 lines found' }).click();
  await expect.poll(marks).toBe(3);
  await page.getByRole('button', { name: 'Undo' }).click();
  await expect.poll(marks).toBe(0);
  quiet();
  await page.context().close();
});
