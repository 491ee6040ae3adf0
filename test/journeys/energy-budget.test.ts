import { describe, expect, it } from 'vitest';
import { createProject, goTo, introduceReviewer, section, stored } from './flows/steps.ts';
import { freshFolder, openBrowserStage } from '../helpers/browser.ts';

describe('A sensitivity from an energy budget', () => {
  it('is recomputed from figures, which follow an undo and outlast a note', async () => {
    const { page } = await openBrowserStage({ home: freshFolder('home') });
    await introduceReviewer(page, 'Ada Brandvold', 'reviewer');
    await createProject(page, 'A budget');
    await goTo(page, 'Claims');
    await page.getByRole('link', { name: 'New claim' }).first().click();
    await page.getByLabel('The words of the source').fill('The budget gives two and a half degrees.');
    await page.getByRole('radio', { name: /^effective climate sensitivity/ }).check();
    await page.getByLabel('Value, as printed').fill('2.5');
    await page.getByLabel('Short title').fill('2.5 K by energy budget');
    await page.getByRole('button', { name: 'Take it up' }).click();

    const data = section(page, 'Data');
    const keep = data.getByRole('button', { name: 'Keep these figures' });
    const forcing = data.getByLabel('Forcing change, ΔF, best value');
    await data
      .getByLabel('How the source gets the number')
      .selectOption({ label: 'energy budget between two periods' });
    await forcing.fill('1.11');
    await page.getByLabel('Write a note').fill('Ask for the periods.');
    await stored(page, () => page.getByRole('button', { name: 'Add note' }).click());
    await expect(forcing.inputValue()).resolves.toBe('1.11');

    await data.getByRole('button', { name: 'Fill in the values of AR6 §7.5.2.1' }).click();
    await keep.focus();
    await stored(page, () => page.keyboard.press('Enter'));
    await expect.poll(() => keep.evaluate((button) => button === document.activeElement)).toBe(true);
    await forcing.fill('2.5');
    await stored(page, () => keep.click());
    const undo = page.getByRole('navigation', { name: 'Project' }).getByRole('button', { name: 'Undo' });
    await stored(page, () => undo.click());
    await expect.poll(() => forcing.inputValue()).toBe('2.2');

    const recomputation = section(page, 'Recomputation');
    await stored(page, () => recomputation.getByRole('button', { name: 'Recompute', exact: true }).click());
    await recomputation.getByText(/Reproduced within rounding: 2\.51/).waitFor();
    await recomputation.getByText('effective climate sensitivity, Fieller’s 90 % set').waitFor();
  });
});
