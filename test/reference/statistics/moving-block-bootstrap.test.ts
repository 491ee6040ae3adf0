import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { movingBlockBootstrap } from '../../../src-main/statistics/moving-block-bootstrap.ts';
import { randomStream } from '../../../src-main/statistics/random-stream.ts';
import { regression } from '../../../src-main/statistics/regression.ts';
import { expectClose } from '../../helpers/close.ts';
import { startR, type RSession } from '../../helpers/r-session.ts';
import { co2AndTemperature } from '../../helpers/real-series.ts';

let r: RSession;
beforeAll(async () => {
  r = await startR(new URL('./moving-block-bootstrap.R', import.meta.url));
});
afterAll(() => r.close());

const near = { rel: 1e-9, abs: 0, why: 'two double-precision programs with the same blocks' };
const { co2Ppm, temperatureK } = co2AndTemperature();
const x = co2Ppm.map((value) => Math.log(value / co2Ppm[0]!));
const y = temperatureK.map((value) => value - temperatureK[0]!);

/** The starts as the docstring has them: a thousand draws from each stream. */
function startsOf(seed: number, draws: number, blockLength: number): number[] {
  const nBlocks = Math.ceil(y.length / blockLength);
  return Array.from({ length: Math.ceil(draws / 1000) }, (_, block) => {
    const stream = randomStream(seed, block);
    const nDraws = Math.min(1000, draws - 1000 * block);
    return Array.from({ length: nDraws * nBlocks }, () => Math.floor(stream.uniform() * (y.length - blockLength + 1)));
  }).flat();
}

describe('movingBlockBootstrap', () => {
  // Level B: the same new records, each fitted by R's lm.
  it.each([
    ['pairs', true, 5, 300, 11],
    ['pairs', false, 7, 200, 12],
    ['pairs', true, 60 - 1, 150, 3],
    ['residuals', true, 5, 300, 13],
    ['residuals', false, 7, 200, 14],
    ['residuals', true, 1, 1100, 15],
  ] as const)('R: %s, intercept %s, blocks of %d', async (resample, intercept, blockLength, draws, seed) => {
    const answer = movingBlockBootstrap({ x, y, intercept, blockLength, draws, seed, resample });
    const starts = startsOf(seed, draws, blockLength);
    const fromR = await r.numbers('block_bootstrap(x, y, intercept, blockLength, starts, resample)', {
      x,
      y,
      intercept,
      blockLength,
      starts,
      resample,
    });
    const { slope, quantiles, standardError } = answer;
    const figures = { slope, ...quantiles, standardError };
    expectClose(Object.fromEntries(Object.entries(figures).map(([name, value]) => [name, [value]])), fromR, near);
    expect(answer.resample).toBe(resample);
    expect(answer.random).toMatchObject({ seed, nDraws: draws });
  });

  // Level C: single residuals on a fixed design scatter by √(Σ w²·Σ(e − ē)²/n), w the influence of each row on the slope,
  // which with an intercept is the classical error times √((n − 2)/n).
  it('blocks of one residual: the classical standard error, within what the draws allow', () => {
    const draws = 40_000;
    const { standardError } = movingBlockBootstrap({
      x,
      y,
      intercept: true,
      blockLength: 1,
      draws,
      seed: 5,
      resample: 'residuals',
    });
    const classical = regression({ x, y, intercept: true, covariance: { kind: 'classical' } }).standardErrors[1]!;
    const expected = classical * Math.sqrt((y.length - 2) / y.length);
    // The standard deviation of a standard deviation over m nearly normal draws is about 1/√(2m) of it.
    expect(Math.abs(standardError / expected - 1)).toBeLessThan(4 / Math.sqrt(2 * draws));
  });
});
