import { describe, expect, it } from 'vitest';
import { twoLayerTables } from '../../../src-main/quantities/two-layer-tables.ts';
import { mean } from '../../../src-main/statistics/summation.ts';
import { expectClose, type Tolerance } from '../../helpers/close.ts';

const tables = Object.fromEntries(twoLayerTables.map((table) => [table.id, table]));
const columns = [
  'quadruplingWm2',
  'feedback',
  'quadruplingK',
  'heatCapacity',
  'deepHeatCapacity',
  'exchange',
  'efficacy',
] as const;
const meansOf = (id: string): number[] => columns.map((name) => mean(tables[id]!.models.map((model) => model[name])));
const printed = (abs: number): Tolerance => ({ rel: 0, abs, why: 'half a unit of the last printed digit' });

describe('the published two-layer parameters', () => {
  it('have as many models as the publications, each once, with where they come from', () => {
    expect(twoLayerTables.map(({ id, models }) => [id, models.length])).toEqual([
      ['geoffroy-2013a-cmip5', 16],
      ['geoffroy-2013b-cmip5', 16],
      ['ar6-cmip6', 35],
    ]);
    for (const { models, source, provenance } of twoLayerTables) {
      expect(new Set(models.map(({ model }) => model)).size).toBe(models.length);
      expect(source).not.toBe('');
      expect(['seen', 'second-hand']).toContain(provenance);
    }
  });

  it('part I has the mean row of the paper (from memory): 6.9, 1.13, 6.5, 7.3, 106, 0.73', () => {
    const [quadrupling, feedback, warming, shallow, deep, exchange, efficacy] = meansOf('geoffroy-2013a-cmip5');
    expectClose([quadrupling, warming, shallow], [6.9, 6.5, 7.3], printed(0.0501));
    expectClose([feedback, exchange], [1.13, 0.73], printed(0.00501));
    expectClose(deep, 106, printed(0.501));
    expect(efficacy).toBe(1);
  });

  it('part II has the means 7.63, 1.184, 6.98, 8.18, 108.9, 0.672, 1.277, worked out apart', () => {
    const means = meansOf('geoffroy-2013b-cmip5');
    const [quadrupling, feedback, warming, shallow, deep, exchange, efficacy] = means;
    expectClose([quadrupling, warming, shallow], [7.63, 6.98, 8.18], printed(0.00501));
    expectClose([feedback, exchange, efficacy], [1.184, 0.672, 1.277], printed(0.000501));
    expectClose(deep, 108.9, printed(0.0501));
  });

  it('CMIP6 has the means 7.7791, 1.06342, 8.14422, 109.6254, 0.617434, 1.341251, worked out apart', () => {
    const [quadrupling, feedback, , shallow, deep, exchange, efficacy] = meansOf('ar6-cmip6');
    expectClose([quadrupling, deep], [7.7791, 109.6254], printed(0.0000501));
    expectClose([feedback, shallow], [1.06342, 8.14422], printed(0.00000501));
    expectClose([exchange, efficacy], [0.617434, 1.341251], printed(0.000000501));
  });

  it.each([
    // The tables are rounded to two digits; the copy of CMIP6 to five.
    ['geoffroy-2013a-cmip5', 0.11],
    ['geoffroy-2013b-cmip5', 0.11],
    ['ar6-cmip6', 1e-5],
  ])('%s: F/λ is the printed equilibrium warming within %d K', (id, abs) => {
    for (const { model, quadruplingWm2, feedback, quadruplingK } of tables[id]!.models) {
      expectClose(quadruplingWm2 / feedback, quadruplingK, { rel: 0, abs, why: 'rounding of the table' }, model);
    }
  });
});
