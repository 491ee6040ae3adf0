import { describe, expect, it } from 'vitest';
import { openBrowserStage } from '../helpers/browser.ts';
import { footingCommand } from '../helpers/footing-command.ts';
import { monthlyFile } from '../unit/readers/fixtures/net-cdf.ts';
import { netCdf4 } from '../unit/readers/fixtures/net-cdf-4.ts';
import { carbonBudgetSheets, workbook } from '../unit/readers/fixtures/workbook.ts';
import { chooseFiles, createProject, goTo, introduceReviewer, stored } from './flows/steps.ts';

describe('Files that are no text', () => {
  it('are imported from the sheet and the variable that the reviewer takes', async () => {
    const { page, home } = await openBrowserStage();
    await introduceReviewer(page, 'Ada Brandvold', 'reviewer');
    await createProject(page, 'Lantern Point talk');
    await goTo(page, 'Series');
    const mimeType = 'application/octet-stream';
    await chooseFiles(page, page.getByRole('button', { name: 'Import files' }), [
      { name: 'budget.xlsx', mimeType, buffer: Buffer.from(await workbook(carbonBudgetSheets)) },
      { name: 'tas_Invented.nc', mimeType, buffer: Buffer.from(await netCdf4(monthlyFile())) },
    ]);

    await page.getByRole('heading', { name: 'Recognised as Global Carbon Budget' }).waitFor();
    expect(await page.getByLabel('Sheet').inputValue()).toBe('Historical Budget');
    await page.getByLabel('Sheet').selectOption('Ocean Sink');
    await page.getByRole('heading', { name: 'Recognised as Table in a sheet' }).waitFor();
    await stored(page, () => page.getByRole('button', { name: /^Import this series/ }).click());

    await page.getByRole('heading', { name: 'Recognised as NetCDF time series' }).waitFor();
    await page.getByText('absolute temperatures, not anomalies').waitFor();
    await stored(page, () => page.getByRole('button', { name: /^Import this series/ }).click());

    await page.getByRole('link', { name: 'tas-invented-tas' }).waitFor();
    const { json } = footingCommand(home, 'series', `${home}/lantern-point-talk.footing`);
    expect(json).toMatchObject([
      { quantity: 'other', unit: 'GtC/yr', startYear: 1959, endYear: 1961 },
      { name: 'tas-invented-tas', quantity: 'temperature', unit: 'K', nMissing: 1 },
    ]);
  });
});
