import type { Page } from 'playwright-core';
import { expect, test } from 'vitest';
import { axeFindings, DESK, PHONE } from '../support/browser.ts';
import type { PersonRow } from '../support/builders.ts';
import { openAs } from '../support/open-as.ts';
import { buildMouse, type MousePattern } from '../support/mouse-pattern.ts';
import { setStage } from '../support/stage.ts';

let mouse: MousePattern;
const stage = setStage(async (house) => {
  mouse = await buildMouse(house.db);
});

async function openBench(person: PersonRow, options: typeof DESK) {
  const opened = await openAs(stage.browser, stage.url, person, options);
  await opened.page.goto(`${stage.url}/patterns/${mouse.patternId}/bench`);
  await opened.page.locator('[data-line]').first().waitFor();
  return opened;
}
const line = (page: Page, n: number) => page.locator('[data-line]').nth(n);
const others = (page: Page) => page.getByRole('status', { name: 'Also here' });

test('two people at one pattern see each other, and each other’s work as it is saved', async () => {
  const creator = await openBench(mouse.house.creator, DESK);
  const editor = await openBench(mouse.house.editor, PHONE);
  await others(creator.page).getByText(`${mouse.house.editor.name} is here`).waitFor({ state: 'attached' });
  await others(editor.page).getByText(`${mouse.house.creator.name} is here`).waitFor({ state: 'attached' });

  const words = 'snug but not tight, and no hurry about it';
  await line(editor.page, 2).click();
  await others(creator.page).getByText(`${mouse.house.editor.name} is at R3`).waitFor({ state: 'attached' });
  const field = editor.page.getByRole('textbox', { name: /^Instruction/ });
  await field.press('End');
  await field.pressSequentially(`, ${words}`);
  // Nobody looks at the clock: what was saved is told, and comes within a moment.
  await expect.poll(() => line(creator.page, 2).innerText(), { timeout: 5_000 }).toContain(words);
  expect(await axeFindings(creator.page)).toEqual([]);

  // What the other wrote stands in the line's history and is brought back from there, which is a step as well.
  await line(creator.page, 2).click();
  const mine = creator.page.getByRole('textbox', { name: /^Instruction/ });
  await mine.fill('(sc, inc) x 7 (18)');
  await creator.page.getByRole('button', { name: /more/i }).last().click();
  await creator.page.getByRole('button', { name: 'From the start' }).click();
  const steps = creator.page.getByRole('region', { name: 'R3 from the start' }).getByRole('listitem');
  await expect.poll(() => steps.first().innerText()).toContain('(sc, inc) x 7');
  expect(await steps.nth(1).innerText()).toContain(`${mouse.house.editor.name} wrote the instruction`);
  expect(await axeFindings(creator.page)).toEqual([]);
  await steps
    .nth(1)
    .getByRole('button', { name: /^Restore R3/ })
    .click();
  await expect.poll(() => mine.inputValue()).toContain(words);
  await expect.poll(() => steps.first().innerText()).toContain('as it is now');

  await editor.page.close();
  await expect.poll(() => others(creator.page).getByRole('listitem').count()).toBe(0);
  creator.quiet();
  editor.quiet();
});
