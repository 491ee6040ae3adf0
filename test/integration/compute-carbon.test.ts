import { expect, it } from 'vitest';
import type { ErrorAnswer } from '../../src-main/contract/requests.ts';
import { computing, testMethods, testParameters, type TriedParameter } from '../helpers/compute-tests.ts';

const compute = computing();

/** Invented: six years. */
const years = [2001, 2002, 2003, 2004, 2005, 2006];
const fossil = [7, 7.2, 7.5, 7.7, 7.9, 8.1];
const landUse = [1.5, 1.4, 1.6, 1.5, 1.3, 1.4];
const growth = [4, 3.1, 4.9, 3.4, 4.6, 3.8];
const sink = [2, 2.1, 2.2, 2.1, 2.3, 2.2];

const valid = {
  exchange: {
    source: 'weiss1974',
    temperatureC: 15,
    salinity: 35,
    co2Ppm: 280,
    warmingK: 1,
    toPpm: 420,
    revelleFactor: 10,
  },
  'carbon-budget': {
    years,
    fossilGtCPerYr: fossil,
    landUseGtCPerYr: landUse,
    growthGtCPerYr: growth,
    oceanSinkGtCPerYr: sink,
    landSinkGtCPerYr: sink,
    cementCarbonationGtCPerYr: sink.map(() => 0.1),
  },
} as const;
type Method = keyof typeof valid;

testMethods(compute, valid);

const parameters: TriedParameter<Method>[] = [
  ['exchange', 'source', [{ source: 'takahashi1993' }, { source: 'takahashi1993-quadratic' }]],
  ['exchange', 'source', [{ source: 'humphreys2024-fit' }, { source: 'humphreys2024-enthalpy' }]],
  ['exchange', 'source', [{ source: 'henry-vant-hoff' }, { source: 'weiss1974' }]],
  ['exchange', 'temperatureC', [{ temperatureC: 5 }, { temperatureC: 20 }]],
  ['exchange', 'salinity', [{ salinity: 0 }, { salinity: 20 }]],
  ['exchange', 'co2Ppm', [{ co2Ppm: 300 }, { co2Ppm: 400 }]],
  ['exchange', 'warmingK', [{ warmingK: 0.5 }, { warmingK: 2 }]],
  ['exchange', 'toPpm', [{ toPpm: 300 }, { toPpm: 560 }]],
  ['exchange', 'revelleFactor', [{ revelleFactor: 8 }, { revelleFactor: 13 }]],
  ['carbon-budget', 'years', [{ years: years.map((year) => year - 1) }, { fossilGtCPerYr: growth }]],
  ['carbon-budget', 'fossilGtCPerYr', [{ fossilGtCPerYr: fossil.toReversed() }, {}]],
  ['carbon-budget', 'landUseGtCPerYr', [{ landUseGtCPerYr: landUse.toReversed() }, {}]],
  ['carbon-budget', 'growthGtCPerYr', [{ growthGtCPerYr: growth.toReversed() }, {}]],
  ['carbon-budget', 'oceanSinkGtCPerYr', [{ oceanSinkGtCPerYr: sink.toReversed() }, {}]],
  ['carbon-budget', 'landSinkGtCPerYr', [{ landSinkGtCPerYr: sink.toReversed() }, {}]],
  ['carbon-budget', 'cementCarbonationGtCPerYr', [{ cementCarbonationGtCPerYr: sink.map(() => 0.2) }, {}]],
  [
    'carbon-budget',
    'gtCPerPpm',
    [2.12, 2.13].map((gtCPerPpm) => ({ growthGtCPerYr: undefined, growthPpmPerYr: [2, 2, 2, 2, 2, 2], gtCPerPpm })) as [
      object,
      object,
    ],
  ],
];

testParameters(compute, valid, parameters);

const bad: [Method, string, object, Partial<ErrorAnswer>][] = [
  ['exchange', 'kelvin', { temperatureC: 288.15 }, { code: 'suspected-unit', where: 'exchange, temperatureC' }],
  ['exchange', '°F', { temperatureC: 77 }, { code: 'suspected-unit' }],
  ['exchange', 'a temperature below all seas', { temperatureC: -5.5 }, { code: 'suspected-unit' }],
  ['exchange', 'no salinity where it counts', { salinity: undefined }, { code: 'missing-salinity' }],
  ['exchange', 'a negative salinity', { salinity: -1 }, { code: 'out-of-range', where: 'exchange, salinity' }],
  ['exchange', 'a negative concentration', { co2Ppm: -280 }, { code: 'out-of-range', where: 'exchange, co2Ppm' }],
  ['exchange', 'ppb', { toPpm: 420_000 }, { code: 'suspected-unit', where: 'exchange, toPpm' }],
  ['exchange', 'a warming from nowhere', { co2Ppm: undefined, toPpm: undefined }, { code: 'missing-level' }],
  ['exchange', 'a rise from nowhere', { co2Ppm: undefined, warmingK: undefined }, { code: 'missing-level' }],
  ['exchange', 'a temperature as a warming', { warmingK: 288 }, { code: 'suspected-unit' }],
  ['exchange', 'a Revelle factor of zero', { revelleFactor: 0 }, { code: 'out-of-range' }],
  ['exchange', 'another source', { source: 'weiss' }, { code: 'input-form', where: 'exchange.source' }],
  ['carbon-budget', 'columns of different lengths', { landUseGtCPerYr: [1.5] }, { code: 'wrong-length' }],
  ['carbon-budget', 'a missing value', { growthGtCPerYr: [4, null, 4.9, 3.4, 4.6, 3.8] }, { code: 'input-form' }],
  ['carbon-budget', 'GtCO2', { fossilGtCPerYr: fossil.map((value) => 3.664 * value) }, { code: 'suspected-unit' }],
  ['carbon-budget', 'ppm as GtC', { growthGtCPerYr: growth.map((value) => value / 2.124) }, { code: 'suspected-unit' }],
  ['carbon-budget', 'growth twice', { growthPpmPerYr: [2, 2, 2, 2, 2, 2] }, { code: 'input-form' }],
  ['carbon-budget', 'no growth', { growthGtCPerYr: undefined }, { code: 'input-form' }],
  ['carbon-budget', 'years that go back', { years: years.toReversed() }, { code: 'unordered-years' }],
];

it.each(bad)('compute %s refuses %s', async (method, _, change, expected) => {
  const { value, error } = await compute(method, { ...valid[method], ...change });
  expect(value).toBeUndefined();
  expect(error).toMatchObject(expected);
  expect(error?.expected).not.toBe('');
  expect(error?.received).not.toBe('');
});

it('compute exchange answers to the last digit what the law gives', async () => {
  const { value } = await compute('exchange', { source: 'takahashi1993', temperatureC: 25 });
  expect(value).toMatchObject({ kind: 'isochemical', dLnPco2PerK: 0.0423, exchangeCoefficientK: 1 / 0.0423 });
  expect(value).not.toHaveProperty('rise');
});
