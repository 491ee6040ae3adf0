import { expect, it } from 'vitest';
import { fitProblem } from '../../../../src-main/climate/two-layer/fit-problem.ts';
import type { TwoLayerFitInput } from '../../../../src-main/contract/climate-response.ts';

const years = [1951, 1952, 1953, 1955, 1956, 1957, 1958, 1959, 1962, 1963];
const values = years.map((year) => (year - 1950) / 50);
const input: TwoLayerFitInput = {
  forcing: { startYear: 1950, wm2: Array.from({ length: 14 }, (_, i) => i / 10) },
  temperature: { years, values },
  temperatureOffset: 'fitted',
  heatCapacity: 8,
  deepHeatCapacity: 'fitted',
  doublingWm2: 3.9,
  levelPercent: 95,
};

it('fitProblem: rows among the years of the forcing, and the distances across gaps', () => {
  const problem = fitProblem(input);
  expect([...problem.temperature!.rows]).toEqual([1, 2, 3, 5, 6, 7, 8, 9, 12, 13]);
  expect([...problem.temperature!.steps]).toEqual([1, 1, 1, 2, 1, 1, 1, 1, 3, 1]);
  expect(problem).toMatchObject({ heatUptake: null, heatCapacity: 8, deepHeatCapacity: null, efficacy: 1 });
  expect(problem.temperature!.hasOffset).toBe(true);
  const other = fitProblem({ ...input, temperatureOffset: 'zero', heatUptake: { years, values }, efficacy: 1.3 });
  expect(other.temperature!.hasOffset).toBe(false);
  expect(other.heatUptake!.hasOffset).toBe(false);
  expect(other.efficacy).toBe(1.3);
});

it.each([
  [{ temperature: undefined }, 'a temperature record, a heat-uptake record, or both'],
  [{ temperature: { years: years.slice(1), values: values.slice(1) } }, 'at least 10 values'],
  [{ temperature: { years, values: values.slice(1).concat(NaN) } }, 'values[9]'],
  [{ temperature: { years: years.slice(1), values } }, 'temperature, years: expected 10 values'],
  [{ temperature: { years: years.toReversed(), values } }, 'years[1]: expected a year after 1963'],
  [
    { heatUptake: { years: years.map((y) => y + 2), values } },
    'the forcing, 1950–1963, but found 2 outside, the first 1964',
  ],
  [{ heatCapacity: -8 }, 'heatCapacity'],
  [{ deepHeatCapacity: 0 }, 'deepHeatCapacity'],
  [{ efficacy: -1 }, 'efficacy'],
  [{ doublingWm2: 0 }, 'doublingWm2'],
  [{ levelPercent: 20 }, 'levelPercent'],
  [{ forcing: { startYear: 1950, wm2: [NaN] } }, 'forcing.wm2[0]'],
])('fitProblem refuses %j', (change, words) => {
  expect(() => fitProblem({ ...input, ...change })).toThrow(words);
});
