import { describe, expect, it } from 'vitest';
import { gregorySensitivity } from '../../../../src-main/climate/procedures/gregory-sensitivity.ts';
import { recompute } from '../../../../src-main/climate/procedures/recompute.ts';
import { twoLayer } from '../../../../src-main/climate/two-layer/two-layer.ts';
import type { Statement } from '../../../../src-main/contract/claim.ts';
import { usualSplit } from '../../../../src-main/contract/climate-response.ts';
import { gregoryProcedure, type GregoryProcedure } from '../../../../src-main/contract/procedure.ts';
import { recomputation } from '../../../../src-main/contract/result.ts';
import type { SeriesData } from '../../../../src-main/contract/series.ts';
import { randomStream } from '../../../../src-main/statistics/random-stream.ts';
import { annualSeries, computationOf } from '../../../helpers/claim-computation.ts';
import { expectClose } from '../../../helpers/close.ts';

const procedure: GregoryProcedure = {
  kind: 'gregory',
  seriesId: 1,
  temperatureSeriesId: 2,
  minMonths: 12,
  window: null,
  split: usualSplit,
  divisor: 2,
  covariance: { kind: 'classical' },
};
const stated: Partial<Statement> = {
  quantity: 'effective-climate-sensitivity',
  unit: 'K per doubling',
  bound: 'equals',
  value: '3.0',
};

// Regressions of the two-layer model after 4×CO2 (CMIP5 mean parameters), worked out apart from this project.
const partI = { heatCapacity: 7.3, deepHeatCapacity: 106, exchange: 0.73, feedback: 1.13, efficacy: 1, wm2: 6.9 };
const partII = { heatCapacity: 8.2, deepHeatCapacity: 109, exchange: 0.67, feedback: 1.18, efficacy: 1.28, wm2: 7.6 };
const tabulated = { rel: 0, abs: 1e-6, why: 'tabulated to six decimals' };

const steps = Array.from({ length: 150 }, (_, row) => row + 1);
const calendar = steps.map((step) => 1849 + step);
function experiment({ wm2, ...parameters } = partII, noise = 0) {
  const stream = randomStream(7, 0);
  const run = twoLayer({ ...parameters, forcing: { kind: 'step', wm2 }, years: steps });
  const noisy = (values: readonly number[], size: number) => values.map((value) => value + size * stream.normal());
  return {
    seriesId: annualSeries('net-flux', 'other', 'W/m²', calendar, noisy(run.imbalanceWm2, noise)),
    temperatureSeriesId: annualSeries('warming', 'temperature-anomaly', 'K', calendar, noisy(run.surfaceK, noise / 4)),
  };
}
const run = (
  change: Partial<GregoryProcedure> = {},
  statement: Partial<Statement> = {},
  series: { seriesId: SeriesData; temperatureSeriesId: SeriesData } = experiment(),
) => {
  const changed = { ...procedure, ...change };
  return gregorySensitivity(computationOf(changed, series, { ...stated, ...statement }), changed);
};
const linesOf = ({ working }: ReturnType<typeof run>) =>
  (working[1]?.rows ?? []).map((row) => [row[1], row[3], row[7]].map(Number));

describe('gregorySensitivity', () => {
  it('gives the sensitivity that the line was tabulated to have, and both parts of it', () => {
    const answer = recompute(computationOf(procedure, experiment(), stated));
    expectClose(answer.value, 3.008994, tabulated);
    expectClose(
      linesOf(answer),
      [
        [7.004362, 1.163904, 3.008994],
        [7.565005, 1.346731, 2.808654],
        [5.986512, 0.930036, 3.218431],
      ],
      tabulated,
    );
    expect(answer.agreement.isReproduced).toBe(true);
    expect([answer.quantity, answer.fit]).toEqual(['effective-climate-sensitivity', null]);
    expect(answer.caveats.map(({ code }) => code)).toContain('curved');
    expect(recomputation.parse(answer)).toEqual(answer);
  });

  it('finds the truth, early and late alike, where the feedback does not change', () => {
    const answer = run({}, {}, experiment(partI));
    expectClose(linesOf(answer), Array<number[]>(3).fill([6.9, 1.13, 3.053097]), tabulated);
    expect(answer.caveats.map(({ code }) => code)).not.toContain('curved');
  });

  it('takes a window and a split: years 21–150 alone, counted anew', () => {
    const answer = run({
      window: { start: 1870, end: 1999 },
      split: { early: { from: 1, to: 65 }, late: { from: 66, to: 130 } },
    });
    expectClose(answer.value, 3.218431, tabulated);
    expect(answer.working[0]?.rows[2]?.[1]).toBe('1870–1999, 130 of them');
    expect(answer.working[1]?.rows.map(([label]) => label)).toEqual([
      'all, 1870–1999 (n = 130)',
      '1–65 (n = 65)',
      '66–130 (n = 65)',
    ]);
  });

  it('divides the equilibrium, its error and its interval by what the claim divides by', () => {
    const series = experiment(partII, 0.3);
    const [two, other] = [run({}, {}, series), run({ divisor: 2.1 }, {}, series)];
    const exact = { rel: 1e-12, abs: 0, why: 'the same figures over another divisor' };
    for (const of of [
      ({ value }: typeof two) => value,
      ({ standardError }: typeof two) => standardError ?? NaN,
      ({ interval }: typeof two) => interval?.low ?? NaN,
      ({ interval }: typeof two) => interval?.high ?? NaN,
    ]) {
      expectClose(of(two), (of(other) * 2.1) / 2, exact);
    }
    expect(two.interval?.levelPercent).toBe(95);
    expect(two.interval?.low).toBeLessThan(two.value);
    expect(two.interval?.high).toBeGreaterThan(two.value);
    expect(two.caveats.find(({ code }) => code === 'divisor-convention')?.detail).toContain('2.1');
    expect(other.caveats.map(({ code }) => code)).not.toContain('divisor-convention');
  });

  it('gives °F where the source does', () => {
    expectClose(run({}, { unit: '°F per doubling', value: '5.4' }).value, 1.8 * 3.008994, { ...tabulated, abs: 2e-6 });
  });

  it('reads a warming in °F and an imbalance in mW/m²', () => {
    const { seriesId, temperatureSeriesId } = experiment();
    const scaled = (series: SeriesData, unit: string, factor: number): SeriesData => ({
      ...series,
      unit,
      values: { ...series.values, values: series.values.values.map((value) => (value ?? NaN) * factor) },
    });
    const series = {
      seriesId: scaled(seriesId, 'mW/m²', 1000),
      temperatureSeriesId: scaled(temperatureSeriesId, '°F', 1.8),
    };
    expectClose(run({}, {}, series).value, 3.008994, tabulated);
  });

  it('brackets the line between scatter in N alone and in ΔT alone', () => {
    const { working } = run({}, {}, experiment(partII, 0.5));
    const [inN = NaN, inT = NaN, inBoth = NaN] = (working[2]?.rows ?? []).map((row) => Number(row[2]));
    expect(inN).toBeLessThan(inBoth);
    expect(inBoth).toBeLessThan(inT);
  });

  it('widens with Newey–West where the claim asks for it, and says so', () => {
    const series = experiment(partII, 0.3);
    const answer = run({ covariance: { kind: 'newey-west', lag: 8, smallSample: false } }, {}, series);
    expect(answer.standardError).not.toBe(run({}, {}, series).standardError);
    expect(answer.working[3]?.rows[0]?.[0]).toMatch(/Newey–West, lag 8, without/);
  });

  it('gives no number where the equilibrium cannot be told from unbounded', () => {
    const { seriesId, temperatureSeriesId } = experiment();
    const turned = { ...seriesId.values, values: seriesId.values.values.map((value) => -(value ?? NaN)) };
    expect(() => run({}, {}, { temperatureSeriesId, seriesId: { ...seriesId, values: turned } })).toThrow(
      /an imbalance that falls as it warms, by more than its scatter.*heat gained counts as positive/s,
    );
  });

  it('gives no negative sensitivity where the line has no forcing', () => {
    const { seriesId, temperatureSeriesId } = experiment();
    const lowered = { ...seriesId.values, values: seriesId.values.values.map((value) => (value ?? NaN) - 8) };
    expect(() => run({}, {}, { temperatureSeriesId, seriesId: { ...seriesId, values: lowered } })).toThrow(
      /a forcing above 0/,
    );
  });

  it('refuses absolute temperatures, whose zero is no climate', () => {
    const { seriesId, temperatureSeriesId } = experiment();
    const absolute = { ...temperatureSeriesId, quantity: 'temperature' as const };
    expect(() => run({}, {}, { seriesId, temperatureSeriesId: absolute })).toThrow(
      /series warming: expected a warming/,
    );
  });

  it('says that a forcing is no imbalance', () => {
    const series = experiment();
    const ofCo2 = { ...series, seriesId: { ...series.seriesId, quantity: 'forcing' as const, agent: 'co2' } };
    expect(run({}, {}, ofCo2).caveats.map(({ code }) => code)).toContain('imbalance-of-an-agent');
    expect(run({}, {}, series).caveats.map(({ code }) => code)).not.toContain('imbalance-of-an-agent');
  });

  it('names the zero of the warming', () => {
    const series = experiment();
    const based = { ...series.temperatureSeriesId, baseline: { start: 1800, end: 1849 } };
    const details = run({}, {}, { ...series, temperatureSeriesId: based }).caveats.map(({ detail }) => detail);
    expect(details.join()).toContain('warming has it, against 1800–1849');
  });

  it('refuses a statement in another unit, and a split whose ends are turned round', () => {
    expect(() => run({}, { unit: 'W/m²' })).toThrow(/K per doubling/);
    const turned = { ...procedure, split: { ...usualSplit, early: { from: 20, to: 1 } } };
    expect(gregoryProcedure.safeParse(turned).success).toBe(false);
  });
});
