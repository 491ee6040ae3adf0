import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import {
  effectiveSampleSize,
  effectiveSampleSizeNychka2000,
  effectiveSampleSizeOfMean,
  effectiveSampleSizeToLag,
} from '../../../src-main/statistics/effective-sample-size.ts';
import { effectiveSampleSizes } from '../../../src-main/statistics/effective-sample-sizes.ts';
import { expectClose } from '../../helpers/close.ts';
import { startR, type RSession } from '../../helpers/r-session.ts';
import { co2AndTemperature } from '../../helpers/real-series.ts';

let r: RSession;
beforeAll(async () => {
  r = await startR();
});
afterAll(() => r.close());

const near = { rel: 1e-11, abs: 0, why: 'two double-precision programs on sums of a hundred terms' };
const byHand = { rel: 1e-14, abs: 0, why: 'a few operations' };

describe('effectiveSampleSize: n (1 − r)/(1 + r)', () => {
  it('level B: LakeHuron about its trend, 98 years worth 13.3', async () => {
    const { r: lagOne = [] } = await r.numbers(
      'list(r = acf(residuals(lm(LakeHuron ~ time(LakeHuron))), lag.max = 1, plot = FALSE)$acf[2])',
    );
    expectClose(effectiveSampleSize(98, lagOne[0]!), 13.3, { rel: 0, abs: 0.05, why: 'as printed' });
  });

  it('level C: above n for alternating errors', () => {
    expectClose(effectiveSampleSize(50, -0.25), (50 * 1.25) / 0.75, byHand);
    expect(effectiveSampleSize(50, 0)).toBe(50);
  });
});

describe('effectiveSampleSizeOfMean', () => {
  it('level B: n² over the sum of the correlation matrix in R', async () => {
    for (const [n, rho] of [
      [2, 0.5],
      [30, 0.9],
      [98, 0.76],
      [98, -0.4],
    ] as const) {
      const { size = [] } = await r.numbers('list(size = n^2 / sum(toeplitz(rho^(0:(n - 1)))))', { n, rho });
      expectClose(effectiveSampleSizeOfMean(n, rho), size[0], near);
    }
  });

  it('level C: three values with r = 1/2 by hand; nears n (1 − r)/(1 + r); never below 1 for positive r', () => {
    // 3/(1 + 2 (2/3 · 1/2 + 1/3 · 1/4)) = 3/(11/6)
    expectClose(effectiveSampleSizeOfMean(3, 0.5), 18 / 11, byHand);
    const far = { rel: 1e-4, abs: 0, why: 'the difference falls as 1/n' };
    expectClose(effectiveSampleSizeOfMean(100_000, 0.5), effectiveSampleSize(100_000, 0.5), far);
    expect(effectiveSampleSizeOfMean(10, 0.99)).toBeGreaterThan(1);
    expect(effectiveSampleSize(10, 0.99)).toBeLessThan(1);
    expect(effectiveSampleSizeOfMean(1, 0.7)).toBe(1);
  });
});

describe('effectiveSampleSizeToLag and effectiveSampleSizes', () => {
  it('level B: R’s acf and n² over the sum of its banded matrix, on LakeHuron and the real temperatures', async () => {
    const lake = await r.numbers('list(y = residuals(lm(LakeHuron ~ time(LakeHuron))))');
    const { years, temperatureK } = co2AndTemperature();
    const record = await r.numbers('list(y = residuals(lm(y ~ x)))', { x: years, y: temperatureK });
    for (const values of [lake['y']!, record['y']!]) {
      for (const lags of [1, 2, 7]) {
        const { r: found = [], size = [] } = await r.numbers(
          `n <- length(y)
           r <- acf(y, lag.max = lags, plot = FALSE)$acf[, 1, 1]
           list(r = r[-1], size = n^2 / sum(toeplitz(c(r, rep(0, n - lags - 1)))))`,
          { y: values, lags },
        );
        expectClose(effectiveSampleSizeToLag(values.length, found), size[0], near);
        const all = effectiveSampleSizes({ values, lags });
        expectClose(all.bayleyHammersley1946, size[0], near);
        expectClose(all.lag1, found[0], near);
        expectClose(all.santer2000, effectiveSampleSize(values.length, found[0]!), near);
        expectClose(all.ar1Mean, effectiveSampleSizeOfMean(values.length, found[0]!), near);
        expectClose(all.nychka2000, effectiveSampleSizeNychka2000(values.length, found[0]!), near);
        expect(all.caveats).toEqual([]);
      }
    }
  });

  it('level C: by hand', () => {
    expectClose(effectiveSampleSizeToLag(10, [0.5, 0.25]), 10 / (1 + 2 * (0.9 * 0.5 + 0.8 * 0.25)), byHand);
  });

  it('says where a definition has no answer', () => {
    const values = [1, 2, 3, 4, 5, 6, 7, 8, 9, 9.5];
    const all = effectiveSampleSizes({ values, lags: 9, years: [1, 2, 3, 4, 5, 6, 7, 8, 9, 11] });
    // Over every lag Σ r_k = −1/2; the later ones, all negative, count less, so that the sum stays positive here …
    expect(all.bayleyHammersley1946).not.toBeNull();
    expect(all.caveats.map(({ code }) => code)).toEqual(['gaps-closed-up']);
    // … while r + 0.68/√n of a straight line this short is close to 1.
    const short = effectiveSampleSizes({ values: [1, 1.1, -1, -1.05], lags: 3 });
    expect(short.nychka2000).not.toBeNull();
    const steep = effectiveSampleSizes({ values: [...Array.from({ length: 30 }, (_, t) => t)], lags: 1 });
    expect(steep.nychka2000).toBeNull();
    expect(steep.caveats[0]?.detail).toContain('expected r + 0.68/√n below 1');
    const alternating = effectiveSampleSizes({ values: [1, -1, 1, -1, 1, -1], lags: 1 });
    expect(alternating.bayleyHammersley1946).toBeNull();
  });
});

describe('effectiveSampleSizeNychka2000', () => {
  it('level C: 100 values with r = 0.432 and 0.68/√100 = 0.068: 100/3', () => {
    expectClose(effectiveSampleSizeNychka2000(100, 0.432), 100 / 3, byHand);
    expectClose(effectiveSampleSizeNychka2000(25, -0.136), 25, byHand);
  });
});

describe('refusals', () => {
  it.each([
    [() => effectiveSampleSize(0, 0.5), 'effectiveSampleSize, nObs'],
    [() => effectiveSampleSize(10, 1), 'lagOneCorrelation: expected a finite number above -1 and below 1'],
    [() => effectiveSampleSizeOfMean(10.5, 0.2), 'effectiveSampleSizeOfMean, nObs: expected a whole number'],
    [() => effectiveSampleSizeOfMean(10, -1), 'effectiveSampleSizeOfMean, lagOneCorrelation'],
    [
      () => effectiveSampleSizeToLag(3, [0.1, 0.1, 0.1]),
      'effectiveSampleSizeToLag, nObs: expected a whole number above 3',
    ],
    [() => effectiveSampleSizeToLag(9, []), 'at least 1 values'],
    [() => effectiveSampleSizeToLag(9, [0.1, 1.2]), 'autocorrelations[1]'],
    [() => effectiveSampleSizeToLag(9, [-0.9]), 'autocorrelations that leave the mean a variance'],
    [() => effectiveSampleSizeNychka2000(9, 0.8), 'r + 0.68/√n below 1, but found 1.03'],
    [() => effectiveSampleSizes({ values: [1, 2, 4], lags: 3 }), 'effectiveSampleSizes, lags'],
    [() => effectiveSampleSizes({ values: [2, 2, 2], lags: 1 }), 'not all equal'],
  ])('%s', (compute, sentence) => expect(compute).toThrow(sentence));
});
