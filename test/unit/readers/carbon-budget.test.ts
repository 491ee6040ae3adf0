import { beforeAll, describe, expect, it } from 'vitest';
import { carbonBudgetCsv } from './fixtures/layouts.ts';
import { offered, preview, previewFile, steps, valuesInFile, valuesOf } from './fixtures/preview.ts';
import { carbonBudgetSheets, workbook } from './fixtures/workbook.ts';

describe('carbonBudget', () => {
  let bytes: Uint8Array;
  beforeAll(async () => {
    bytes = await workbook(carbonBudgetSheets);
  });

  it('takes the historical table of the workbook, from 1750 on, under its rows of text', async () => {
    const found = await previewFile(bytes, 'Global_Carbon_Budget.xlsx');
    expect(found).toMatchObject({ reader: { id: 'carbon-budget' }, sheet: 'Historical Budget', nRows: 3, badRows: [] });
    expect(found.sheets).toEqual(['Summary', 'Global Carbon Budget', 'Historical Budget', 'Ocean Sink']);
    expect(found.series.map(({ key, unit, unitFrom, isMain }) => [key, unit, unitFrom, isMain])).toEqual([
      ['fossil-emissions', 'GtC/yr', 'file', true],
      ['land-use-emissions', 'GtC/yr', 'file', true],
      ['atmospheric-growth', 'GtC/yr', 'file', true],
      ['ocean-sink', 'GtC/yr', 'file', true],
      ['land-sink', 'GtC/yr', 'file', true],
      ['cement-carbonation-sink', 'GtC/yr', 'file', true],
      ['budget-imbalance', 'GtC/yr', 'file', false],
    ]);
    const landUse = await valuesInFile(bytes, 'land-use-emissions');
    expect(steps(landUse)).toEqual(['1850: 0.5', '1851: null', '1959: 2']);
    expect(offered(found, 'land-use-emissions')).toMatchObject({ nMissing: 1, nAbsent: 107 });
  });

  it('takes the table from 1959 on when that sheet is chosen', async () => {
    const found = await previewFile(bytes, 'budget.xlsx', { sheet: 'Global Carbon Budget' });
    expect(found).toMatchObject({ reader: { id: 'carbon-budget' }, sheet: 'Global Carbon Budget', nRows: 2 });
    expect((await valuesInFile(bytes, 'land-sink', { sheet: 'Global Carbon Budget' })).values).toEqual([0.5, 1.25]);
  });

  it('states the sign of the cement sink, and that the terms add up', async () => {
    const notes = (await previewFile(bytes, 'budget.xlsx')).notes.join('\n');
    expect(notes).toContain('positive as a sink: subtract it once');
    expect(notes).toContain('give the stated imbalance in all 2 years');
    expect(notes).toContain('Before 1959');
    expect(notes).toContain('3.664');
  });

  it('says when the terms do not add up, as with exchanged signs', () => {
    const wrong = carbonBudgetCsv.replace('0.25,1\n', '-0.25,1\n');
    expect(preview(wrong).notes.join('\n')).toContain(
      'do not add up to the stated imbalance in 1 of 2 years, first in 1959',
    );
  });

  it('reads the same table saved as text', () => {
    const found = preview(carbonBudgetCsv);
    expect(found.reader.id).toBe('carbon-budget');
    expect(found.sheet).toBeNull();
    expect(valuesOf(carbonBudgetCsv, 'fossil-emissions').values).toEqual([2.5, 2.75]);
    expect(valuesOf(carbonBudgetCsv.replaceAll(',', ';'), 'ocean-sink').values).toEqual([0.75, 1]);
  });
});
