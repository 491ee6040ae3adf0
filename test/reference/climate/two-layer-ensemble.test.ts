import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { annualEnsemble, readStates, runYears } from '../../../src-main/climate/two-layer/annual-ensemble.ts';
import { ensembleStates } from '../../../src-main/climate/two-layer/ensemble-states.ts';
import { memberAt, memberColumns } from '../../../src-main/climate/two-layer/member-columns.ts';
import { twoLayer } from '../../../src-main/climate/two-layer/two-layer.ts';
import { twoLayerEnsemble } from '../../../src-main/climate/two-layer/two-layer-ensemble.ts';
import type { ResponseForcing, TwoLayerEnsembleInput } from '../../../src-main/contract/climate-response.ts';
import { twoLayerTables } from '../../../src-main/quantities/two-layer-tables.ts';
import { randomStream } from '../../../src-main/statistics/random-stream.ts';
import { expectClose } from '../../helpers/close.ts';
import { startR, type RSession } from '../../helpers/r-session.ts';

let r: RSession;
beforeAll(async () => {
  r = await startR(new URL('./two-layer.R', import.meta.url));
});
afterAll(() => r.close());

const forcingWm2 = Array.from({ length: 160 }, (_, i) => 4 * (i / 160) ** 2 - (i % 31 === 9 ? 2.5 : 0));
const annual: ResponseForcing = { kind: 'annual', wm2: forcingWm2 };
const kinds: [string, ResponseForcing, number[]][] = [
  ['annual', annual, [0, 1, 2, 50, 50, 160]],
  ['step', { kind: 'step', wm2: 7.4 }, [0, 0.5, 10, 500]],
  ['ramp', { kind: 'ramp', wm2PerYr: 0.05 }, [0, 20, 70.5]],
];

/** All published models, with the corners that a modal form could stumble over: equal rates, no exchange. */
const models = [
  ...twoLayerTables.flatMap((table) => table.models),
  { heatCapacity: 10, deepHeatCapacity: 20, exchange: 2, feedback: 1, efficacy: 0 },
  { heatCapacity: 8, deepHeatCapacity: 100, exchange: 0, feedback: 1, efficacy: 1 },
];
const published = {
  heatCapacity: models.map((model) => model.heatCapacity),
  deepHeatCapacity: models.map((model) => model.deepHeatCapacity),
  exchange: models.map((model) => model.exchange),
  feedback: models.map((model) => model.feedback),
  efficacy: models.map((model) => model.efficacy),
};
const columns = memberColumns('test', published);
const rounding = { rel: 1e-12, abs: 1e-13, why: 'another order of some hundred sums' };

describe('the members of an ensemble', () => {
  it.each(kinds)('are each as twoLayer has them: %s', (_, forcing, years) => {
    const states = ensembleStates(columns, forcing, years.at(-1)!);
    const alone = models.map((_model, m) => twoLayer({ ...memberAt(columns, m), forcing, years }));
    years.forEach((year, i) => {
      states.moveTo(year);
      const expected = { surfaceK: alone.map((run) => run.surfaceK[i]!), deepK: alone.map((run) => run.deepK[i]!) };
      expectClose({ surfaceK: states.surfaceK, deepK: states.deepK }, expected, rounding, `year ${year}`);
    });
  });

  it('annualEnsemble, runYears, readStates: the same digits wherever the years and the members are cut', () => {
    const wm2 = Float64Array.from(forcingWm2);
    const run = (from: number, to: number, cuts: number[]) => {
      const part = Object.fromEntries(Object.entries(columns).map(([name, column]) => [name, column.slice(from, to)]));
      const ensemble = annualEnsemble(part as unknown as typeof columns);
      cuts.forEach((cut, i) => runYears(ensemble, wm2.subarray(cuts[i - 1] ?? 0, cut)));
      const states = [new Float64Array(to - from), new Float64Array(to - from)] as const;
      readStates(ensemble, ...states);
      return states.map((state) => [...state]);
    };
    const whole = run(0, models.length, [160]);
    expect(run(0, models.length, [1, 7, 100, 160])).toEqual(whole);
    const [first, second] = [run(0, 33, [160]), run(33, models.length, [160])];
    expect(first.map((state, i) => [...state, ...second[i]!])).toEqual(whole);
  });
});

describe('twoLayerEnsemble', () => {
  it.each(kinds)('has R’s quantiles of its members, in warming and imbalance: %s', async (_, forcing, years) => {
    const probabilities = [0, 0.05, 0.3, 0.5, 0.95, 1];
    const answer = twoLayerEnsemble({ ...published, forcing, years, probabilities, doublingWm2: 3.9 });
    const alone = models.map((_model, m) => twoLayer({ ...memberAt(columns, m), forcing, years, doublingWm2: 3.9 }));
    const quantilesOfR = async (values: number[]) => {
      const { q } = await r.numbers('list(q = quantile(v, p, names = FALSE))', { v: values, p: probabilities });
      return q;
    };
    for (const [i, year] of years.entries()) {
      expectClose(answer.surfaceK[i], await quantilesOfR(alone.map((run) => run.surfaceK[i]!)), rounding, `T ${year}`);
      const imbalance = await quantilesOfR(alone.map((run) => run.imbalanceWm2[i]!));
      expectClose(answer.imbalanceWm2[i], imbalance, { ...rounding, abs: 1e-12 }, `N ${year}`);
    }
    expectClose(answer.ecsK, await quantilesOfR(alone.map((run) => run.ecsK!)), rounding);
    expectClose(answer.tcrK, await quantilesOfR(alone.map((run) => run.tcrK!)), rounding);
  });

  it('has R’s states for one member: exp of the matrix by eigen', async () => {
    const one = { heatCapacity: 7.3, deepHeatCapacity: 106, exchange: 0.73, feedback: 1.13, efficacy: 1.2 };
    const { surface } = await r.numbers(
      'annual_response(two_layer_matrix(7.3, 106, 0.73, 1.13, 1.2), 7.3, wm2)["surface"]',
      { wm2: forcingWm2 },
    );
    const years = forcingWm2.map((_, i) => i + 1);
    const { surfaceK } = twoLayerEnsemble({ ...one, forcing: annual, years, probabilities: [0.5] });
    expectClose(surfaceK.flat(), surface, { rel: 1e-10, abs: 1e-12, why: 'two programs' });
  });

  it('does not depend on the order of the members, and reports on the way', () => {
    const stream = randomStream(12, 0);
    const draw = (low: number, high: number) =>
      Array.from({ length: 10_001 }, () => low + (high - low) * stream.uniform());
    const many: TwoLayerEnsembleInput = {
      heatCapacity: draw(5, 10),
      deepHeatCapacity: draw(60, 150),
      exchange: draw(0.4, 1),
      feedback: draw(0.6, 1.8),
      efficacy: 1.2,
      forcing: annual,
      years: [40, 160],
    };
    const shares: number[] = [];
    const answer = twoLayerEnsemble(many, (share) => shares.push(share));
    const turned = (values: unknown) => (values as number[]).toReversed();
    const backwards = twoLayerEnsemble({
      ...many,
      heatCapacity: turned(many.heatCapacity),
      deepHeatCapacity: turned(many.deepHeatCapacity),
      exchange: turned(many.exchange),
      feedback: turned(many.feedback),
    });
    expect(backwards).toEqual(answer);
    expect(answer).toMatchObject({ nMembers: 10_001, probabilities: [0.05, 0.17, 0.5, 0.83, 0.95], ecsK: null });
    expect(shares.length).toBeGreaterThanOrEqual(4);
    expect(shares).toEqual([...shares].sort((a, b) => a - b));
    expect(shares.at(-1)).toBe(1);
    const stop = () => {
      throw new Error('cancelled');
    };
    expect(() => twoLayerEnsemble(many, stop)).toThrow('cancelled');
  });

  it.each([
    [{ years: [1.5] }, 'a whole number'],
    [{ years: [161] }, 'at most 160'],
    [{ years: [5, 4] }, 'years[1]: expected a number from 5 on'],
    [{ probabilities: [0.5, 0.05] }, 'probabilities[1]'],
    [{ probabilities: [1.5] }, 'at most 1'],
    [{ feedback: [1, 2] }, 'feedback: expected one value'],
    [{ feedback: -1 }, 'feedback[0]'],
    [{ doublingWm2: [3.9] }, 'doublingWm2'],
    [{ doublingWm2: 0 }, 'a number above 0'],
  ])('refuses %o', (change, words) => {
    expect(() => twoLayerEnsemble({ ...published, forcing: annual, years: [10], ...change })).toThrow(words);
  });
});
