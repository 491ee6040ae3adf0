import { readFileSync } from 'node:fs';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { adf } from '../../../src-main/statistics/adf.ts';
import { dickeyFullerT } from '../../../src-main/statistics/dickey-fuller-t.ts';
import { engleGranger } from '../../../src-main/statistics/engle-granger.ts';
import { kpss } from '../../../src-main/statistics/kpss.ts';
import { criticalSurfaces, pValueSurfaces, type Deterministic } from '../../../src-main/statistics/mackinnon-tables.ts';
import { mackinnonCritical, mackinnonP } from '../../../src-main/statistics/mackinnon.ts';
import { expectClose } from '../../helpers/close.ts';
import { startR, type RSession } from '../../helpers/r-session.ts';
import { co2AndTemperature } from '../../helpers/real-series.ts';

let r: RSession;
beforeAll(async () => {
  r = await startR(new URL('./unit-root.R', import.meta.url));
});
afterAll(() => r.close());

const near = { rel: 1e-9, abs: 0, why: 'two double-precision programs; a t statistic of a nearly collinear level' };
const printed = (digits: number) => ({
  rel: 0,
  abs: 0.5 * 10 ** -digits,
  why: 'half a unit of the last printed digit',
});

async function series(): Promise<number[][]> {
  const { lake = [], nile = [] } = await r.numbers('list(lake = LakeHuron, nile = Nile)');
  return [lake, nile, co2AndTemperature().temperatureK];
}

describe('adf', () => {
  // Level B: base R, beside this file.
  it('base R: no lags, one, four; nothing, a constant, a trend', async () => {
    for (const y of await series()) {
      for (const lags of [0, 1, 4]) {
        for (const deterministic of ['none', 'constant', 'trend'] as const) {
          const { statistic, nObs, p, critical, caveats } = adf({ y, lags, deterministic });
          expect(caveats).toEqual([]);
          const fromR = await r.numbers('adf_statistic(y, lags, deterministic)', { y, lags, deterministic });
          expectClose({ statistic: [statistic], nObs: [nObs] }, fromR, near);
          expect(dickeyFullerT('adf', Float64Array.from(y), lags, deterministic)).toEqual({ statistic, nObs });
          expect(p).toBe(mackinnonP(statistic, deterministic));
          expect(critical).toEqual(mackinnonCritical(deterministic, nObs));
        }
      }
    }
  });

  it.each([
    ['an exact line', { y: [1, 2, 3, 4, 5, 6, 7, 8], lags: 0, deterministic: 'constant' }, 'adf'],
    [
      'more lags than the series bears',
      { y: [1, 3, 2, 5, 4, 6, 8, 7], lags: 3, deterministic: 'constant' },
      'adf, lags',
    ],
    ['half a lag', { y: [1, 3, 2, 5, 4, 6, 8, 7], lags: 0.5, deterministic: 'none' }, 'a whole number'],
    ['five values', { y: [1, 3, 2, 5, 4], lags: 0, deterministic: 'none' }, 'at least 6'],
    ['a missing value', { y: [1, 3, NaN, 5, 4, 2], lags: 0, deterministic: 'none' }, 'adf, y[2]'],
  ] as const)('refuses %s', (_, request, sentence) => expect(() => adf(request)).toThrow(sentence));
});

describe('kpss', () => {
  it('base R: no lags, three, ten; level and trend', async () => {
    for (const y of await series()) {
      for (const lags of [0, 3, 10]) {
        for (const deterministic of ['constant', 'trend'] as const) {
          const { statistic } = kpss({ y, lags, deterministic });
          expectClose(
            { statistic: [statistic] },
            await r.numbers('kpss_statistic(y, lags, deterministic)', { y, lags, deterministic }),
            near,
          );
        }
      }
    }
  });

  // Level A: Kwiatkowski et al. 1992, table 1; and statsmodels' printed sunspot figures, from memory.
  it('has the published critical values, and p between them', () => {
    const y = Array.from({ length: 60 }, (_, t) => Math.sin(t * t));
    expect(kpss({ y, lags: 2, deterministic: 'constant' }).critical).toEqual({
      '10%': 0.347,
      '5%': 0.463,
      '2.5%': 0.574,
      '1%': 0.739,
    });
    expect(kpss({ y, lags: 2, deterministic: 'trend' }).critical).toEqual({
      '10%': 0.119,
      '5%': 0.146,
      '2.5%': 0.176,
      '1%': 0.216,
    });
    const found = Array.from({ length: 60 }, (_, i) => {
      const stepped = y.map((value, t) => value + (t > 30 ? i / 60 : 0));
      return kpss({ y: stepped, lags: 2, deterministic: 'constant' });
    });
    const inside = found.filter(({ caveats }) => caveats.length === 0);
    expect(inside.length).toBeGreaterThan(3);
    for (const { statistic, p, critical } of inside) {
      const between = [
        [0.347, 0.1],
        [0.463, 0.05],
        [0.574, 0.025],
        [0.739, 0.01],
      ] as const;
      const i = between.findIndex(([value]) => statistic <= value);
      const [[low, pLow], [high, pHigh]] = [between[i - 1]!, between[i]!];
      expectClose(p, (pLow * (high - statistic) + pHigh * (statistic - low)) / (high - low), { ...near, rel: 1e-12 });
      expect(critical['5%']).toBe(0.463);
    }
  });

  it('says when p lies outside the published table', () => {
    const quiet = Array.from({ length: 40 }, (_, t) => (-1) ** t);
    expect(kpss({ y: quiet, lags: 0, deterministic: 'constant' })).toMatchObject({
      p: 0.1,
      caveats: [{ code: 'p-outside-table' }],
    });
    const climbing = Array.from({ length: 40 }, (_, t) => t + (-1) ** t);
    expect(kpss({ y: climbing, lags: 0, deterministic: 'constant' })).toMatchObject({
      p: 0.01,
      caveats: [{ code: 'p-outside-table' }],
    });
  });

  it.each([
    [
      'a constant',
      { y: [0.1, 0.1, 0.1, 0.1, 0.1], lags: 0, deterministic: 'constant' },
      'kpss: expected residuals that are more',
    ],
    [
      'an exact line',
      { y: [1, 2, 3, 4, 5], lags: 0, deterministic: 'trend' },
      'kpss: expected residuals that are more',
    ],
    ['as many lags as values', { y: [1, 3, 2, 5], lags: 4, deterministic: 'constant' }, 'kpss, lags'],
    ['a missing value', { y: [1, 3, NaN, 5], lags: 0, deterministic: 'constant' }, 'kpss, y[2]'],
  ] as const)('refuses %s', (_, request, sentence) => expect(() => kpss(request)).toThrow(sentence));
});

describe('engleGranger', () => {
  // Level B: base R, beside this file; the distributions are held against their tables below.
  it('base R: no lags, one, four; a constant, a trend; one predictor and two', async () => {
    const { years, co2Ppm, temperatureK } = co2AndTemperature();
    const logRatio = co2Ppm.map((value) => Math.log(value / 300));
    const {
      gdp = [],
      year = [],
      employed = [],
    } = await r.numbers('list(gdp = longley$GNP, year = longley$Population, employed = longley$Employed)');
    const cases = [
      { x: [logRatio], y: temperatureK, most: 4 },
      { x: [logRatio, years.map((value) => Math.sin(value))], y: temperatureK, most: 4 },
      { x: [gdp, year], y: employed, most: 1 },
    ];
    for (const { x, y, most } of cases) {
      for (const lags of [0, 1, most]) {
        for (const deterministic of ['constant', 'trend'] as const) {
          const test = engleGranger({ x, y, lags, deterministic });
          const fromR = await r.numbers('engle_granger_statistic(x, y, lags, deterministic)', {
            x: x.flat(),
            y,
            lags,
            deterministic,
          });
          expectClose({ statistic: [test.statistic], nObs: [test.nObs] }, fromR, near);
          expect(test.nSeries).toBe(x.length + 1);
          expect(test.p).toBe(mackinnonP(test.statistic, deterministic, x.length + 1));
          expect(test.critical).toEqual(mackinnonCritical(deterministic, test.nObs, x.length + 1));
        }
      }
    }
  });

  it('does not know units and levels', () => {
    const { co2Ppm: x, temperatureK: y } = co2AndTemperature();
    const plain = engleGranger({ x, y, lags: 2, deterministic: 'trend' });
    const moved = engleGranger({
      x: x.map((value) => 0.1 * value - 30),
      y: y.map((value) => 1.8 * value + 32),
      lags: 2,
      deterministic: 'trend',
    });
    expectClose(moved, plain, { ...near, rel: 1e-8 });
  });

  const years = Array.from({ length: 12 }, (_, t) => t);
  const wiggle = years.map((t) => Math.sin(t * t));
  const asked = { x: years, y: wiggle, lags: 0, deterministic: 'constant' } as const;
  it.each([
    ['an exact line', { ...asked, y: years.map((t) => 2 + 3 * t) }, 'engleGranger: expected residuals'],
    ['a constant predictor', { ...asked, x: years.map(() => 4) }, 'a constant predictor'],
    ['a trend beside a trend', { ...asked, deterministic: 'trend' as const }, 'none is a combination'],
    ['more lags than the rows bear', { ...asked, lags: 5 }, 'engleGranger, lags'],
    ['six predictors', { ...asked, x: [1, 2, 3, 4, 5, 6].map((k) => years.map((t) => t ** k)) }, 'at most 5 columns'],
    [
      'fewer rows than coefficients',
      { ...asked, x: [1, 2, 3].map((k) => [1, 2, 3, 4, 5].map((t) => t ** k)), y: [1, 3, 2, 5, 4] },
      'at least 6',
    ],
    ['a missing value', { ...asked, x: years.with(3, NaN) }, 'engleGranger, x[3]'],
    ['mismatched lengths', { ...asked, x: years.slice(1) }, 'expected 12 values'],
  ])('refuses %s', (_, request, sentence) => expect(() => engleGranger(request)).toThrow(sentence));
});

describe('missing years', () => {
  const { years, co2Ppm, temperatureK } = co2AndTemperature();
  const consecutive = years.map((_, t) => 1900 + t);
  const series = { y: temperatureK, lags: 1, deterministic: 'constant' } as const;
  it.each([
    ['adf', (given?: number[]) => adf({ ...series, years: given })],
    ['kpss', (given?: number[]) => kpss({ ...series, years: given })],
    ['engleGranger', (given?: number[]) => engleGranger({ ...series, x: co2Ppm, years: given })],
  ] as const)('%s closes gaps up, and says so', (name, run) => {
    const codes = (given?: number[]) => run(given).caveats.map(({ code }) => code);
    const known = codes();
    expect(codes(consecutive)).toEqual(known);
    // 1964 is missing in the record.
    expect(codes(years)).toEqual([...known, 'gaps-closed-up']);
    expect(() => run(years.toReversed())).toThrow(`${name}, years[1]`);
    expect(() => run(years.slice(1))).toThrow(`${name}, years: expected 60 values`);
  });
});

describe('MacKinnon’s surfaces', () => {
  // Level A: the published coefficients, retyped beside this file apart from the source code.
  const table = (name: string) =>
    readFileSync(new URL(name, import.meta.url), 'utf8')
      .trim()
      .split('\n')
      .filter((line) => !line.startsWith('#'))
      .slice(1)
      .map((line) => line.split(','));
  const numbers = (cells: string[]) =>
    cells.filter((cell) => cell !== '').map((cell) => (cell === 'inf' ? Infinity : Number(cell)));

  it('coefficients of 2010 and 1994', () => {
    const critical = table('mackinnon-2010.csv');
    expect(critical).toHaveLength(3 * 13);
    for (const [deterministic, nSeries, level, ...b] of critical) {
      const surface = criticalSurfaces[deterministic as Deterministic][Number(nSeries) - 1];
      expect(surface?.[level as '1%']).toEqual(numbers(b));
    }
    const pieces = table('mackinnon-1994.csv');
    expect(pieces).toHaveLength(2 * 18);
    for (const [deterministic, nSeries, piece, lowest, star, highest, ...c] of pieces) {
      const surface = pValueSurfaces[deterministic as Deterministic][Number(nSeries) - 1];
      expect([surface?.lowest, surface?.star, surface?.highest]).toEqual(numbers([lowest, star, highest].map(String)));
      expect(surface?.[piece as 'small']).toEqual(numbers(c));
    }
  });

  // Level A: asymptotic values of MacKinnon 2010; at T = 100 and 50 computed independently from the same table; Stata's
  // egranger prints the last row for 200 observations.
  it('critical values', () => {
    const at = (...parameters: Parameters<typeof mackinnonCritical>): number[] =>
      Object.values(mackinnonCritical(...parameters));
    expectClose(at('none', 1e9), [-2.56574, -1.941, -1.61682], printed(5));
    expectClose(at('constant', 1e9), [-3.43035, -2.86154, -2.56677], printed(5));
    expectClose(at('trend', 1e9), [-3.95877, -3.41049, -3.12705], printed(5));
    expectClose(at('constant', 1e9, 3), [-4.29374, -3.74066, -3.45218], printed(5));
    expectClose(at('trend', 1e9, 2), [-4.32762, -3.78057, -3.49631], printed(5));
    expectClose(at('constant', 100), [-3.4975, -2.89091, -2.58243], printed(5));
    expectClose(at('constant', 100, 2), [-4.00931, -3.39791, -3.08713], printed(5));
    expectClose(at('constant', 50, 2), [-4.12889, -3.46106, -3.13036], printed(5));
    expectClose(at('constant', 199, 2), [-3.952321, -3.367006, -3.065831], printed(6));
    // Printed by statsmodels for a test with 300 rows, from memory.
    expectClose(at('constant', 300), [-3.452337, -2.871223, -2.571929], printed(6));
  });

  it('p-values: the critical values have the p that they are named after', () => {
    for (const deterministic of ['none', 'constant', 'trend'] as const) {
      for (const nSeries of deterministic === 'none' ? [1] : [1, 2, 3, 4, 5, 6]) {
        const critical = mackinnonCritical(deterministic, 1e9, nSeries);
        const p = Object.values(critical).map((tau) => mackinnonP(tau, deterministic, nSeries));
        expectClose(p, [0.01, 0.05, 0.1], {
          rel: 0.05,
          abs: 0.0005,
          why: 'the 1994 surface against the newer 2010 one',
        });
      }
    }
    // Printed by statsmodels for the sunspot numbers, from memory.
    expectClose(mackinnonP(-2.837781, 'constant'), 0.053076, printed(6));
  });

  it('p falls as τ does, without a jump where the two pieces meet', () => {
    for (const deterministic of ['none', 'constant', 'trend'] as const) {
      for (const nSeries of [1, 2, 3, 4, 5, 6]) {
        const p = Array.from({ length: 2001 }, (_, i) => mackinnonP(-12 + i / 200, deterministic, nSeries));
        const steps = p.slice(1).map((value, i) => value - p[i]!);
        expect(Math.min(...steps)).toBeGreaterThan(-0.004);
        expect(Math.max(...steps)).toBeLessThan(0.02);
      }
    }
    expect(mackinnonP(-40, 'constant')).toBe(0);
    expect(mackinnonP(5, 'constant')).toBe(1);
  });

  it('refuses more series than were tabulated', () => {
    expect(() => mackinnonP(-3, 'constant', 7)).toThrow('from 1 to 6');
    expect(() => mackinnonCritical('none', 100, 2)).toThrow('from 1 to 1');
  });
});
