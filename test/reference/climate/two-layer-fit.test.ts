import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { fitLikelihood, parametersAt } from '../../../src-main/climate/two-layer/fit-likelihood.ts';
import { fitProblem } from '../../../src-main/climate/two-layer/fit-problem.ts';
import { fitProfiles } from '../../../src-main/climate/two-layer/fit-profiles.ts';
import { fitHeight, fitSteps, fitSummit } from '../../../src-main/climate/two-layer/fit-summit.ts';
import { twoLayerFit } from '../../../src-main/climate/two-layer/two-layer-fit.ts';
import { yearlyResponse } from '../../../src-main/climate/two-layer/yearly-response.ts';
import type { TwoLayerFitInput } from '../../../src-main/contract/climate-response.ts';
import { randomStream } from '../../../src-main/statistics/random-stream.ts';
import { simplexMaximum } from '../../../src-main/statistics/simplex-maximum.ts';
import { mean } from '../../../src-main/statistics/summation.ts';
import { expectClose } from '../../helpers/close.ts';
import { integrate } from '../../helpers/integrate.ts';
import { startR, type RSession } from '../../helpers/r-session.ts';

let r: RSession;
beforeAll(async () => {
  r = await startR(new URL('./two-layer.R', import.meta.url), new URL('./two-layer-fit.R', import.meta.url));
});
afterAll(() => r.close());

/** Invented: forcing that rises with four eruptions in it. */
const nYears = 120;
const startYear = 1900;
const wm2 = Array.from(
  { length: nYears },
  (_, i) => 3 * (i / nYears) ** 2 - ({ 12: 2, 13: 0.8, 63: 1.5, 64: 0.6, 82: 1.2, 91: 2.6, 92: 1.1 }[i] ?? 0),
);
const truth = { heatCapacity: 8, deepHeatCapacity: 100, exchange: 0.7, feedback: 1.2, efficacy: 1.2 };
const yearly = yearlyResponse(truth, Float64Array.from(wm2));

interface Noise {
  temperature: number;
  heat: number;
}
/** Errors of AR(1), ρ 0.5 and 0.3, started from the stationary distribution; heat uptake from the seventieth year on. */
function world(seed: number, noise: Noise = { temperature: 0.08, heat: 0.25 }): TwoLayerFitInput {
  const stream = randomStream(seed, 0);
  const errors = (rho: number, sigma: number, length: number) => {
    const values = [(sigma * stream.normal()) / Math.sqrt(1 - rho * rho)];
    while (values.length < length) values.push(rho * values.at(-1)! + sigma * stream.normal());
    return values;
  };
  const years = wm2.map((_, i) => startYear + i);
  const heatErrors = errors(0.3, noise.heat, nYears - 70);
  return {
    forcing: { startYear, wm2 },
    temperature: {
      years,
      values: errors(0.5, noise.temperature, nYears).map((e, i) => yearly.surfaceK[i]! + e - 0.3),
    },
    heatUptake: { years: years.slice(70), values: heatErrors.map((e, i) => yearly.imbalanceWm2[i + 70]! + e) },
    temperatureOffset: 'fitted',
    heatCapacity: 8,
    deepHeatCapacity: 100,
    efficacy: 1.2,
    doublingWm2: 3.9,
    levelPercent: 95,
  };
}

/** Some years less. */
function withGaps(input: TwoLayerFitInput): TwoLayerFitInput {
  const kept = ({ years, values }: { years: number[]; values: number[] }) => {
    const rows = years
      .map((year, i) => ({ year, value: values[i]! }))
      .filter(({ year }) => year % 7 !== 3 && year !== 1946);
    return { years: rows.map(({ year }) => year), values: rows.map(({ value }) => value) };
  };
  return { ...input, temperature: kept(input.temperature!), heatUptake: kept(input.heatUptake!) };
}

/** As R has it: a value for each year of the forcing, NA where there is none. */
const variablesOf = ({ temperature, heatUptake }: TwoLayerFitInput) => ({
  wm2,
  tRows: temperature!.years.map((year) => year - startYear + 1),
  tValues: temperature!.values,
  nRows: heatUptake?.years.map((year) => year - startYear + 1) ?? [1],
  nValues: heatUptake?.values ?? [0],
  hasHeat: heatUptake !== undefined,
});
const asRecords = `T <- N <- rep(NA_real_, length(wm2)); T[tRows] <- tValues; if (hasHeat) N[nRows] <- nValues`;
const known = 'C = 8, C0 = 100, eps = 1.2, wm2 = wm2, temperature = T, heat = N';

describe('yearlyResponse', () => {
  const close = { rel: 1e-10, abs: 1e-12, why: 'two programs' };

  it('has the means of R’s eigen', async () => {
    const { surfaceMean = [], deepMean = [] } = await r.numbers(
      'annual_response(two_layer_matrix(8, 100, 0.7, 1.2, 1.2), 8, wm2)',
      { wm2 },
    );
    expectClose(yearly.surfaceK, surfaceMean, close);
    const imbalance = wm2.map((f, i) => f - 1.2 * surfaceMean[i]! - 0.2 * 0.7 * (surfaceMean[i]! - deepMean[i]!));
    expectClose(yearly.imbalanceWm2, imbalance, close);
  });

  it('has the mean of an integration, also without feedback and without exchange', () => {
    for (const change of [{}, { feedback: 0 }, { exchange: 0 }]) {
      const { heatCapacity: C, deepHeatCapacity: C0, exchange, feedback, efficacy } = { ...truth, ...change };
      const found = yearlyResponse({ ...truth, ...change }, Float64Array.from(wm2.slice(0, 20))).surfaceK;
      let [T, T0] = [0, 0];
      const expected = wm2.slice(0, 20).map((forcing) => {
        const slopes = (_: number, [t = 0, t0 = 0]: readonly number[]) => [
          (forcing - feedback * t - efficacy * exchange * (t - t0)) / C,
          (exchange * (t - t0)) / C0,
          t,
        ];
        const [nextT = NaN, nextT0 = NaN, sum = NaN] = integrate(slopes, [T, T0, 0], { from: 0, to: 1, steps: 4 });
        [T, T0] = [nextT, nextT0];
        return sum;
      });
      expectClose(found, expected, close);
    }
  });
});

describe('the fit against R', () => {
  const flat = { rel: 0, abs: 2e-6, why: 'flat at the maximum, where arima’s optimiser stops' };
  const optimised = { rel: 2e-3, abs: 0, why: 'optim stops where the likelihood is level to 1e-10' };

  it.each([
    ['both records', world(1)],
    ['with gaps', withGaps(world(1))],
    ['temperature alone', { ...world(2), heatUptake: undefined }],
  ] as const)('fitLikelihood is that of eigen and arima: %s', async (_, input) => {
    const problem = fitProblem(input);
    for (const [lambda, gamma] of [
      [1.2, 0.7],
      [0.8, 1.1],
    ] as const) {
      const { logLik } = await r.numbers(`${asRecords}; list(logLik = fit_log_likelihood(lambda, gamma, ${known}))`, {
        ...variablesOf(input),
        lambda,
        gamma,
      });
      const found = fitLikelihood(problem, parametersAt(problem, [Math.sqrt(lambda), Math.sqrt(gamma)]));
      expectClose([found.logLikelihood], logLik, flat);
    }
  });

  it('fitSummit and twoLayerFit: the maximum that R’s optim finds, and profiles that have fallen by 1.92 at each end', async () => {
    const input = withGaps(world(1));
    const fit = twoLayerFit(input);
    const variables = { ...variablesOf(input), start: [1, 0.8] };
    const best = await r.numbers(`${asRecords}; fit_best(start, ${known})`, variables);
    expectClose(
      { feedback: [fit.feedbackWm2PerK], exchange: [fit.exchangeWm2PerK] },
      { feedback: best['feedback'], exchange: best['exchange'] },
      optimised,
    );
    expectClose([fit.logLikelihood], best['logLik'], flat);
    expect(fitSummit(fitProblem(input)).height).toBe(fit.logLikelihood);

    const { feedbackWm2PerK: lambda, exchangeWm2PerK: gamma, ecsK } = fit.intervals;
    const ends = { lambda: [lambda.low!, lambda.high!], gamma: [gamma.low!, gamma.high!] };
    const { held = [] } = await r.numbers(
      `${asRecords}; list(held = c(sapply(lambda, fit_with_feedback, ${known}), sapply(gamma, fit_with_exchange, ${known})))`,
      { ...variables, ...ends },
    );
    const falls = held.map((height) => fit.logLikelihood - height);
    const fall = 1.959963984540054 ** 2 / 2;
    expectClose(falls, [fall, fall, fall, fall], { rel: 0, abs: 1e-5, why: 'two optimisers, both flat at their top' });
    expectClose(fit.fallOfInterval, fall, { rel: 1e-12, abs: 0, why: 'normal quantile' });
    expectClose([ecsK.low, ecsK.high, fit.ecsK], [3.9 / lambda.high!, 3.9 / lambda.low!, 3.9 / fit.feedbackWm2PerK], {
      rel: 1e-14,
      abs: 0,
      why: 'F2x/λ',
    });
  });
});

describe('worlds of known feedback and exchange', () => {
  const nWorlds = 60;
  const fits = Array.from({ length: nWorlds }, (_, i) => twoLayerFit(world(100 + i)));
  // A share of 0.95 over so many worlds scatters by √(0.95·0.05/n).
  const fewest = 0.95 - 4 * Math.sqrt((0.95 * 0.05) / nWorlds);
  const share = (covers: (fit: (typeof fits)[number]) => boolean) => fits.filter(covers).length / nWorlds;

  it('lie within the intervals about as often as they should', () => {
    const covers = ({ low, high }: { low: number | null; high: number | null }, value: number) =>
      (low ?? -Infinity) <= value && value <= (high ?? Infinity);
    expect(share((fit) => covers(fit.intervals.feedbackWm2PerK, 1.2))).toBeGreaterThan(fewest);
    expect(share((fit) => covers(fit.intervals.exchangeWm2PerK, 0.7))).toBeGreaterThan(fewest);
    expect(share((fit) => covers(fit.intervals.ecsK, 3.9 / 1.2))).toBeGreaterThan(fewest);
    // Intervals that cover everything would pass too: a value two and a half widths off must mostly lie outside.
    expect(share((fit) => covers(fit.intervals.feedbackWm2PerK, 0.6))).toBeLessThan(0.2);
  });

  it('are met on average: the mean error is within 4.5 of its standard errors', () => {
    const errors = fits.map((fit) => Math.log(fit.feedbackWm2PerK / 1.2));
    const centre = mean(errors);
    const sd = Math.sqrt(errors.reduce((total, error) => total + (error - centre) ** 2, 0) / (nWorlds - 1));
    expect(Math.abs(centre)).toBeLessThan((4.5 * sd) / Math.sqrt(nWorlds));
  });

  it('a likelihood with two tops gives the higher one, and says that there are others', () => {
    const input = world(147);
    const fit = fits[47]!;
    expect(fit.starts.nAtTop).toBeLessThan(fit.starts.nClimbs);
    expect(fit.caveats.map(({ code }) => code)).toContain('several-summits');
    const problem = fitProblem(input);
    const lower = simplexMaximum(fitHeight(problem), [Math.sqrt(0.1), Math.sqrt(2)], fitSteps(problem));
    expect(fit.logLikelihood - lower.height).toBeGreaterThan(10);
  });
});

describe('what the records cannot tell', () => {
  it('a noisy temperature record alone does not bound ECS from above, and the answer says so with the figures', () => {
    const fit = twoLayerFit({ ...world(5, { temperature: 0.2, heat: 0.25 }), heatUptake: undefined });
    expect(fit).toMatchObject({ isEcsBoundedAbove: false, heatUptake: null });
    expect(fit.fallAtZeroFeedback).toBeLessThan(fit.fallOfInterval);
    expect(fit.intervals).toMatchObject({ feedbackWm2PerK: { low: 0 }, ecsK: { high: null } });
    expect(fit.intervals.ecsK.low).toBeGreaterThan(0.5);
    const { detail } = fit.caveats.find(({ code }) => code === 'ecs-unbounded-above')!;
    expect(detail).toContain(`falls by ${fit.fallAtZeroFeedback.toFixed(2)}`);
  });

  it('the fall to no feedback is that of R with λ next to 0', async () => {
    const input = world(3, { temperature: 0.2, heat: 1.5 });
    const fit = twoLayerFit(input);
    const { held } = await r.numbers(
      `${asRecords}; list(held = optimize(function(g) fit_log_likelihood(1e-7, g^2, ${known}), c(0.3, 3), maximum = TRUE, tol = 1e-6)$objective)`,
      variablesOf(input),
    );
    expectClose([fit.logLikelihood - fit.fallAtZeroFeedback], held, { rel: 0, abs: 1e-4, why: 'λ = 1e-7 for 0' });
  });

  it('a wider level needs a deeper fall, and gives a wider interval', () => {
    const at = (levelPercent: number) => twoLayerFit({ ...world(4), levelPercent });
    const [narrow, wide] = [at(66), at(99)];
    expect(narrow.feedbackWm2PerK).toBe(wide.feedbackWm2PerK);
    expect(wide.intervals.ecsK.high!).toBeGreaterThan(narrow.intervals.ecsK.high!);
    expect(wide.intervals.ecsK.low!).toBeLessThan(narrow.intervals.ecsK.low!);
  });

  it('heat capacities that are fitted too: no lower likelihood, wider intervals', () => {
    const fixed = twoLayerFit(world(5));
    const free = twoLayerFit({ ...world(5), heatCapacity: 'fitted', deepHeatCapacity: 'fitted' });
    expect(free.logLikelihood).toBeGreaterThanOrEqual(fixed.logLikelihood);
    const width = ({ intervals: { feedbackWm2PerK: i } }: typeof free) => (i.high ?? Infinity) - (i.low ?? 0);
    expect(width(free)).toBeGreaterThanOrEqual(width(fixed));
    const problem = fitProblem({ ...world(5), heatCapacity: 'fitted', deepHeatCapacity: 'fitted' });
    expect(fitSteps(problem)).toHaveLength(4);
    expect(fitHeight(problem)([1, 1, Math.log(200), Math.log(100)])).toBe(-Infinity);
  });

  it('a record that a model computed is refused', () => {
    const input = world(1, { temperature: 0, heat: 0 });
    expect(() => twoLayerFit({ ...input, heatUptake: undefined })).toThrow('an exact fit');
  });
});

describe('on the way', () => {
  it('fitProfiles reports a point above a summit that is none', () => {
    const problem = fitProblem(world(6));
    const at = [0.9, 0.5];
    const profiles = fitProfiles(problem, { at, height: fitHeight(problem)(at) }, 1.92);
    expect(profiles.higher?.height).toBeGreaterThan(fitHeight(problem)(at));
  });

  it('progress rises to the end, and may stop the work', () => {
    const shares: number[] = [];
    twoLayerFit(world(1), (share) => shares.push(share));
    expect(shares).toEqual([...shares].sort((a, b) => a - b));
    expect(shares.length).toBeGreaterThan(20);
    const stop = () => {
      throw new Error('cancelled');
    };
    expect(() => twoLayerFit(world(1), stop)).toThrow('cancelled');
  });
});
