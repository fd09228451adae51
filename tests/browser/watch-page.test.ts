import { randomUUID } from 'node:crypto';
import type { Browser, Page } from 'playwright-core';
import request from 'supertest';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { buildApp, type TestApp } from '../support/app.ts';
import { axeFindings, DESK, listen, openBrowser, openPage, PHONE, type Listening } from '../support/browser.ts';
import { buildLine, buildPiece } from '../support/builders.ts';
import { filmClip } from '../support/clips.ts';
import { buildMouse, type MousePattern } from '../support/mouse-pattern.ts';

let house: TestApp;
let server: Listening;
let browser: Browser;
let mouse: MousePattern;

async function giveClip(): Promise<void> {
  const film = filmClip('mp4', 12);
  const id = randomUUID();
  await house.deps.storage.put(id, film, 'video/mp4');
  const about = { kind: 'clip', state: 'ready', bytes: film.length, type: 'video/mp4' };
  await house.db('objects').insert({ id, key: id, studio_id: mouse.house.studio.id, ...about });
  await house.db('recordings').where({ id: mouse.recordingId }).update({ clip_object_id: id, duration_ms: 12_000 });
  // Moments within the clip: R1 at 1 s, R2 at 4 s, R3 at 7 s.
  for (const [i, line] of mouse.lines.slice(0, 3).entries()) {
    await house
      .db('marks')
      .where({ line_id: line })
      .update({ start_ms: 1_000 + 3_000 * i });
  }
}

beforeAll(async () => {
  house = await buildApp();
  mouse = await buildMouse(house.db);
  await giveClip();
  const { piece_id } = await house.db('lines').where({ id: mouse.lines[0] }).first<{ piece_id: string }>('piece_id');
  await buildLine(house.db, { piece_id, from_no: 4, to_no: 6, text: 'sc around (18 each)', short_id: 'range' });
  const ear = await buildPiece(house.db, { pattern_id: mouse.patternId, name: 'Ear', make: 2 });
  await buildLine(house.db, { piece_id: ear.id, text: '6 sc in magic ring (6)', short_id: 'ear' });
  const as = await house.as(mouse.house.creator);
  const desk = await request(house.app).get(`/api/patterns/${mouse.patternId}/next-edition`).set(as);
  const out = await request(house.app)
    .post(`/api/patterns/${mouse.patternId}/editions`)
    .set(as)
    .set('If-Match', desk.headers.etag ?? '')
    .send({ visibility: 'unlisted' });
  expect(out.status).toBe(201);
  server = await listen(house.app);
  browser = await openBrowser();
});
afterAll(async () => {
  await browser.close();
  await server.close();
  await house.close();
});

const address = (rest = '') => `${server.url}/w/${mouse.code}${rest}`;
const where = (page: Page) => page.locator('.watch-where b').innerText();
const clipTime = (page: Page) => page.locator('video').evaluate((video) => (video as HTMLVideoElement).currentTime);

describe('on a phone, by touch', () => {
  test('somebody works to the end: ticks, comes back another day, and finds the place', async () => {
    const { page, quiet } = await openPage(browser, PHONE);
    await page.goto(address());
    const tick = page.locator('.watch-dock-tick');
    expect(await where(page)).toBe('Round 1 of 6, Body');
    for (const next of ['Round 2 of 6, Body', 'Round 3 of 6, Body', 'After R3, Body', 'Round 4 of 6, Body']) {
      await tick.tap();
      await expect.poll(() => where(page)).toBe(next);
    }
    await page.reload();
    await expect.poll(() => where(page)).toBe('Round 4 of 6, Body');
    for (const next of [
      'Round 5 of 6, Body',
      'Round 6 of 6, Body',
      'Round 1 of 1, Ear 1 of 2',
      'Round 1 of 1, Ear 2 of 2',
    ]) {
      await tick.tap();
      await expect.poll(() => where(page)).toBe(next);
    }
    await tick.tap();
    await expect.poll(() => tick.innerText()).toContain('All ticked');
    quiet();
    await page.context().close();
  });

  test('the list ticks and jumps, and a range half done says how far', async () => {
    const { page, quiet } = await openPage(browser, PHONE);
    await page.goto(address('#range-5'));
    await expect.poll(() => where(page)).toBe('Round 5 of 6, Body');
    await page.locator('.watch-dock-tick').tap();
    const row = page.locator('#range');
    await expect.poll(() => row.innerText()).toContain('1 of 3');
    await page.getByRole('checkbox', { name: 'Body R4–6' }).tap();
    expect(await page.getByRole('checkbox', { name: 'Body R4–6' }).isChecked()).toBe(true);
    await page.locator('#br2 button').tap();
    await expect.poll(() => where(page)).toBe('Round 2 of 6, Body');
    await expect.poll(() => clipTime(page)).toBeCloseTo(4, 0);
    quiet();
    await page.context().close();
  });

  test('every target is large enough for a thumb, and nothing runs out at the side', async () => {
    const { page } = await openPage(browser, PHONE);
    await page.goto(address());
    await page.locator('.watch-dock-tick').waitFor();
    const small = await page
      .locator('.watch-dock button, .watch-controls > *:visible, .watch-line-go, .watch-box')
      .evaluateAll((all) =>
        all.filter((one) => one.getBoundingClientRect().height < 44).map((one) => one.outerHTML.slice(0, 80)),
      );
    expect(small).toEqual([]);
    expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(390);
    await page.context().close();
  });
});

describe('at a desk, by keyboard alone', () => {
  test('keys tick, walk, loop, mirror and turn the terms', async () => {
    const { page, quiet } = await openPage(browser, DESK);
    await page.goto(address());
    await page.locator('.watch-tick').waitFor();
    await page.keyboard.press('Enter');
    await expect.poll(() => where(page)).toBe('Round 2 of 6, Body');
    expect(await clipTime(page)).toBeLessThan(2);
    await page.keyboard.press('ArrowDown');
    await expect.poll(() => where(page)).toBe('Round 3 of 6, Body');
    await expect.poll(() => clipTime(page)).toBeCloseTo(7, 0);
    await page.keyboard.press('PageUp');
    await expect.poll(() => where(page)).toBe('Round 2 of 6, Body');
    await page.keyboard.press('l');
    await expect.poll(() => page.getByRole('button', { name: 'Loop R2' }).getAttribute('aria-pressed')).toBe('true');
    await page.keyboard.press('x');
    await expect.poll(() => page.locator('.watch-mirrored').count()).toBe(1);
    await page.keyboard.press('ArrowDown');
    await page.keyboard.press('t');
    await expect.poll(() => page.locator('.watch-now').innerText()).toContain('(dc, inc) × 6');
    await expect.poll(() => page.locator('.watch-terms').innerText()).toContain('Said: single crochet, your dc.');
    await page.keyboard.press('?');
    await expect.poll(() => page.getByRole('dialog', { name: 'Keys' }).isVisible()).toBe(true);
    await page.keyboard.press('Escape');
    quiet();
    await page.context().close();
  });

  test('the ring map is one stop; arrows go outward and Enter goes there', async () => {
    const { page, quiet } = await openPage(browser, DESK);
    await page.goto(address());
    const ring = page.getByRole('button', { name: 'Round 1, 6 stitches' });
    await ring.focus();
    await page.keyboard.press('ArrowUp');
    await page.keyboard.press('ArrowUp');
    await page.keyboard.press('Enter');
    await expect.poll(() => where(page)).toBe('Round 3 of 6, Body');
    quiet();
    await page.context().close();
  });

  test('addresses open at their line and at their second', async () => {
    const { page, quiet } = await openPage(browser, DESK);
    await page.goto(address('?t=8'));
    await expect.poll(() => where(page)).toBe('Round 3 of 6, Body');
    await expect.poll(() => clipTime(page)).toBeCloseTo(8, 0);
    await page.goto(address('/1#br2'));
    await expect.poll(() => where(page)).toBe('Round 2 of 6, Body');
    await page.evaluate(() => {
      location.hash = '#range-6';
    });
    await expect.poll(() => where(page)).toBe('Round 6 of 6, Body');
    quiet();
    await page.context().close();
  });
});

describe('for everybody', () => {
  test.each([
    ['a phone', PHONE, 'light' as const],
    ['a phone in the dark', PHONE, 'dark' as const],
    ['a desk', DESK, 'light' as const],
    ['a desk in the dark', DESK, 'dark' as const],
  ])('axe finds nothing on %s', async (_what, options, colorScheme) => {
    const { page, quiet } = await openPage(browser, { ...options, colorScheme });
    await page.goto(address());
    await page.locator('.watch-line-go').first().waitFor();
    expect(await axeFindings(page)).toEqual([]);
    quiet();
    await page.context().close();
  });

  test('without a script the whole pattern is there, with the clip and the sheet', async () => {
    const { page } = await openPage(browser, { ...DESK, javaScriptEnabled: false });
    await page.goto(address());
    const text = await page.locator('main').innerText();
    for (const words of ['6 sc in magic ring', '(sc, inc) × 6', '18 each', 'Ear']) expect(text).toContain(words);
    expect(await page.locator('video[controls]').count()).toBe(1);
    expect(await page.getByRole('link', { name: 'Print sheet' }).getAttribute('href')).toContain('sheet.pdf');
    await page.context().close();
  });

  test('where the clip cannot be had the words serve', async () => {
    const { page } = await openPage(browser, DESK);
    await page.route('**/clips/**', (route) => route.abort());
    await page.goto(address());
    await expect.poll(() => page.locator('.watch-clip').innerText()).toContain('The clip is not here');
    await page.keyboard.press('Enter');
    await expect.poll(() => where(page)).toBe('Round 2 of 6, Body');
    await page.context().close();
  });
});
