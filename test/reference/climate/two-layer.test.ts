import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { flowIntegral } from '../../../src-main/climate/two-layer/flow-integral.ts';
import { advanced, imbalanceWm2 } from '../../../src-main/climate/two-layer/layer-state.ts';
import { linearResponse } from '../../../src-main/climate/two-layer/linear-response.ts';
import { sensitivities } from '../../../src-main/climate/two-layer/sensitivities.ts';
import { twoLayer } from '../../../src-main/climate/two-layer/two-layer.ts';
import type { ResponseForcing, TwoLayerInput } from '../../../src-main/contract/climate-response.ts';
import { twoLayerTables, type TwoLayerModel } from '../../../src-main/quantities/two-layer-tables.ts';
import { mean } from '../../../src-main/statistics/summation.ts';
import { expectClose } from '../../helpers/close.ts';
import { integrate } from '../../helpers/integrate.ts';
import { startR, type RSession } from '../../helpers/r-session.ts';

let r: RSession;
beforeAll(async () => {
  r = await startR(new URL('./two-layer.R', import.meta.url));
});
afterAll(() => r.close());

type Parameters = Required<Omit<TwoLayerInput, 'forcing' | 'years' | 'doublingWm2'>>;
const set = (C: number, C0: number, gamma: number, lambda: number, eps: number): Parameters => ({
  heatCapacity: C,
  deepHeatCapacity: C0,
  exchange: gamma,
  feedback: lambda,
  efficacy: eps,
});
const partOne = set(7.3, 106, 0.73, 1.13, 1);
const partTwo = set(8.2, 109, 0.67, 1.18, 1.28);
const { models = [] } = twoLayerTables.find(({ id }) => id === 'ar6-cmip6') ?? {};
const meanOf = (name: Exclude<keyof TwoLayerModel, 'model'>): number => mean(models.map((model) => model[name]));
const cmip6 = set(
  meanOf('heatCapacity'),
  meanOf('deepHeatCapacity'),
  meanOf('exchange'),
  meanOf('feedback'),
  meanOf('efficacy'),
);

// Level C: worked out apart from this project from the closed forms of Geoffroy et al. 2013 with the mean parameters of
// CMIP5 (parts I and II, as printed) and CMIP6 (all digits of the means of the table), and held against an integration there to 1e-6 K.
const tabulated = [
  {
    name: 'CMIP5 mean, part I',
    parameters: partOne,
    quadruplingWm2: 6.9,
    times: [3.88286128, 241.5881049],
    deepRatios: [-0.02747516, 2.50655244],
    shares: [0.59452882, 0.40547118],
    surfaceK: [0.834492, 3.454355, 4.469513, 6.066743],
    deepK: [0.159486, 2.003767],
    imbalanceWm2: [2.996579, 1.84945],
    ecsK: 3.053097,
    ramp: [1.877679, 4.126391],
    onePercent: 1.886824,
    noDeepWarming: 1.854839,
  },
  {
    name: 'CMIP5 mean, part II',
    parameters: partTwo,
    quadruplingWm2: 7.6,
    times: [3.98228502, 283.89072283],
    deepRatios: [-0.02509249, 2.34225239],
    shares: [0.56698642, 0.43301358],
    surfaceK: [0.820738, 3.451864, 4.479786, 6.358333],
    deepK: [0.1419, 1.847774],
    imbalanceWm2: [2.905851, 1.820087],
    ecsK: 3.220339,
    ramp: [1.880631, 4.135199],
    onePercent: 1.889791,
    noDeepWarming: 1.864939,
  },
  {
    name: 'CMIP6 mean',
    parameters: cmip6,
    quadruplingWm2: meanOf('quadruplingWm2'),
    times: [4.25973362, 319.21510364],
    deepRatios: [-0.02458152, 2.25330481],
    shares: [0.55020516, 0.44979484],
    surfaceK: [0.852442, 3.741564, 4.909797, 7.171756],
    deepK: [0.139183, 1.895072],
    imbalanceWm2: [3.041266, 1.922765],
    ecsK: 3.657609,
    ramp: [2.057862, 4.529079],
    onePercent: 2.067885,
    noDeepWarming: 2.056283,
  },
];

const eightDecimals = { rel: 0, abs: 6e-9, why: 'tabulated to eight decimals' };
const fromRounded = {
  rel: 5e-7,
  abs: 0,
  why: 'the copy of the table is rounded at 1e-6, the tabulated means were not',
};

describe.each(tabulated)('twoLayer with the $name', (row) => {
  const printed = { rel: 0, abs: 1e-6, why: 'tabulated to six decimals' };
  const doublingWm2 = row.quadruplingWm2 / 2;
  const after = (forcing: ResponseForcing, years: number[]) =>
    twoLayer({ ...row.parameters, forcing, years, doublingWm2 });

  it('has the tabulated modes', () => {
    const { fastYr, slowYr, fastDeepRatio, slowDeepRatio, fastShare, slowShare } = after({ kind: 'step', wm2: 1 }, [1]);
    expectClose([fastYr, slowYr], row.times, row.name === 'CMIP6 mean' ? fromRounded : eightDecimals);
    expectClose([fastDeepRatio, slowDeepRatio], row.deepRatios, printed);
    expectClose([fastShare, slowShare], row.shares, printed);
    expectClose(fastShare! + slowShare!, 1, { rel: 1e-15, abs: 0, why: 'they share out the whole' });
  });

  it('warms after four times CO2 as tabulated', () => {
    const { surfaceK, deepK, imbalanceWm2: n } = after({ kind: 'step', wm2: row.quadruplingWm2 }, [1, 10, 100, 1000]);
    expectClose(surfaceK, row.surfaceK, printed, 'surfaceK');
    expectClose(deepK.slice(1, 3), row.deepK, printed, 'deepK');
    expectClose(n.slice(1, 3), row.imbalanceWm2, printed, 'imbalanceWm2');
  });

  it('warms along a ramp as tabulated, and has the tabulated sensitivities', () => {
    const answer = after({ kind: 'ramp', wm2PerYr: row.quadruplingWm2 / 140 }, [70, 140]);
    expectClose(answer.surfaceK, row.ramp, printed, 'ramp');
    expectClose(
      [answer.ecsK, answer.tcrK, answer.tcrOnePercentK, answer.tcrNoDeepWarmingK],
      [row.ecsK, row.ramp[0]!, row.onePercent, row.noDeepWarming],
      printed,
    );
    const again = sensitivities(linearResponse(row.parameters), doublingWm2);
    expect(again.tcrK).toBe(answer.tcrK);
  });
});

/** Each parameter away from its usual value, and the corners: equal rates, hardly any exchange, a stiff pair. */
const corners: [string, Parameters][] = [
  ['CMIP5 mean, part I', partOne],
  ['CMIP5 mean, part II', partTwo],
  ['a strong efficacy', set(5.6, 145, 0.82, 0.93, 3.07)],
  ['a weak efficacy', set(8.9, 412, 0.53, 1.64, 0.65)],
  ['layers of one size', set(6, 6, 1.1, 0.4, 1.6)],
  ['a deep layer smaller than the surface', set(40, 3, 2.5, 1.2, 1.1)],
  ['rates that nearly meet', set(10, 10, 1, 1, 1e-4)],
  ['a weak feedback', set(8, 100, 0.7, 0.01, 1.2)],
  ['a weak exchange', set(8, 100, 1e-4, 1.1, 1.2)],
];
const close = { rel: 1e-10, abs: 1e-12, why: 'two programs; R’s eigenvectors lose digits where they nearly agree' };
const wm2 = Array.from({ length: 60 }, (_, i) => 0.04 * i + 0.3 * Math.sin(i) - (i % 17 === 5 ? 2 : 0));

describe.each(corners)('twoLayer against R’s eigen: %s', (_, parameters) => {
  const variables = {
    C: parameters.heatCapacity,
    C0: parameters.deepHeatCapacity,
    gamma: parameters.exchange,
    lambda: parameters.feedback,
    eps: parameters.efficacy,
    wm2,
  };
  const years = [0.25, 1, 7, 70, 500];
  const matrix = 'A <- two_layer_matrix(C, C0, gamma, lambda, eps)';

  it('exp(At) is that of R', async () => {
    for (const t of years) {
      const { flow } = await r.numbers(`${matrix}; list(flow = flow(A, t))`, { ...variables, t });
      const { surfaceFromSurface, surfaceFromDeep, deepFromSurface, deepFromDeep } = flowIntegral(
        linearResponse(parameters),
        0,
        t,
      );
      expectClose([surfaceFromSurface, deepFromSurface, surfaceFromDeep, deepFromDeep], flow, close, `t = ${t}`);
    }
  });

  it('step and ramp are those of R', async () => {
    const times = years.join(', ');
    const fromR = await r.numbers(
      `${matrix}; s <- sapply(c(${times}), function(t) step_response(A, C, 7.4, t));
       k <- sapply(c(${times}), function(t) ramp_response(A, C, 0.05, t));
       list(step = s[1, ], stepDeep = s[2, ], ramp = k[1, ], rampDeep = k[2, ])`,
      variables,
    );
    const step = twoLayer({ ...parameters, forcing: { kind: 'step', wm2: 7.4 }, years });
    const ramp = twoLayer({ ...parameters, forcing: { kind: 'ramp', wm2PerYr: 0.05 }, years });
    const found = { step: step.surfaceK, stepDeep: step.deepK, ramp: ramp.surfaceK, rampDeep: ramp.deepK };
    expectClose(found, fromR, close);
  });

  it('annual forcing gives the years’ ends of R', async () => {
    const { surface, deep } = await r.numbers(`${matrix}; annual_response(A, C, wm2)`, variables);
    const ends = wm2.map((_, i) => i + 1);
    const { surfaceK, deepK } = twoLayer({ ...parameters, forcing: { kind: 'annual', wm2 }, years: ends });
    expectClose({ surfaceK, deepK }, { surfaceK: surface, deepK: deep }, close);
  });

  it('annual forcing, within years too, is an integration of the equations; the heat taken up is that of both layers', () => {
    const { heatCapacity: C, deepHeatCapacity: C0, exchange, feedback, efficacy } = parameters;
    // The third component gathers N; the equations are written out here anew.
    const equations =
      (forcing: number) =>
      (_time: number, [T = 0, T0 = 0]: readonly number[]): number[] => [
        (forcing - feedback * T - efficacy * exchange * (T - T0)) / C,
        (exchange * (T - T0)) / C0,
        forcing - feedback * T - (efficacy - 1) * exchange * (T - T0),
      ];
    let y = [0, 0, 0];
    const expected: number[][] = [];
    for (const forcing of wm2) {
      const middle = integrate(equations(forcing), y, { from: 0, to: 0.5, steps: 4 });
      y = integrate(equations(forcing), y, { from: 0, to: 1, steps: 8 });
      expected.push([middle[0]!, middle[1]!], [y[0]!, y[1]!]);
    }
    const years = wm2.flatMap((_, i) => [i + 0.5, i + 1]);
    const found = twoLayer({ ...parameters, forcing: { kind: 'annual', wm2 }, years });
    const states = found.surfaceK.map((surfaceK, i) => [surfaceK, found.deepK[i]!]);
    expectClose(states, expected, { rel: 1e-10, abs: 1e-12, why: 'rounding of five hundred steps' });
    const heat = C * found.surfaceK.at(-1)! + C0 * found.deepK.at(-1)!;
    expectClose(heat, y[2]!, { rel: 1e-10, abs: 1e-11, why: 'as above' }, 'heat');
    const last = { surfaceK: found.surfaceK.at(-1)!, deepK: found.deepK.at(-1)! };
    expect(found.imbalanceWm2.at(-1)).toBe(imbalanceWm2(parameters, wm2.at(-1)!, last));
  });
});

describe('the limits of the two-layer model', () => {
  it('no exchange: one layer with C/λ', () => {
    const { surfaceK, deepK, ...rest } = twoLayer({
      ...set(8, 100, 0, 1.25, 1.3),
      forcing: { kind: 'step', wm2: 4 },
      years: [0, 3, 30],
      doublingWm2: 4,
    });
    const oneLayer = [0, 3, 30].map((t) => (4 / 1.25) * -Math.expm1((-1.25 / 8) * t));
    expectClose(surfaceK, oneLayer, { rel: 1e-14, abs: 0, why: 'closed form' });
    expect(deepK).toEqual([0, 0, 0]);
    expect(rest).toMatchObject({ fastYr: 6.4, slowYr: null, fastShare: 1, slowShare: 0, slowDeepRatio: null });
    expect(rest.caveats.map(({ code }) => code)).toContain('no-exchange');
  });

  it('the exchange going to zero goes there', () => {
    const at = (exchange: number) =>
      twoLayer({ ...partTwo, exchange, forcing: { kind: 'step', wm2: 7.6 }, years: [1, 100, 1000] }).surfaceK;
    for (const exchange of [1e-6, 1e-9, 1e-12]) {
      expectClose(at(exchange), at(0), { rel: 2 * exchange, abs: 0, why: 'first order in γ/λ' }, `γ = ${exchange}`);
    }
  });

  it('equal rates, as without efficacy where λ/C = γ/C0: the deep ocean follows by t e^(−t/τ)', () => {
    const { surfaceK, deepK, fastYr, slowYr, fastShare, slowShare, caveats } = twoLayer({
      ...set(10, 20, 2, 1, 0),
      forcing: { kind: 'step', wm2: 3 },
      years: [1, 10, 50],
    });
    const surface = [1, 10, 50].map((t) => 3 * -Math.expm1(-t / 10));
    const deep = [1, 10, 50].map((t) => 3 * (-Math.expm1(-t / 10) - (t / 10) * Math.exp(-t / 10)));
    expectClose({ surfaceK, deepK }, { surfaceK: surface, deepK: deep }, { rel: 1e-13, abs: 0, why: 'closed form' });
    expectClose([fastYr, slowYr], [10, 10], { rel: 1e-15, abs: 0, why: 'one rounding' });
    expect([fastShare, slowShare]).toEqual([null, null]);
    expect(caveats.map(({ code }) => code)).toEqual([
      'outside-published',
      'no-efficacy',
      'one-time-scale',
      'no-doubling-forcing',
    ]);
  });

  it('far out it is at ECS, and a forcing that stays zero does nothing', () => {
    const {
      surfaceK,
      deepK,
      imbalanceWm2: n,
      ecsK,
    } = twoLayer({
      ...cmip6,
      forcing: { kind: 'step', wm2: 3.9 },
      years: [1e6],
      doublingWm2: 3.9,
    });
    expectClose([surfaceK[0], deepK[0]], [ecsK!, ecsK!], { rel: 1e-14, abs: 0, why: 'equilibrium' });
    expectClose(n[0], 0, { rel: 0, abs: 1e-14, why: 'balance' });
    const still = twoLayer({ ...cmip6, forcing: { kind: 'annual', wm2: [0, 0, 0] }, years: [0, 2.5, 3] });
    expect([still.surfaceK, still.imbalanceWm2]).toEqual([
      [0, 0, 0],
      [0, 0, 0],
    ]);
  });

  it('advanced is one year of annual forcing', () => {
    const response = linearResponse(partOne);
    const start = { surfaceK: 0.4, deepK: 0.1 };
    const next = advanced(start, flowIntegral(response, 0, 1), flowIntegral(response, 1, 1), 2 / 7.3);
    const [surfaceK, deepK] = integrate(
      (_, [T = 0, T0 = 0]) => [(2 - 1.13 * T - 0.73 * (T - T0)) / 7.3, (0.73 * (T - T0)) / 106],
      [0.4, 0.1],
      { from: 0, to: 1, steps: 8 },
    );
    expectClose(next, { surfaceK: surfaceK!, deepK: deepK! }, close);
  });

  it('annual forcing has an end, and time a beginning', () => {
    const run = (years: number[]) => () => twoLayer({ ...partOne, forcing: { kind: 'annual', wm2: [1, 2] }, years });
    expect(run([2.01])).toThrow('years[0]');
    expect(run([1850])).toThrow('at most 2');
    expect(run([-1])).toThrow('at least 0');
  });
});
