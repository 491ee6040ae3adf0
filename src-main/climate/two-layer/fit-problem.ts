import type { TwoLayerFitInput } from '../../contract/climate-response.ts';
import { InputError } from '../../errors.ts';
import { finiteNumber, finiteValues } from '../../statistics/finite-values.ts';
import { yearSteps } from '../../statistics/year-steps.ts';
import { checkForcing } from './check-forcing.ts';
import { checkParameter } from './check-parameters.ts';
import type { FitProblem, FitRecord } from './fit-likelihood.ts';

const CALLER = 'twoLayerFit';
/** Four to eight numbers are fitted; with fewer rows they could take any shape. */
const FEWEST_ROWS = 10;

/**
 * The door of `twoLayerFit`: the records as rows of the forcing series.
 *
 * @throws   InputError no-record, too-few-values, wrong-length, not-finite, unordered-years, outside-forcing, out-of-range
 *
 * Checked  test/unit/climate/two-layer/fit-problem.test.ts (C: rows and steps by hand; each refusal)
 */
export function fitProblem(input: TwoLayerFitInput): FitProblem {
  const { forcing, temperature, heatUptake, heatCapacity, deepHeatCapacity, efficacy = 1 } = input;
  checkForcing(CALLER, { kind: 'annual', wm2: forcing.wm2 });
  finiteNumber(CALLER, 'doublingWm2', input.doublingWm2, { above: 0, atMost: 1e6 });
  finiteNumber(CALLER, 'levelPercent', input.levelPercent, { atLeast: 50, atMost: 99.9 });
  if (heatCapacity !== 'fitted') checkParameter(CALLER, 'heatCapacity', heatCapacity);
  if (deepHeatCapacity !== 'fitted') checkParameter(CALLER, 'deepHeatCapacity', deepHeatCapacity);
  checkParameter(CALLER, 'efficacy', efficacy);
  if (!temperature && !heatUptake) {
    throw new InputError({
      code: 'no-record',
      where: CALLER,
      expected: 'a temperature record, a heat-uptake record, or both',
      received: 'none',
      hint: 'Give temperature or heatUptake as years and values.',
    });
  }
  return {
    wm2: Float64Array.from(forcing.wm2),
    temperature: temperature
      ? recordOf('temperature', temperature, forcing, input.temperatureOffset === 'fitted')
      : null,
    heatUptake: heatUptake ? recordOf('heatUptake', heatUptake, forcing, false) : null,
    heatCapacity: heatCapacity === 'fitted' ? null : heatCapacity,
    deepHeatCapacity: deepHeatCapacity === 'fitted' ? null : deepHeatCapacity,
    efficacy,
  };
}

function recordOf(
  name: string,
  record: { years: readonly number[]; values: readonly number[] },
  { startYear, wm2 }: TwoLayerFitInput['forcing'],
  hasOffset: boolean,
): FitRecord {
  const caller = `${CALLER}, ${name}`;
  const values = finiteValues(caller, 'values', record.values, { atLeast: FEWEST_ROWS });
  const steps = yearSteps(caller, record.years, values.length);
  const endYear = startYear + wm2.length - 1;
  const outside = record.years.filter((year) => year < startYear || year > endYear);
  if (outside.length > 0) {
    throw new InputError({
      code: 'outside-forcing',
      where: `${caller}, years`,
      expected: `years within those of the forcing, ${startYear}–${endYear}`,
      received: `${outside.length} outside, the first ${outside[0]!}`,
      hint: 'Leave those years out, or take a forcing series that spans the record.',
    });
  }
  return { values, rows: Int32Array.from(record.years, (year) => year - startYear), steps, hasOffset };
}
