import type { FileChooser, Locator, Page } from 'playwright-core';
import { expect } from 'vitest';

/** What a reviewer does on any screen, as the screen names it. */

export async function introduceReviewer(page: Page, name: string, role: string): Promise<void> {
  await page.getByLabel('Your name').fill(name);
  await page.getByLabel('Your role in this review').fill(role);
  await page.getByRole('button', { name: 'Begin', exact: true }).click();
}

export async function createProject(page: Page, title: string): Promise<void> {
  await page.getByLabel('Title').fill(title);
  await page.getByRole('button', { name: 'Create the project' }).click();
  await page.getByRole('heading', { name: 'Claims', level: 1 }).waitFor();
}

/** Follows a link of the index at the left. */
export async function goTo(page: Page, shelf: 'Sources' | 'Series' | 'Claims' | 'Trail' | 'Report'): Promise<void> {
  await page.getByRole('navigation', { name: 'Project' }).getByRole('link', { name: shelf }).click();
  await page.getByRole('heading', { name: shelf, level: 1 }).or(page.locator('.page')).first().waitFor();
}

/** Opens the sheet of a claim, and waits until that sheet has taken the place of any other. */
export async function openClaim(page: Page, title: string): Promise<void> {
  const link = page.getByRole('link', { name: title }).first();
  const claimId = /#\/claims\/(\d+)/.exec((await link.getAttribute('href')) ?? '')?.[1];
  await link.click();
  await page.getByText(`Claim ${claimId} ·`).waitFor();
}

/** Paths, or content made here, given to the file chooser that a button opens. */
export async function chooseFiles(
  page: Page,
  button: Locator,
  files: Parameters<FileChooser['setFiles']>[0],
): Promise<void> {
  const chooser = page.waitForEvent('filechooser');
  await button.click();
  await (await chooser).setFiles(files);
}

/** One section of a claim's sheet. */
export function section(page: Page, name: string): Locator {
  return page.getByRole('region', { name: new RegExp(`^${name}`) });
}

/** Waits until the number of trail entries in the index has grown: what was done is stored. */
export async function stored(page: Page, act: () => Promise<unknown>): Promise<void> {
  const entries = page.getByRole('navigation', { name: 'Project' }).getByRole('link', { name: /^Trail/ });
  const before = await entries.textContent();
  await act();
  await expect.poll(() => entries.textContent()).not.toBe(before);
}
