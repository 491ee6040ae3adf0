import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { testCore, type TestCore } from '../helpers/test-core.ts';

const base64 = (text: string) => Buffer.from(text, 'utf8').toString('base64');
/** Invented. One row cannot be read, one year stands twice with different values. */
const untidy = 'year,temp\n1990,0.10\n1991,abc\n1992,0.30\n1992,0.35\n1993,0.20\n1994,0.25\n';

describe('importing a file', () => {
  let test: TestCore;
  beforeEach(async () => {
    test = await testCore();
    await test.ask('project.create', { title: 'Import' });
  });
  afterEach(() => test.end());

  const input = (leaveOutBadRows: boolean) => ({
    fileName: 'untidy.csv',
    bytes: base64(untidy),
    options: {},
    choices: [{ key: 'temp', unit: 'K' }],
    leaveOutBadRows,
  });

  it('lists rows that cannot be used by line, with the reason', async () => {
    const preview = await test.ask('data.preview', { fileName: 'untidy.csv', bytes: base64(untidy), options: {} });
    expect(preview.badRows.map(({ line }) => line)).toEqual([3, 5]);
    for (const { reason } of preview.badRows) expect(reason.length).toBeGreaterThan(10);
  });

  it('imports nothing until the reviewer has decided about them', async () => {
    const before = await test.ask('project.view', {});
    const refused = await test.core.handle('data.import', input(false));
    expect(refused).toMatchObject({ ok: false, error: { code: 'bad-rows', where: 'untidy.csv' } });
    expect((await test.ask('project.view', {})).head).toEqual(before.head);
  });

  it('records what was left out with the dataset', async () => {
    const { project } = await test.ask('data.import', input(true));
    expect(project.datasets[0]?.leftOut.map(({ line }) => line)).toEqual([3, 5]);
    expect(project.series[0]).toMatchObject({ startYear: 1990, endYear: 1994 });
  });

  it('keeps two imports of one file apart by name, and says that the bytes are known', async () => {
    await test.ask('data.import', input(true));
    const again = await test.ask('data.preview', { fileName: 'untidy.csv', bytes: base64(untidy), options: {} });
    expect(again.alreadyImportedAs).toBe(1);
    const { project } = await test.ask('data.import', input(true));
    expect(new Set(project.series.map(({ name }) => name)).size).toBe(2);
  });

  it('is taken back and done again, the trail keeping both', async () => {
    await test.ask('data.import', input(true));
    const undone = await test.ask('trail.undo', {});
    expect(undone.series).toEqual([]);
    const redone = await test.ask('trail.redo', {});
    expect(redone.series).toHaveLength(1);
    const { lines } = await test.ask('trail.list', { limit: 10 });
    expect(lines.map(({ action }) => action)).toEqual(['redo', 'undo', 'import dataset', 'create project']);
    expect(await test.ask('project.verify', {})).toMatchObject({ isSound: true });
  });

  it('does not remove a dataset that a claim stands on', async () => {
    const { seriesIds } = await test.ask('data.import', input(true));
    await test.ask('claim.create', {
      title: 'Trend',
      statement: { words: 'invented', quantity: 'trend', value: '0.2', unit: 'K per decade' },
      procedure: { kind: 'trend', seriesId: seriesIds[0] ?? 0 },
    });
    const refused = await test.core.handle('dataset.remove', { datasetId: 1 });
    expect(refused).toMatchObject({ ok: false, error: { code: 'series-in-use' } });
  });
});

describe('re-basing a series', () => {
  it('adds a further series that averages to zero over the period, and leaves the first as it is', async () => {
    const test = await testCore();
    await test.ask('project.create', { title: 'Re-base' });
    const table = ['year,temp', '1990,0.1', '1991,0.3', '1992,', '1993,0.8', '1994,0.4'].join('\n');
    const { seriesIds } = await test.ask('data.import', {
      fileName: 'short.csv',
      bytes: base64(table),
      options: {},
      choices: [{ key: 'temp', name: 'short', unit: 'K' }],
      leaveOutBadRows: true,
    });
    const before = await test.ask('series.get', { seriesId: seriesIds[0] ?? 0 });
    const rebased = await test.ask('series.rebase', {
      seriesId: seriesIds[0] ?? 0,
      baseline: { start: 1993, end: 1994 },
      minMonths: 12,
    });
    expect(rebased.offset).toBeCloseTo(0.6, 15);
    const after = await test.ask('series.get', { seriesId: rebased.seriesId });
    expect(after.series).toMatchObject({ name: 'short-vs-1993-1994', baseline: { start: 1993, end: 1994 } });
    expect(after.values.values.map((value) => value && Number(value.toFixed(12)))).toEqual([
      -0.5,
      -0.3,
      null,
      0.2,
      -0.2,
    ]);
    expect((await test.ask('series.get', { seriesId: seriesIds[0] ?? 0 })).series).toEqual(before.series);

    const refused = await test.core.handle('series.rebase', {
      seriesId: seriesIds[0],
      baseline: { start: 1991, end: 1993 },
      minMonths: 12,
    });
    expect(refused).toMatchObject({ ok: false, error: { code: 'baseline-not-covered' } });
    expect(refused.ok ? '' : refused.error.received).toContain('1992');
    await test.end();
  });
});
