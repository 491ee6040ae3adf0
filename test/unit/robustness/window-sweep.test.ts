import { describe, expect, it } from 'vitest';
import type { WindowSweepRequest } from '../../../src-main/contract/compute.ts';
import { windowSweep } from '../../../src-main/robustness/window-sweep.ts';
import { quantile } from '../../../src-main/statistics/quantile.ts';
import { randomStream } from '../../../src-main/statistics/random-stream.ts';
import { regression } from '../../../src-main/statistics/regression.ts';

const closedForm = { rel: 1e-12, why: 'a handful of exact operations' };
const sameFit = { rel: 1e-10, why: 'closed form against a pivoted QR with refinement on the same rows' };

/** Invented: concentrations that rise faster and faster, temperatures that follow with noise. */
function inventedRecord(nYears: number) {
  const { normal } = randomStream(20_261, 0);
  const years = Array.from({ length: nYears }, (_, row) => 1950 + row);
  const co2Ppm = years.map((_, row) => 310 * Math.exp(0.002 * row + 0.00003 * row * row));
  const y = co2Ppm.map((ppm) => 13.8 + 2.6 * Math.log(ppm / 310) + 0.1 * normal());
  return { years, co2Ppm, y };
}

const mean = (values: readonly number[]) => values.reduce((total, value) => total + value, 0) / values.length;

function expectClose(received: number, expected: number, { rel, why }: { rel: number; why: string }) {
  expect(Math.abs(received - expected), `${received} against ${expected} (${why})`).toBeLessThanOrEqual(
    rel * Math.abs(expected),
  );
}

describe('windowSweep', () => {
  const record = inventedRecord(34);

  it.each<Pick<WindowSweepRequest, 'intercept' | 'anchor' | 'covariance'>>([
    { intercept: false, anchor: { kind: 'first-year' } },
    { intercept: false, anchor: { kind: 'mean-of-first', years: 5 }, covariance: { kind: 'classical' } },
    {
      intercept: false,
      anchor: { kind: 'mean-of-first', years: 10 },
      covariance: { kind: 'newey-west', lag: 3, smallSample: true },
    },
    { intercept: true, anchor: { kind: 'first-year' }, covariance: { kind: 'newey-west', lag: 2, smallSample: false } },
    { intercept: true, anchor: { kind: 'mean-of-first', years: 3 }, covariance: { kind: 'classical' } },
  ])('fits every window like a regression on its rows: %j', (choice) => {
    const minYears = 12;
    const { windows, quantiles, caveats } = windowSweep({ ...record, minYears, ...choice });
    expect(windows).toHaveLength((23 * 24) / 2);
    expect(caveats).toEqual([]);
    const nAnchor = choice.anchor.kind === 'first-year' ? 1 : choice.anchor.years;
    for (const { start, end, n, slope, standardError } of windows) {
      const rows = [start - 1950, end - 1950 + 1] as const;
      expect(n).toBe(end - start + 1);
      const co2Ppm = record.co2Ppm.slice(...rows);
      const temperature = record.y.slice(...rows);
      const co2ReferencePpm = mean(co2Ppm.slice(0, nAnchor));
      const temperatureReference = mean(temperature.slice(0, nAnchor));
      const fit = regression({
        x: co2Ppm.map((ppm) => Math.log(ppm / co2ReferencePpm)),
        y: temperature.map((value) => value - temperatureReference),
        intercept: choice.intercept,
        covariance: choice.covariance ?? { kind: 'classical' },
      });
      expectClose(slope, fit.coefficients.at(-1) ?? NaN, sameFit);
      expectClose(standardError, fit.standardErrors.at(-1) ?? NaN, sameFit);
    }
    const slopes = windows.map(({ slope }) => slope);
    expect(quantiles).toEqual({
      min: Math.min(...slopes),
      q05: quantile(slopes, 0.05),
      q50: quantile(slopes, 0.5),
      q95: quantile(slopes, 0.95),
      max: Math.max(...slopes),
    });
  });

  it('gives the slope of an exact line in every window, from every anchor', () => {
    const years = [2000, 2001, 2002, 2003, 2004, 2005];
    const x = [1, 2, 4, 7, 11, 16];
    const y = x.map((value) => 70 + 3 * value);
    for (const intercept of [true, false]) {
      const { windows } = windowSweep({
        years,
        x,
        y,
        minYears: 4,
        intercept,
        anchor: { kind: 'mean-of-first', years: 2 },
      });
      expect(windows.map(({ start, end }) => [start, end])).toEqual([
        [2000, 2003],
        [2000, 2004],
        [2000, 2005],
        [2001, 2004],
        [2001, 2005],
        [2002, 2005],
      ]);
      for (const { slope, standardError } of windows) {
        expectClose(slope, 3, closedForm);
        expect(standardError).toBeLessThan(1e-13);
      }
    }
  });

  it('counts a given predictor from its own anchor', () => {
    const { years, co2Ppm, y } = record;
    const anchor = { kind: 'first-year' } as const;
    const fromPpm = windowSweep({ years, co2Ppm, y, minYears: 20, intercept: false, anchor });
    const logarithm = co2Ppm.map((ppm) => Math.log(ppm / 278));
    const fromX = windowSweep({ years, x: logarithm, y, minYears: 20, intercept: false, anchor });
    fromX.windows.forEach(({ slope }, row) => expectClose(slope, fromPpm.windows[row]?.slope ?? NaN, sameFit));
  });

  it('counts years with data, not calendar years', () => {
    const years = [1990, 1991, 1995, 1996, 1997];
    const { windows } = windowSweep({
      years,
      x: [0, 1, 5, 6, 7],
      y: [0, 2, 10, 12, 14],
      minYears: 4,
      intercept: true,
      anchor: { kind: 'first-year' },
    });
    expect(windows.map(({ start, end, n }) => [start, end, n])).toEqual([
      [1990, 1996, 4],
      [1990, 1997, 5],
      [1991, 1997, 4],
    ]);
  });

  it('leaves out windows in which the predictor does not vary, and says how many', () => {
    const request: WindowSweepRequest = {
      years: [1, 2, 3, 4, 5],
      x: [7, 7, 7, 7, 9],
      y: [0, 1, 0, 1, 3],
      minYears: 3,
      intercept: true,
      anchor: { kind: 'first-year' },
    };
    const { windows, caveats } = windowSweep(request);
    expect(windows).toHaveLength(3);
    expect(caveats).toEqual([
      { code: 'windows-without-spread', detail: '3 of 6 windows are left out: the predictor does not vary in them.' },
    ]);
    expect(() => windowSweep({ ...request, x: [7, 7, 7, 7, 7] })).toThrow(/a predictor that varies/);
  });

  it('says of Newey–West errors that they close gaps up', () => {
    const years = record.years.map((year) => (year < 1960 ? year : year + 2));
    const codes = (change: Partial<WindowSweepRequest>) =>
      windowSweep({ ...record, minYears: 20, intercept: true, anchor: { kind: 'first-year' }, ...change }).caveats.map(
        ({ code }) => code,
      );
    const neweyWest = { kind: 'newey-west', lag: 2, smallSample: false } as const;
    expect(codes({ years, covariance: neweyWest })).toEqual(['gaps-closed-up']);
    expect(codes({ years })).toEqual([]);
    expect(codes({ covariance: neweyWest })).toEqual([]);
  });

  it('reports the share of windows done, up to all of them', () => {
    const shares: number[] = [];
    windowSweep({ ...record, minYears: 30, intercept: true, anchor: { kind: 'first-year' } }, (share) =>
      shares.push(share),
    );
    expect(shares).toEqual([5 / 15, 9 / 15, 12 / 15, 14 / 15, 1]);
  });

  it.each([
    ['years out of order', { years: [3, 2, 4, 5] }, /years\[1\]: expected a year after 3/],
    ['too short a record', { minYears: 5 }, /expected at most the 4 years that have data, but found 5/],
    ['an anchor longer than a window', { anchor: { kind: 'mean-of-first', years: 4 } }, /anchor.years/],
    ['a lag as long as a window', { covariance: { kind: 'newey-west', lag: 3, smallSample: false } }, /covariance.lag/],
    ['a missing temperature', { y: [0, NaN, 1, 2] }, /y\[1\]: expected a finite number/],
    ['a column that is too short', { y: [0, 1, 2] }, /expected 4 values/],
    ['a concentration of zero', { co2Ppm: [300, 0, 310, 320] }, /co2Ppm\[1\]: expected a number above 0/],
  ] as [string, Partial<WindowSweepRequest>, RegExp][])('refuses %s', (_, wrong, message) => {
    const request: WindowSweepRequest = {
      years: [2, 3, 4, 5],
      co2Ppm: [300, 305, 310, 320],
      y: [0, 1, 2, 3],
      minYears: 3,
      intercept: false,
      anchor: { kind: 'first-year' },
      ...wrong,
    };
    expect(() => windowSweep(request)).toThrow(message);
  });
});
