import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { gregory } from '../../../src-main/climate/gregory.ts';
import { twoLayer } from '../../../src-main/climate/two-layer/two-layer.ts';
import type { GregoryInput, GregoryLine } from '../../../src-main/contract/climate-response.ts';
import { twoLayerTables, type TwoLayerModel } from '../../../src-main/quantities/two-layer-tables.ts';
import { randomStream } from '../../../src-main/statistics/random-stream.ts';
import { mean } from '../../../src-main/statistics/summation.ts';
import { fieller } from '../../../src-main/statistics/fieller.ts';
import { expectClose } from '../../helpers/close.ts';
import { startR, type RSession } from '../../helpers/r-session.ts';

let r: RSession;
beforeAll(async () => {
  r = await startR(new URL('./gregory.R', import.meta.url));
});
afterAll(() => r.close());

const years = Array.from({ length: 150 }, (_, i) => i + 1);
const { models = [] } = twoLayerTables.find(({ id }) => id === 'ar6-cmip6') ?? {};
const meanOf = (name: Exclude<keyof TwoLayerModel, 'model'>): number => mean(models.map((model) => model[name]));

// Level C: regressions of the two-layer model after 4×CO2 (mean parameters), worked out apart from this project.
const tabulated = [
  {
    name: 'CMIP5 mean, part I',
    parameters: { heatCapacity: 7.3, deepHeatCapacity: 106, exchange: 0.73, feedback: 1.13, efficacy: 1 },
    wm2: 6.9,
    all: [6.9, 1.13, 3.053097],
    early: [6.9, 1.13, 3.053097],
    late: [6.9, 1.13, 3.053097],
  },
  {
    name: 'CMIP5 mean, part II',
    parameters: { heatCapacity: 8.2, deepHeatCapacity: 109, exchange: 0.67, feedback: 1.18, efficacy: 1.28 },
    wm2: 7.6,
    all: [7.004362, 1.163904, 3.008994],
    early: [7.565005, 1.346731, 2.808654],
    late: [5.986512, 0.930036, 3.218431],
  },
  {
    name: 'CMIP6 mean',
    parameters: {
      heatCapacity: meanOf('heatCapacity'),
      deepHeatCapacity: meanOf('deepHeatCapacity'),
      exchange: meanOf('exchange'),
      feedback: meanOf('feedback'),
      efficacy: meanOf('efficacy'),
    },
    wm2: meanOf('quadruplingWm2'),
    all: [7.1131, 1.064349, 3.341526],
    early: [7.741394, 1.253065, 3.088983],
    late: [5.862286, 0.802355, 3.653175],
  },
];

describe.each(tabulated)('gregory on the two-layer model, $name', ({ parameters, wm2, all, early, late, name }) => {
  const run = twoLayer({ ...parameters, forcing: { kind: 'step', wm2 }, years });
  const answer = gregory({ imbalanceWm2: run.imbalanceWm2, warmingK: run.surfaceK, doublingDivisor: 2 });

  it('has the tabulated lines', () => {
    const printed = { rel: 0, abs: 1e-6, why: 'tabulated to six decimals' };
    const figures = (line: GregoryLine | null) => [
      line?.forcingWm2,
      line?.feedbackWm2PerK,
      (line?.equilibriumK ?? NaN) / 2,
    ];
    expectClose([figures(answer), figures(answer.early), figures(answer.late)], [all, early, late], printed);
    expectClose(answer.perDoubling, { forcingWm2: all[0]! / 2, equilibriumK: all[2]!, divisor: 2 }, printed);
  });

  it('tells a bend from a line', () => {
    const isLine = name === 'CMIP5 mean, part I';
    expect(answer.caveats.map(({ code }) => code).includes('curved')).toBe(!isLine);
    expect(answer.caveats.map(({ code }) => code).includes('exact-fit')).toBe(isLine);
  });
});

/** Invented: a run with noise in both, that of the imbalance carrying over. */
function noisyRun(seed: number, noise: number): { imbalanceWm2: number[]; warmingK: number[] } {
  const stream = randomStream(seed, 0);
  const run = twoLayer({ ...tabulated[1]!.parameters, forcing: { kind: 'step', wm2: 7.6 }, years });
  let carried = 0;
  return {
    warmingK: run.surfaceK.map((value) => value + noise * stream.normal()),
    imbalanceWm2: run.imbalanceWm2.map((value) => {
      carried = 0.4 * carried + 2 * noise * stream.normal();
      return value + carried;
    }),
  };
}

describe('gregory against R', () => {
  const near = { rel: 1e-10, abs: 1e-11, why: 'two programs on 150 rows; a root found to 1e-13' };
  const cases: [string, Pick<GregoryInput, 'covariance' | 'delta'>, object][] = [
    ['classical', {}, {}],
    [
      'Newey–West, lag 3',
      { covariance: { kind: 'newey-west', lag: 3, smallSample: false }, delta: 4 },
      { lag: 3, delta: 4 },
    ],
    [
      'Newey–West, lag 6 with the factor',
      { covariance: { kind: 'newey-west', lag: 6, smallSample: true }, delta: 0.3 },
      { lag: 6, factor: true, delta: 0.3 },
    ],
  ];
  it.each(cases)('line, errors, interval and bracket: %s', async (_, options, variables) => {
    for (const noise of [0.05, 0.3]) {
      const run = noisyRun(4, noise);
      const answer = gregory({ ...run, ...options });
      const given = { lag: -1, factor: false, delta: 1, ...variables };
      const fromR = await r.numbers('gregory(N, T, lag, factor, delta)', {
        N: run.imbalanceWm2,
        T: run.warmingK,
        ...given,
      });
      expectClose(
        {
          line: [answer.forcingWm2, answer.feedbackWm2PerK, answer.equilibriumK],
          errors: [
            answer.forcingStandardErrorWm2,
            answer.feedbackStandardErrorWm2PerK,
            answer.equilibriumStandardErrorK,
          ],
          fieller: [answer.equilibriumFieller95?.low, answer.equilibriumFieller95?.high],
          feedbacks: Object.values(answer.bracket!).map(({ feedbackWm2PerK }) => feedbackWm2PerK),
        },
        fromR,
        near,
      );
    }
  });

  it('the lines of the bracket go through the means, least squares outermost on both sides', () => {
    const run = noisyRun(8, 0.3);
    const { bracket, feedbackWm2PerK } = gregory(run);
    const { imbalanceOnWarming: direct, warmingOnImbalance: turned, totalLeastSquares: total } = bracket!;
    expect(direct.feedbackWm2PerK).toBe(feedbackWm2PerK);
    expect(direct.feedbackWm2PerK).toBeLessThan(total.feedbackWm2PerK);
    expect(total.feedbackWm2PerK).toBeLessThan(turned.feedbackWm2PerK);
    for (const { forcingWm2, feedbackWm2PerK: slope, equilibriumK } of [direct, turned, total]) {
      const onLine = forcingWm2 - slope * mean(run.warmingK);
      expectClose(onLine, mean(run.imbalanceWm2), { rel: 1e-12, abs: 0, why: 'means lie on each line' });
      expectClose(equilibriumK, forcingWm2 / slope, { rel: 1e-15, abs: 0, why: 'definition' });
    }
  });
});

describe('what a Gregory plot cannot tell', () => {
  it('a feedback that is not distinct from none gives no equilibrium, and says so', () => {
    const warmingK = [1, 1.2, 0.9, 1.1, 1.3, 0.8, 1.05];
    const imbalanceWm2 = [2, 1.1, 1.9, 1.2, 2.1, 1.4, 1.7];
    const answer = gregory({ warmingK, imbalanceWm2, doublingDivisor: 2 });
    expect(answer).toMatchObject({
      equilibriumK: null,
      equilibriumStandardErrorK: null,
      equilibriumFieller95: null,
      bracket: null,
      perDoubling: { equilibriumK: null },
      late: null,
    });
    expect(answer.caveats.map(({ code }) => code)).toEqual(
      expect.arrayContaining(['feedback-not-distinct', 'few-years', 'part-too-short']),
    );
  });

  it('a feedback that feeds the warming gives none either', () => {
    const warmingK = years.map((year) => year / 50);
    const imbalanceWm2 = warmingK.map((value, i) => 1 + 0.5 * value + 0.01 * Math.sin(i));
    expect(gregory({ warmingK, imbalanceWm2 }).equilibriumK).toBeNull();
  });

  it('the set of the ratio closes on it without errors', () => {
    const sure = { numeratorVariance: 0, covariance: 0, denominatorVariance: 0, multiple: 2 };
    expect(fieller({ numerator: 3, denominator: 1.5, ...sure })).toEqual({ low: 2, high: 2 });
  });
});
