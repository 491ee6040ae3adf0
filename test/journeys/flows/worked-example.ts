import { readFileSync } from 'node:fs';
import type { Locator, Page } from 'playwright-core';
import { expect } from 'vitest';
import { browser } from '../../helpers/browser.ts';
import { watchPage, type OpenStage } from '../../helpers/stage.ts';
import { introduceReviewer, openClaim, section } from './steps.ts';

/** From an empty start to the worked example, read down its stem, and its figures kept as files. */
export async function workedExample(open: OpenStage): Promise<void> {
  const { page } = await open();
  await introduceReviewer(page, 'Ada Brandvold', 'reviewer');
  await page.getByText('No project in this folder yet.').waitFor();
  await page.getByRole('button', { name: 'Open the worked example' }).click();
  await page.getByRole('heading', { name: 'Claims', level: 1 }).waitFor();
  await page.getByText('Invented data', { exact: true }).waitFor();
  await openClaim(page, 'At most 1.9 °C per doubling');
  await page.getByText('Invented data: a worked example, no real record.').waitFor();

  const figures = page.getByRole('figure');
  await expect.poll(() => figures.count()).toBe(4);
  await readStem(figures.first());
  const elsewhere = await (await browser()).newPage();
  const problems = watchPage(elsewhere, (url) => url.startsWith('data:'));
  for (const figure of await figures.all()) await keepFigure(page, figure, elsewhere);
  expect(problems).toEqual([]);
  await elsewhere.close();
  await section(page, 'Finding').getByLabel('The finding as it will be read').waitFor();
}

async function readStem(stem: Locator): Promise<void> {
  const labels = [
    'Stated, at most 1.9',
    'Recomputed as stated',
    'Line with a free intercept',
    'Heat still going into the oceans',
  ];
  const drawn = stem.getByRole('img');
  const text = await drawn.textContent();
  for (const label of labels) expect(text).toContain(label);
  for (const band of ['TCR, likely (AR6)', 'ECS, likely (AR6)']) expect(text).toContain(band);
  expect(text).toContain('K per doubling');

  await stem.getByText('Show as table').click();
  const rows = stem.getByRole('row');
  const first = await rows.nth(1).getByRole('cell').allInnerTexts();
  expect(first).toContain('1.9');
  await expect(stem.getByRole('rowheader').allInnerTexts()).resolves.toEqual(
    expect.arrayContaining(['recomputed as stated', 'Line with a free intercept', 'Heat still going into the oceans']),
  );
}

/** The three files of a figure hold what the screen shows, and open elsewhere. */
async function keepFigure(page: Page, figure: Locator, elsewhere: Page): Promise<void> {
  const table = figure.getByRole('table');
  if (!(await table.isVisible())) await figure.getByText('Show as table').click();
  await table.waitFor();
  const nRows = await table.getByRole('row').count();
  const columns = await table.getByRole('columnheader').allInnerTexts();
  const csv = (await download(page, figure, 'CSV')).toString('utf8');
  expect(csv.trim().split('\n')).toHaveLength(nRows);
  for (const column of columns) expect(csv.split('\n')[0]).toContain(column);

  const svg = await download(page, figure, 'SVG');
  await elsewhere.goto(`data:image/svg+xml;base64,${svg.toString('base64')}`);
  await expect(elsewhere.evaluate(() => document.documentElement.tagName)).resolves.toBe('svg');
  const texts = await elsewhere.locator('text').allTextContents();
  expect(texts.length, 'texts of the drawing').toBeGreaterThan(5);
  expect(texts.join(' '), 'digests of the data').toMatch(/[0-9a-f]{4}/);
  expect(svg.toString('utf8').replaceAll('http://www.w3.org/', '')).not.toMatch(/https?:|<script|href=/i);

  const png = await download(page, figure, 'PNG');
  expect(png.subarray(0, 8).toString('latin1')).toBe('\x89PNG\r\n\x1a\n');
  await elsewhere.goto('about:blank');
  const picture = await paintedShare(elsewhere, png);
  expect(picture.width).toBeGreaterThan(1000);
  expect(picture.share, 'share of the picture that is not paper').toBeGreaterThan(0.005);
}

async function download(page: Page, figure: Locator, format: 'SVG' | 'PNG' | 'CSV'): Promise<Buffer> {
  const begun = page.waitForEvent('download');
  await figure.getByRole('button', { name: new RegExp(`as ${format}$`) }).click();
  const file = await begun;
  expect(file.suggestedFilename()).toMatch(new RegExp(`^[a-z0-9-]+\\.${format.toLowerCase()}$`));
  return readFileSync(await file.path());
}

/** How much of a picture differs from its first pixel. */
function paintedShare(page: Page, png: Buffer): Promise<{ width: number; share: number }> {
  return page.evaluate(
    async (source) => {
      const image = new Image();
      image.src = source;
      await image.decode();
      const canvas = document.createElement('canvas');
      canvas.width = image.width;
      canvas.height = image.height;
      const context = canvas.getContext('2d')!;
      context.drawImage(image, 0, 0);
      const { data } = context.getImageData(0, 0, image.width, image.height);
      const pixels = new Uint32Array(data.buffer);
      const nPainted = pixels.reduce((count, pixel) => count + Number(pixel !== pixels[0]), 0);
      return { width: image.width, share: nPainted / pixels.length };
    },
    `data:image/png;base64,${png.toString('base64')}`,
  );
}
