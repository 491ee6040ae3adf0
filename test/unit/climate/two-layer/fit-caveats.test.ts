import { expect, it } from 'vitest';
import { fitCaveats } from '../../../../src-main/climate/two-layer/fit-caveats.ts';

type Doubts = Parameters<typeof fitCaveats>[0];
const record = {
  values: new Float64Array(10),
  rows: new Int32Array(10),
  steps: new Float64Array(10),
  hasOffset: false,
};
const errors = { level: 0, rho: 0.5, sigma: 0.1, logLikelihood: 1, model: new Float64Array(10) };
const parameters = { heatCapacity: 8, deepHeatCapacity: 100, exchange: 0.7, feedback: 1.2, efficacy: 1.3 };
const calm: Doubts = {
  problem: {
    wm2: new Float64Array(10),
    temperature: record,
    heatUptake: record,
    heatCapacity: null,
    deepHeatCapacity: null,
    efficacy: 1.3,
  },
  fit: { parameters, logLikelihood: 2, temperature: errors, heatUptake: errors },
  profiles: { feedback: { low: 1, high: 2 }, exchange: { low: 0.1, high: 2 }, fallAtZeroFeedback: 4 },
  fallOfInterval: 1.92,
  isEcsBoundedAbove: true,
  ecsHighK: 20,
  summit: { nClimbs: 6, nAtTop: 6 },
};
const codes = (change: Partial<Doubts>) => fitCaveats({ ...calm, ...change }).map(({ code }) => code);
const known = 'forcing-taken-as-known';

it('fitCaveats always names what was taken as known, and nothing else without reason', () => {
  expect(codes({})).toEqual([known]);
});

it.each<[string, Partial<Doubts>]>([
  ['ecs-unbounded-above', { isEcsBoundedAbove: false }],
  ['ecs-hardly-bounded', { ecsHighK: 20.1 }],
  ['feedback-unbounded', { profiles: { ...calm.profiles, feedback: { low: 1, high: null } } }],
  ['exchange-unbounded', { profiles: { ...calm.profiles, exchange: { low: 1, high: null } } }],
  ['one-record', { problem: { ...calm.problem, heatUptake: null } }],
  ['near-unit-root', { fit: { ...calm.fit, temperature: { ...errors, rho: 0.96 } } }],
  ['several-summits', { summit: { nClimbs: 6, nAtTop: 5 } }],
])('fitCaveats: %s', (code, change) => {
  expect(codes(change)).toEqual([code, known]);
});

it('fitCaveats: a fitted heat capacity at its bound, a given one not', () => {
  const fit = { ...calm.fit, parameters: { ...parameters, deepHeatCapacity: 4990 } };
  expect(codes({ fit })).toEqual(['heat-capacity-at-bound', known, 'outside-published']);
  expect(codes({ fit, problem: { ...calm.problem, deepHeatCapacity: 4990 } })).toEqual([known, 'outside-published']);
});
