import request from 'supertest';
import { expect, test } from 'vitest';
import { axeFindings, DESK, PHONE } from '../support/browser.ts';
import { buildMouse, type MousePattern } from '../support/mouse-pattern.ts';
import { openAs } from '../support/open-as.ts';
import { setStage } from '../support/stage.ts';

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

let mouse: MousePattern;
const stage = setStage(async (house) => {
  mouse = await buildMouse(house.db);
  await house.db('marks').where({ pattern_id: mouse.patternId }).delete();
  await request(house.app)
    .post(`/api/recordings/${mouse.recordingId}/transcripts`)
    .set(await house.as(mouse.house.creator))
    .attach('file', Buffer.from(TALK), { filename: 'mouse.vtt', contentType: 'text/vtt' });
  await house.workAll();
});

const marks = async () =>
  (await stage.house.db('marks').where({ pattern_id: mouse.patternId }).whereNull('deleted_at')).length;

test.each([
  ['at a desk', DESK],
  ['on a phone', PHONE],
])('%s a written pattern is held against its recording, taken at once and given back', async (_, options) => {
  const { page, quiet } = await openAs(stage.browser, stage.url, mouse.house.creator, options);
  await page.goto(`${stage.url}/patterns/${mouse.patternId}/recording/held`);
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
