import type { Locator, Page } from 'playwright-core';
import { expect } from 'vitest';
import type { OpenStage } from '../../helpers/stage.ts';
import { section, stored } from './steps.ts';

/** The work on a claim without a mouse: everything is reached, and where the focus is can always be seen. */
export async function keyboard(open: OpenStage): Promise<void> {
  const { page } = await open();
  await beginByKeyboard(page);
  await jumpToTheClaim(page);
  await recomputeFromTheRail(page);
  await markAndTakeBack(page);
  await closeWhatOpens(page);
}

async function beginByKeyboard(page: Page): Promise<void> {
  await page.getByLabel('Your name').waitFor();
  await page.keyboard.press('Tab');
  await expectFocus(page, page.getByRole('link', { name: 'Skip to the content' }));
  await tabTo(page, page.getByLabel('Your name'));
  await page.keyboard.type('Ada Brandvold');
  await tabTo(page, page.getByLabel('Your role in this review'));
  await page.keyboard.type('reviewer');
  await page.keyboard.press('Enter');
  await page.getByRole('button', { name: 'Open the worked example' }).waitFor();
  await tabTo(page, page.getByRole('button', { name: 'Open the worked example' }));
  await page.keyboard.press('Enter');
  await page.getByRole('heading', { name: 'Claims', level: 1 }).waitFor();
}

async function jumpToTheClaim(page: Page): Promise<void> {
  await page.keyboard.press('Control+k');
  const list = page.getByRole('dialog', { name: 'Commands' });
  await expectFocus(page, list.getByRole('combobox'));
  await page.keyboard.type('nothing of this name');
  await list.getByText('Nothing here is called').waitFor();
  await page.keyboard.press('Control+a');
  await page.keyboard.type('claim at most 1.9');
  await expect
    .poll(() => list.getByRole('option', { selected: true }).innerText())
    .toBe('Claim 1: At most 1.9 °C per doubling');
  await page.keyboard.press('Enter');
  await page.getByRole('heading', { name: /A doubling of carbon dioxide/, level: 1 }).waitFor();
  await expect.poll(() => list.isVisible()).toBe(false);
}

async function recomputeFromTheRail(page: Page): Promise<void> {
  await tabTo(
    page,
    page.getByRole('navigation', { name: 'Sections of this claim' }).getByRole('link', { name: /^Recomputation/ }),
  );
  await page.keyboard.press('Enter');
  await expectFocus(page, page.getByRole('heading', { name: /^Recomputation/, level: 2 }));
  await tabTo(page, section(page, 'Recomputation').getByRole('button', { name: 'Recompute', exact: true }));
  await page.keyboard.press('Enter');
  await page.getByRole('status').getByText('Computed again: the same to the last digit.').waitFor();
  await expectFocus(page, section(page, 'Recomputation').getByRole('button', { name: 'Recompute', exact: true }));
}

async function markAndTakeBack(page: Page): Promise<void> {
  await page.keyboard.press('Control+k');
  await page.keyboard.type('go to assumptions');
  await page.keyboard.press('Enter');
  await expectFocus(page, page.getByRole('heading', { name: /^Assumptions/, level: 2 }));
  const mark = page.getByRole('combobox', { name: /^Your mark: The line passes through zero/ });
  await tabTo(page, mark);
  const before = await mark.inputValue();
  await stored(page, () => page.keyboard.press('ArrowUp'));
  const after = await mark.inputValue();
  expect([before, after]).toEqual(['not met', 'met']);

  await page.keyboard.press('Control+z');
  await expect.poll(() => mark.inputValue()).toBe('not met');
  await page.getByRole('status').getByText('Taken back: mark').waitFor();
  await page.keyboard.press('Control+Shift+z');
  await expect.poll(() => mark.inputValue()).toBe('met');
  await page.keyboard.press('Control+z');
  await expect.poll(() => mark.inputValue()).toBe('not met');

  // In a text field the keys belong to the text.
  const note = page.getByLabel('Write a note');
  await tabTo(page, note);
  await page.keyboard.type('one word');
  const entries = page.getByRole('navigation', { name: 'Project' }).getByRole('link', { name: /^Trail/ });
  const nBefore = await entries.innerText();
  await page.keyboard.press('Control+z');
  await expect.poll(() => note.inputValue()).not.toBe('one word');
  await expect(entries.innerText()).resolves.toBe(nBefore);
}

async function closeWhatOpens(page: Page): Promise<void> {
  const who = page.getByRole('button', { name: /^Reviewer:/ });
  await tabTo(page, who, 'Shift+Tab');
  await page.keyboard.press('Enter');
  const dialog = page.getByRole('dialog', { name: 'Who is reviewing' });
  await dialog.waitFor();
  for (let press = 0; press < 12; press += 1) {
    await page.keyboard.press('Tab');
    await expect(
      page.evaluate(
        () => document.activeElement?.closest('dialog') !== null || document.activeElement === document.body,
      ),
    ).resolves.toBe(true);
  }
  await page.keyboard.press('Escape');
  await expect.poll(() => dialog.isVisible()).toBe(false);
  await expectFocus(page, who);

  await page.keyboard.press('Control+k');
  await expectFocus(page, page.getByRole('combobox', { name: 'What would you like to do?' }));
  await page.keyboard.press('Escape');
  await expectFocus(page, who);

  const help = section(page, 'Assumptions').getByRole('button', { name: 'What is this?' }).first();
  await page.keyboard.press('Control+k');
  await page.keyboard.type('go to assumptions');
  await page.keyboard.press('Enter');
  await tabTo(page, section(page, 'Assumptions').getByText('What the tests can draw on'));
  await page.keyboard.press('Enter');
  await tabTo(page, help);
  await page.keyboard.press('Enter');
  await page.getByText('All forcings together, year by year.').waitFor();
  await page.keyboard.press('Escape');
  await expect.poll(() => page.getByText('All forcings together, year by year.').isVisible()).toBe(false);
  await expectFocus(page, help);
}

const mostPresses = 150;

/** Goes on by Tab until a control has the focus; on the way the focus can be seen on every stop. */
async function tabTo(page: Page, control: Locator, key: 'Tab' | 'Shift+Tab' = 'Tab'): Promise<void> {
  await control.waitFor();
  for (let press = 0; press < mostPresses; press += 1) {
    await page.keyboard.press(key);
    await expectVisibleFocus(page);
    if (await control.evaluate((element) => element === document.activeElement)) return;
  }
  throw new Error(`${mostPresses} presses of ${key} did not reach ${String(control)}`);
}

async function expectFocus(page: Page, control: Locator): Promise<void> {
  await expect.poll(() => control.evaluate((element) => element === document.activeElement)).toBe(true);
  await expectVisibleFocus(page);
}

/** The focused element is in sight and outlined. Only the page as a whole may have the focus without a sign of it. */
async function expectVisibleFocus(page: Page): Promise<void> {
  const focus = await page.evaluate(() => {
    const element = document.activeElement;
    if (!element || element === document.body || element.tagName === 'MAIN') return null;
    const { outlineStyle, outlineWidth } = getComputedStyle(element);
    const { left, right, top, bottom } = element.getBoundingClientRect();
    return {
      what: element.outerHTML.slice(0, 120),
      isOutlined: outlineStyle !== 'none' && parseFloat(outlineWidth) >= 2,
      isInSight: right > 0 && bottom > 0 && left < innerWidth && top < innerHeight && right > left,
    };
  });
  expect(focus ?? { isOutlined: true, isInSight: true }, focus?.what).toMatchObject({
    isOutlined: true,
    isInSight: true,
  });
}
