import { readFileSync } from 'node:fs';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { expectClose } from '../../helpers/close.ts';
import { startR, type RSession } from '../../helpers/r-session.ts';
import { testCore, type TestCore } from '../../helpers/test-core.ts';

/**
 * Level B: real records through the whole application, from the bytes of the files to the recomputed number, against R
 * doing the same from the same bytes. Nothing of this project is used on R's side.
 */
const tolerance = { rel: 1e-10, abs: 0, why: 'the same formulas in double precision, another order of sums' };
const file = (name: string) => new URL(`../../../node_modules/vega-datasets/data/${name}`, import.meta.url);

describe('Mauna Loa CO2 and global temperature, file to number', () => {
  let r: RSession;
  let test: TestCore;

  beforeAll(async () => {
    r = await startR(new URL('real-record.R', import.meta.url));
    test = await testCore();
    await test.ask('project.create', { title: 'Real record' });
    for (const fileName of ['co2-concentration.csv', 'global-temp.csv']) {
      const bytes = readFileSync(file(fileName)).toString('base64');
      const preview = await test.ask('data.preview', { fileName, bytes, options: {} });
      const choices = preview.series.filter(({ isMain }) => isMain).map(({ key }) => ({ key }));
      await test.ask('data.import', { fileName, bytes, options: {}, choices, leaveOutBadRows: false });
    }
  });
  afterAll(async () => {
    r.close();
    await test.end();
  });

  const cases = [
    { first: 1959, last: 2016, lag: 3, intercept: false },
    { first: 1965, last: 2010, lag: 5, intercept: true },
  ];
  it.each(cases)(
    'agrees with R: $first–$last, lag $lag, intercept $intercept',
    async ({ first, last, lag, intercept }) => {
      const { series } = await test.ask('project.view', {});
      const { claim } = await test.ask('claim.create', {
        title: `${first}–${last}`,
        statement: { words: 'for the test', quantity: 'apparent-sensitivity', value: '1.9', unit: 'K per doubling' },
        procedure: {
          kind: 'log-regression',
          temperatureSeriesId: series.find(({ quantity }) => quantity === 'temperature-anomaly')?.id ?? 0,
          co2SeriesId: series.find(({ quantity }) => quantity === 'co2')?.id ?? 0,
          window: { start: first, end: last },
          intercept,
          covariance: { kind: 'newey-west', lag, smallSample: false },
        },
      });
      const { recomputation } = await test.ask('claim.recompute', { claimId: claim.id });
      const fit = recomputation?.answer.fit;
      const slopeErrors = (name: RegExp) => fit?.slopes.find(({ convention }) => name.test(convention))?.standardError;

      const expected = await r.numbers('path_in_r(co2_csv, temperature_csv, first, last, lag, intercept)', {
        co2_csv: readFileSync(file('co2-concentration.csv'), 'utf8'),
        temperature_csv: readFileSync(file('global-temp.csv'), 'utf8'),
        first,
        last,
        lag,
        intercept,
      });
      expect(fit?.years).toEqual(expected['years']);
      expectClose(
        {
          value: [recomputation?.answer.value],
          classical: [slopeErrors(/^classical/i)],
          hac: [slopeErrors(/^Newey/)],
          centred: [fit?.diagnostics.rSquaredCentred],
          uncentred: [fit?.diagnostics.rSquaredUncentred],
          dw: [fit?.diagnostics.durbinWatson],
        },
        Object.fromEntries(Object.entries(expected).filter(([name]) => name !== 'years')),
        tolerance,
      );
    },
  );

  it('has a result that can be computed again to the last digit', async () => {
    const report = await test.ask('project.recheck', {});
    expect(report.nResults).toBeGreaterThan(0);
    expect(report.isIdentical).toBe(true);
  });
});
