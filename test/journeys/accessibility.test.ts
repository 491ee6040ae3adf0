import { AxeBuilder } from '@axe-core/playwright';
import type { Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import { freshFolder, openBrowserStage } from '../helpers/browser.ts';
import { footingCommand } from '../helpers/footing-command.ts';
import { chooseFiles, introduceReviewer } from './flows/steps.ts';

const places = [
  { name: 'sources', hash: '#/sources' },
  { name: 'series', hash: '#/series' },
  { name: 'one series', hash: '#/series/1' },
  { name: 'claims', hash: '#/claims' },
  { name: 'a new claim', hash: '#/claims/new' },
  { name: 'the sheet of a trend', hash: '#/claims/2' },
  { name: 'the published values', hash: '#/published/1' },
  { name: 'the trail', hash: '#/trail' },
  { name: 'an entry of the trail', hash: '#/trail/9' },
  { name: 'the report', hash: '#/report' },
];

const papers = [
  { paper: 'light', width: 1440, height: 900 },
  { paper: 'light', width: 1100, height: 700 },
  { paper: 'dark', width: 1440, height: 900 },
  { paper: 'dark', width: 1100, height: 700 },
] as const;

/**
 * Violations of every rule that axe knows, best practices included, as one line each. Of a table of data, rows after the
 * twelfth are like those before, and there can be a thousand.
 */
async function violations(page: Page, where: string, rulesLeftOut: string[] = []): Promise<string[]> {
  const { violations: found } = await new AxeBuilder({ page })
    .disableRules(rulesLeftOut)
    .exclude('tbody > tr:nth-child(n + 13)')
    .options({ resultTypes: ['violations'] })
    // In one go, not frame by frame: there are no frames.
    .setLegacyMode()
    .analyze();
  return found.flatMap(({ id, help, nodes }) =>
    nodes.map(({ html, failureSummary }) => `${where}: ${id}, ${help}: ${html.slice(0, 160)} ${failureSummary ?? ''}`),
  );
}

async function goTo(page: Page, hash: string): Promise<void> {
  await page.evaluate((to) => (location.hash = to), hash);
  await page.getByRole('main').getByRole('heading', { level: 1 }).first().waitFor();
  await expect.poll(() => page.getByText(/^(Reading|Putting it together)…$/).count()).toBe(0);
  await page.waitForFunction(() => document.fonts.status === 'loaded');
}

describe('Everybody can use it', () => {
  it.each(papers)('axe finds nothing on $paper paper at $width × $height', async ({ paper, width, height }) => {
    const { page } = await openBrowserStage({ width, height });
    await page.emulateMedia({ colorScheme: paper });
    // Colours do not depend on the width, and comparing them takes most of the time.
    const rulesLeftOut = width < 1440 ? ['color-contrast'] : [];
    const found: string[] = [];
    const look = async (where: string) => void found.push(...(await violations(page, where, rulesLeftOut)));
    await look('the very first start');
    await introduceReviewer(page, 'Ada Brandvold', 'reviewer');
    await page.getByText('No project in this folder yet.').waitFor();
    await look('the start');
    await page.getByRole('button', { name: 'Open the worked example' }).click();
    await page.getByRole('heading', { name: 'Claims', level: 1 }).waitFor();
    await expect(page.locator('html').getAttribute('data-theme')).resolves.toBe(paper);

    for (const { name, hash } of places) {
      await goTo(page, hash);
      await look(name);
    }

    await openEverything(page);
    await look('the sheet with everything opened');

    await page.keyboard.press('Control+k');
    await page.getByRole('dialog', { name: 'Commands' }).waitFor();
    await look('the commands');
    await page.keyboard.press('Escape');
    await page.getByRole('button', { name: /^Reviewer:/ }).click();
    await page.getByRole('dialog', { name: 'Who is reviewing' }).waitFor();
    await look('who is reviewing');
    await page.keyboard.press('Escape');

    await lookAtAnImport(page);
    await look('an import with bad rows');
    expect(found).toEqual([]);
  });

  it('axe finds nothing on a signed sheet and on an empty project', async () => {
    const folder = freshFolder('demo');
    expect(footingCommand(freshFolder('home'), 'demo', folder).exitStatus).toBe(0);
    const { page } = await openBrowserStage({ home: folder });
    await page.getByRole('button', { name: /Vessmark harbour/ }).click();
    await page.getByRole('heading', { name: 'Claims', level: 1 }).waitFor();
    await goTo(page, '#/claims/1');
    await page.getByText('The signature holds.').waitFor();
    const found = await violations(page, 'a signed sheet');

    await page.keyboard.press('Control+k');
    await page.keyboard.type('close the project');
    await page.keyboard.press('Enter');
    await page.getByLabel('Title').fill('Empty');
    await page.getByRole('button', { name: 'Create the project' }).click();
    for (const place of ['sources', 'series', 'series/9', 'series/import', 'claims', 'claims/9', 'trail', 'report']) {
      await page.evaluate((to) => (location.hash = to), `#/${place}`);
      await page.getByRole('main').getByRole('heading').first().waitFor();
      found.push(...(await violations(page, `nothing under ${place} yet`)));
    }
    expect(found).toEqual([]);
  });

  it('nothing is cut off at 900 × 600', async () => {
    const { page } = await openBrowserStage({ width: 900, height: 600 });
    await introduceReviewer(page, 'Ada Brandvold', 'reviewer');
    const tooWide = [...(await widerThanItsPlace(page, 'the start'))];
    await page.getByRole('button', { name: 'Open the worked example' }).click();
    await page.getByRole('heading', { name: 'Claims', level: 1 }).waitFor();
    for (const { name, hash } of places) {
      await goTo(page, hash);
      tooWide.push(...(await widerThanItsPlace(page, name)));
    }
    await openEverything(page);
    tooWide.push(...(await widerThanItsPlace(page, 'the sheet with everything opened')));
    await lookAtAnImport(page);
    tooWide.push(...(await widerThanItsPlace(page, 'an import')));
    expect(tooWide).toEqual([]);
  });
});

/** Every fold, every row of the ledger and every explanation of the sheet; not the table of the sweep, a thousand rows of one kind. */
async function openEverything(page: Page): Promise<void> {
  await goTo(page, '#/claims/1');
  await page.evaluate(() => {
    for (const fold of document.querySelectorAll<HTMLDetailsElement>('main details'))
      fold.open = !fold.closest('#section-robustness');
    for (const opener of document.querySelectorAll<HTMLElement>('main [aria-expanded="false"]')) opener.click();
  });
  await page.getByLabel('Your note on this mark').first().waitFor();
}

async function lookAtAnImport(page: Page): Promise<void> {
  await goTo(page, '#/series');
  const table = 'Year;Anomaly\n1961;0,1\n1962;0,2\n1963;about 0,1\n1964;0,2\n1965;0,3\n1966;0,1\n1967;0,2\n';
  await chooseFiles(page, page.getByRole('button', { name: 'Import files' }), [
    { name: 'harbour.csv', mimeType: 'text/csv', buffer: Buffer.from(table) },
  ]);
  await page.getByRole('heading', { name: '1 row that cannot be used' }).waitFor();
}

/** Where the page, or the part of it that scrolls, would have to be scrolled sideways. */
function widerThanItsPlace(page: Page, where: string): Promise<string[]> {
  return page.evaluate(
    (name) =>
      [document.documentElement, document.querySelector('main'), document.querySelector('nav')].flatMap((element) =>
        element && element.scrollWidth > element.clientWidth
          ? [`${name}: ${element.tagName} is ${element.scrollWidth} px wide in ${element.clientWidth} px`]
          : [],
      ),
    where,
  );
}
