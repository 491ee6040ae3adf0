import { expect, it } from 'vitest';
import type { ErrorAnswer } from '../../src-main/contract/requests.ts';
import { computing, testMethods, testParameters, type TriedParameter } from '../helpers/compute-tests.ts';

const compute = computing();

const layers = { heatCapacity: 8, deepHeatCapacity: 100, exchange: 0.7, feedback: 1.2, efficacy: 1.3 };
/** Invented: a rise with a wiggle. */
const forcingWm2 = Array.from({ length: 40 }, (_, i) => Number((0.05 * i + 0.2 * Math.sin(i)).toFixed(3)));
const annual = { kind: 'annual', wm2: forcingWm2 };
const loop = { response: 1.5, exchange: 25, sdTemperature: 0.1, sdCarbon: 0.01 };

/** Invented: an imbalance that falls as it warms, the sooner the more. */
const warmingK = Array.from({ length: 40 }, (_, i) =>
  Number((4 * (1 - Math.exp(-(i + 1) / 9)) + 0.1 * Math.sin(3 * i)).toFixed(3)),
);
const imbalanceWm2 = warmingK.map((value, i) =>
  Number((7 - 1.3 * value + 0.2 * Math.cos(2 * i) + (i < 20 ? 0.1 : 0)).toFixed(3)),
);
const plot = { imbalanceWm2, warmingK, doublingDivisor: 2 };

const fitted = {
  forcing: { startYear: 1960, wm2: forcingWm2 },
  temperature: {
    years: forcingWm2.map((_, i) => 1960 + i),
    values: forcingWm2.map((f, i) => Number((0.45 * f + 0.1 * Math.sin(2.3 * i)).toFixed(3))),
  },
  heatUptake: {
    years: forcingWm2.map((_, i) => 1960 + i),
    values: forcingWm2.map((f, i) => Number((0.4 * f + 0.2 * Math.cos(1.7 * i)).toFixed(3))),
  },
  temperatureOffset: 'fitted',
  heatCapacity: 8,
  deepHeatCapacity: 100,
  efficacy: 1.2,
  doublingWm2: 3.9,
  levelPercent: 95,
};
const part = ({ years, values }: typeof fitted.temperature, from: number) => ({
  years: years.slice(from),
  values: values.slice(from),
});

const valid = {
  'two-layer': { ...layers, forcing: annual, years: [1, 2.5, 40], doublingWm2: 3.9 },
  'two-layer-ensemble': {
    ...layers,
    feedback: [0.8, 1, 1.2, 1.6],
    exchange: [0.9, 0.6, 0.7, 0.5],
    forcing: annual,
    years: [10, 40],
    doublingWm2: 3.9,
  },
  'two-layer-fit': fitted,
  gregory: plot,
  'coupled-slope': { ...loop, simulation: { draws: 1000, seed: 5 } },
} as const;
type Method = keyof typeof valid;
const methods = Object.keys(valid) as Method[];

testMethods(compute, valid);

it.each(methods)('compute %s gives the same digits again', async (method) => {
  expect(await compute(method, valid[method])).toEqual(await compute(method, valid[method]));
});

const parameters: TriedParameter<Method>[] = [
  ['two-layer', 'heatCapacity', [{ heatCapacity: 6 }, { heatCapacity: 10 }]],
  ['two-layer', 'deepHeatCapacity', [{ deepHeatCapacity: 60 }, { deepHeatCapacity: 200 }]],
  ['two-layer', 'exchange', [{ exchange: 0.5 }, { exchange: 1 }]],
  ['two-layer', 'feedback', [{ feedback: 0.8 }, { feedback: 1.6 }]],
  ['two-layer', 'efficacy', [{ efficacy: 0.9 }, { efficacy: undefined }]],
  ['two-layer', 'forcing', [{ forcing: { kind: 'step', wm2: 4 } }, { forcing: { kind: 'ramp', wm2PerYr: 0.05 } }]],
  ['two-layer', 'years', [{ years: [3] }, { years: [4] }]],
  ['two-layer', 'doublingWm2', [{ doublingWm2: 3.7 }, { doublingWm2: undefined }]],
  ['two-layer-ensemble', 'heatCapacity', [{ heatCapacity: [5, 6, 7, 9] }, { heatCapacity: 10 }]],
  ['two-layer-ensemble', 'deepHeatCapacity', [{ deepHeatCapacity: [50, 60, 70, 90] }, { deepHeatCapacity: 90 }]],
  ['two-layer-ensemble', 'exchange', [{ exchange: [0.4, 0.6, 0.7, 0.5] }, { exchange: 0.6 }]],
  ['two-layer-ensemble', 'feedback', [{ feedback: [0.8, 1, 1.3, 1.6] }, { feedback: 0.7 }]],
  ['two-layer-ensemble', 'efficacy', [{ efficacy: [0.8, 1, 1.3, 1.6] }, { efficacy: undefined }]],
  [
    'two-layer-ensemble',
    'forcing',
    [{ forcing: { kind: 'step', wm2: 4 } }, { forcing: { kind: 'ramp', wm2PerYr: 0.05 } }],
  ],
  ['two-layer-ensemble', 'years', [{ years: [3] }, { years: [4] }]],
  ['two-layer-ensemble', 'probabilities', [{ probabilities: [0.1, 0.5] }, { probabilities: [0.2, 0.5] }]],
  ['two-layer-ensemble', 'doublingWm2', [{ doublingWm2: [3.7, 3.8, 3.9, 4] }, { doublingWm2: 3.5 }]],
  [
    'two-layer-fit',
    'forcing',
    [
      { forcing: { startYear: 1960, wm2: forcingWm2.map((f) => 1.2 * f) } },
      { forcing: { startYear: 1959, wm2: [0, ...forcingWm2] } },
    ],
  ],
  [
    'two-layer-fit',
    'temperature',
    [{ temperature: part(fitted.temperature, 5) }, { temperature: part(fitted.temperature, 10) }],
  ],
  ['two-layer-fit', 'heatUptake', [{ heatUptake: part(fitted.heatUptake, 5) }, { heatUptake: undefined }]],
  ['two-layer-fit', 'temperatureOffset', [{ temperatureOffset: 'zero' }, { temperatureOffset: 'fitted' }]],
  ['two-layer-fit', 'heatCapacity', [{ heatCapacity: 5 }, { heatCapacity: 'fitted' }]],
  ['two-layer-fit', 'deepHeatCapacity', [{ deepHeatCapacity: 60 }, { deepHeatCapacity: 200 }]],
  ['two-layer-fit', 'efficacy', [{ efficacy: 1.5 }, { efficacy: undefined }]],
  ['two-layer-fit', 'doublingWm2', [{ doublingWm2: 3.7 }, { doublingWm2: 3.5 }]],
  ['two-layer-fit', 'levelPercent', [{ levelPercent: 66 }, { levelPercent: 90 }]],
  ['gregory', 'years', [{ years: warmingK.map((_, i) => i + 5) }, { years: undefined }]],
  [
    'gregory',
    'split',
    [5, 12].map((to) => ({ split: { early: { from: 1, to }, late: { from: 21, to: 40 } } })) as [object, object],
  ],
  ['gregory', 'doublingDivisor', [{ doublingDivisor: 2.1 }, { doublingDivisor: 1 }]],
  [
    'gregory',
    'covariance',
    [2, 5].map((lag) => ({ covariance: { kind: 'newey-west', lag, smallSample: false } })) as [object, object],
  ],
  [
    'gregory',
    'smallSample',
    [true, false].map((smallSample) => ({ covariance: { kind: 'newey-west', lag: 3, smallSample } })) as [
      object,
      object,
    ],
  ],
  ['gregory', 'delta', [{ delta: 0.5 }, { delta: 3 }]],
  ['coupled-slope', 'response', [{ response: 2 }, { response: 3 }]],
  ['coupled-slope', 'exchange', [{ exchange: 11 }, { exchange: 40 }]],
  ['coupled-slope', 'sdTemperature', [{ sdTemperature: 0.2 }, { sdTemperature: 0.4 }]],
  ['coupled-slope', 'sdCarbon', [{ sdCarbon: 0.02 }, { sdCarbon: 0.1 }]],
  ['coupled-slope', 'draws', [{ simulation: { draws: 500, seed: 5 } }, { simulation: { draws: 700, seed: 5 } }]],
  ['coupled-slope', 'seed', [{ simulation: { draws: 500, seed: 6 } }, { simulation: { draws: 500, seed: 7 } }]],
];

testParameters(compute, valid, parameters);

const bad: [Method, string, object, Partial<ErrorAnswer>][] = [
  ['two-layer', 'a feedback with the other sign', { feedback: -1.2 }, { code: 'no-restoring-feedback' }],
  ['two-layer', 'a heat capacity in J', { heatCapacity: 2.5e9 }, { code: 'out-of-range' }],
  ['two-layer', 'a negative efficacy', { efficacy: -1 }, { code: 'out-of-range', where: 'twoLayer, efficacy' }],
  ['two-layer', 'a time behind the forcing', { years: [41] }, { code: 'out-of-range', where: 'twoLayer, years[0]' }],
  ['two-layer', 'a doubling that cools', { doublingWm2: -3.7 }, { code: 'out-of-range' }],
  ['two-layer', 'another kind of forcing', { forcing: { kind: 'pulse', wm2: 1 } }, { code: 'input-form' }],
  ['two-layer', 'a missing year', { forcing: { kind: 'annual', wm2: [1, null] } }, { code: 'input-form' }],
  ['two-layer-ensemble', 'columns of two lengths', { exchange: [0.5, 0.6] }, { code: 'wrong-length' }],
  ['two-layer-ensemble', 'a member that runs away', { feedback: [1, 1, 0, 1] }, { code: 'no-restoring-feedback' }],
  ['two-layer-ensemble', 'half a year', { years: [2.5] }, { code: 'out-of-range' }],
  ['two-layer-ensemble', 'years that go back', { years: [4, 3] }, { code: 'unordered-years' }],
  ['two-layer-fit', 'no record', { temperature: undefined, heatUptake: undefined }, { code: 'no-record' }],
  [
    'two-layer-fit',
    'years beyond the forcing',
    { forcing: { startYear: 1961, wm2: forcingWm2 } },
    { code: 'outside-forcing' },
  ],
  ['two-layer-fit', 'too few years', { temperature: part(fitted.temperature, 32) }, { code: 'too-few-values' }],
  ['two-layer-fit', 'no doubling', { doublingWm2: undefined }, { code: 'input-form' }],
  ['gregory', 'two years', { imbalanceWm2: [7, 6], warmingK: [0, 1] }, { code: 'too-few-values' }],
  ['gregory', 'columns of different lengths', { warmingK: warmingK.slice(1) }, { code: 'wrong-length' }],
  ['gregory', 'years that go back', { years: warmingK.map((_, i) => 40 - i) }, { code: 'unordered-years' }],
  ['gregory', 'a warming that stays', { warmingK: warmingK.map(() => 2) }, { code: 'rank-deficient' }],
  ['gregory', 'a divisor of zero', { doublingDivisor: 0 }, { code: 'out-of-range', where: 'gregory, doublingDivisor' }],
  [
    'gregory',
    'a lag beyond the rows',
    { covariance: { kind: 'newey-west', lag: 40, smallSample: false } },
    { code: 'out-of-range' },
  ],
  ['coupled-slope', 'a loop that runs away', { exchange: 1.2 }, { code: 'runaway', where: 'coupledSlope, response' }],
  ['coupled-slope', 'nothing that varies', { sdTemperature: 0, sdCarbon: 0 }, { code: 'no-variation' }],
  ['coupled-slope', 'too few draws', { simulation: { draws: 3, seed: 1 } }, { code: 'input-form' }],
];

it.each(bad)('compute %s refuses %s', async (method, _, change, expected) => {
  const { value, error } = await compute(method, { ...valid[method], ...change });
  expect(value).toBeUndefined();
  expect(error).toMatchObject(expected);
  expect(error?.expected).not.toBe('');
  expect(error?.received).not.toBe('');
});
