import { describe, expect, it } from 'vitest';
import type { RegressionRequest } from '../../../src-main/contract/compute.ts';
import { regressionAnswer } from '../../../src-main/contract/result.ts';
import { isFootingError } from '../../../src-main/errors.ts';
import { regression } from '../../../src-main/statistics/regression.ts';
import { expectClose } from '../../helpers/close.ts';

const classical = { kind: 'classical' } as const;
const rounding = { rel: 1e-13, abs: 1e-15, why: 'a short exact calculation in doubles' };

const codes = (answer: { caveats: { code: string }[] }) => answer.caveats.map(({ code }) => code);

describe('regression', () => {
  // x = 1, 2, 4; y = 1, 2, 6: slope 12/7, intercept −1, RSS 2/7, one degree of freedom.
  const line = { x: [1, 2, 4], y: [1, 2, 6], intercept: true, covariance: classical };

  it('puts the intercept first and tests with n − k degrees of freedom, by hand', () => {
    const answer = regression(line);
    expectClose(answer.coefficients, [-1, 12 / 7], rounding);
    expectClose(answer.standardErrors, [Math.sqrt(3 / 7), Math.sqrt(3 / 49)], rounding);
    expectClose(answer.rSquaredCentred, 1 - 2 / 7 / 14, rounding);
    expectClose(answer.rSquaredUncentred, 1 - 2 / 7 / 41, rounding);
    expectClose(answer.adjustedRSquared, 1 - (2 / 7 / 14) * 2, rounding);
    expectClose(answer.fStatistic, 14 / (2 / 7) - 1, rounding);
    // One degree of freedom is the Cauchy distribution: its 97.5 % point is tan(0.475π).
    const half = Math.tan(0.475 * Math.PI) * Math.sqrt(3 / 49);
    expectClose(answer.confidence95[1], [12 / 7 - half, 12 / 7 + half], { ...rounding, rel: 1e-12 });
    expectClose(answer.p[1], (2 / Math.PI) * Math.atan(1 / answer.t[1]!), { ...rounding, rel: 1e-12 });
    expectClose(answer.logLikelihood, -1.5 * (Math.log(2 * Math.PI) + 1 + Math.log(2 / 21)), rounding);
    expectClose(answer.aic, -2 * answer.logLikelihood! + 4, rounding);
    expectClose(answer.bic, -2 * answer.logLikelihood! + 2 * Math.log(3), rounding);
  });

  it('takes adjusted R² and F about zero without an intercept', () => {
    // Through the origin: b = 29/21, RSS = 41 − 29²/21 = 20/21, two degrees of freedom.
    const answer = regression({ ...line, intercept: false });
    expectClose(answer.adjustedRSquared, 1 - ((20 / 21 / 41) * 3) / 2, rounding);
    expectClose(answer.fStatistic, 841 / 21 / (10 / 21), rounding);
    expectClose(answer.rSquaredCentred, 1 - 20 / 21 / 14, rounding);
  });

  const exact: [string, RegressionRequest][] = [
    ['an exact line', { ...line, y: [3, 5, 9] }],
    ['an exact line through the origin', { ...line, y: [2, 4, 8], intercept: false }],
    ['a line exact to rounding', { ...line, y: [0.1, 0.2, 0.4] }],
    ['an exact line with hc3', { ...line, x: [1, 2, 4, 7], y: [3, 5, 9, 15], covariance: { kind: 'hc3' } }],
    ['zeros', { ...line, y: [0, 0, 0] }],
    ['a constant with an intercept', { ...line, y: [5, 5, 5] }],
    ['a constant that is no short binary fraction', { ...line, y: [0.1, 0.1, 0.1] }],
    ['a constant through the origin', { ...line, y: [5, 5, 5], intercept: false }],
    [
      'a row with leverage 1',
      {
        ...line,
        x: [
          [0, 0, 0, 1],
          [1, 2, 4, 3],
        ],
        y: [1, 2, 6, 4],
      },
    ],
  ];
  it.each(exact)('%s: no NaN anywhere, null with a caveat instead', (_, request) => {
    const answer = regression(request);
    expect(regressionAnswer.parse(answer)).toEqual(answer);
    if (answer.t.includes(null)) expect(codes(answer)).toContain('exact-fit');
    if (answer.rSquaredCentred === null) expect(codes(answer)).toContain('constant-response');
    if (answer.cooksDistance.includes(null)) expect(codes(answer).join()).toMatch(/exact-fit|leverage-of-one/);
  });

  it('gives null for what an exact fit has not', () => {
    const nothing = { fStatistic: null, fP: null, logLikelihood: null, aic: null, bic: null, durbinWatson: null };
    expect(regression({ ...line, y: [3, 5, 9] })).toMatchObject({ ...nothing, t: [null, null], p: [null, null] });
    expect(regression({ ...line, y: [3, 5, 9] })).toMatchObject({ rSquaredCentred: 1, residuals: [0, 0, 0] });
    expect(regression({ ...line, y: [5, 5, 5] })).toMatchObject({ rSquaredCentred: null, adjustedRSquared: null });
    expect(regression({ ...line, y: [0, 0, 0] })).toMatchObject({ rSquaredCentred: null, rSquaredUncentred: null });
    expect(regression({ ...line, y: [5, 5, 5], intercept: false }).rSquaredCentred).toBeNull();
  });

  it('gives null for Cook’s distance of a row that nothing else bears on', () => {
    const { cooksDistance } = regression({
      ...line,
      x: [
        [0, 0, 0, 0, 1],
        [1, 2, 4, 5, 3],
      ],
      y: [1, 2, 6, 4, 4],
    });
    expect(cooksDistance[4]).toBeNull();
    expect(cooksDistance.slice(0, 4)).not.toContain(null);
  });

  describe('with years', () => {
    const asked = { ...line, x: [1, 2, 4, 5, 7, 8], y: [1, 2, 6, 5, 9, 8] };
    const gapped = [1990, 1991, 1993, 1994, 1995, 1996];
    const consecutive = [1990, 1991, 1992, 1993, 1994, 1995];
    const covariance = { kind: 'newey-west', lag: 1 } as const;
    const aboutGaps = (change: Partial<RegressionRequest>) =>
      regression({ ...asked, ...change })
        .caveats.filter(({ code }) => code.startsWith('gaps'))
        .map(({ code, detail }) => `${code}: ${detail}`);

    it('says which figures close gaps up and which count the calendar', () => {
      const closedUp = expect.stringMatching(
        /^gaps-closed-up: 1 year is missing in 1 gap\. Terms of Durbin–Watson/,
      ) as string;
      expect(aboutGaps({ years: gapped })).toEqual([closedUp]);
      expect(aboutGaps({ years: gapped, covariance })).toEqual([
        expect.stringMatching(
          /^gaps-by-calendar: 1 year is missing in 1 gap\. Newey–West errors take rows as lagged by j/,
        ),
        closedUp,
      ]);
      expect(aboutGaps({ years: consecutive, covariance })).toEqual([]);
      expect(aboutGaps({ covariance })).toEqual([]);
      expect(() => regression({ ...asked, years: [1990, 1990, 1991, 1992, 1993, 1994] })).toThrow(
        'regression, years[1]',
      );
    });

    it('counts a product of Newey–West errors only between years that are its lag apart, by hand', () => {
      // Through the origin: influence ψ = x e / Σx². Pairs one year apart: all but rows 2 and 3, two years: (2,3), (3,5), (4,6).
      const { residuals, coefficients } = regression({ ...asked, intercept: false });
      const influence = residuals.map((e, t) => (asked.x[t]! * e) / 159);
      expectClose(coefficients, [(1 + 4 + 24 + 25 + 63 + 64) / 159], rounding);
      const products = (pairs: number[][]) =>
        pairs.reduce((total, [a = 0, b = 0]) => total + influence[a]! * influence[b]!, 0);
      const squares = products([0, 1, 2, 3, 4, 5].map((t) => [t, t]));
      const apart = {
        one: [
          [0, 1],
          [2, 3],
          [3, 4],
          [4, 5],
        ],
        two: [
          [1, 2],
          [2, 4],
          [3, 5],
        ],
      };
      const answer = regression({
        ...asked,
        intercept: false,
        years: gapped,
        covariance: { kind: 'newey-west', lag: 2 },
      });
      const variance = squares + 2 * ((2 / 3) * products(apart.one) + (1 / 3) * products(apart.two));
      expectClose(answer.covarianceMatrix, [[variance]], rounding);
    });

    it('gives the same errors with consecutive years as without', () => {
      const { caveats, ...figures } = regression({ ...asked, covariance, years: consecutive });
      expect({ ...figures, caveats }).toEqual(regression({ ...asked, covariance }));
    });
  });

  it('says which lag was chosen from the data, and from what', () => {
    const y = [1, 3, 4, 3, 5, 8, 8, 7, 9, 12, 11, 13];
    const asked = { ...line, x: y.map((_, t) => t), y };
    const chosen = regression({ ...asked, covariance: { kind: 'newey-west', lag: 'newey-west-1994' } });
    const lag = chosen.chosenLag ?? NaN;
    const given = regression({ ...asked, covariance: { kind: 'newey-west', lag } });
    expect(given).not.toHaveProperty('chosenLag');
    expect(given.covarianceMatrix).toEqual(chosen.covarianceMatrix);
    const detail = ({ caveats }: typeof chosen, code: string) => caveats.find((one) => one.code === code)?.detail;
    // floor(4 (12/100)^(2/9)) = floor(2.50)
    expect(detail(chosen, 'automatic-lag')).toMatch(
      new RegExp(
        `^Lag ${lag} was chosen from the data after Newey & West 1994 .* from 2 autocovariances, giving weight 1 to the score of each predictor and 0 to that of the constant\\.$`,
      ),
    );
    expect(detail(chosen, 'short-series-for-lag')).toContain(`few for lag ${lag}`);
    expect(detail(given, 'prewhitened')).toBeUndefined();
    const whitened = regression({ ...asked, covariance: { kind: 'newey-west', lag: 2, prewhiten: 'var1' } });
    expect(detail(whitened, 'prewhitened')).toContain('without a limit on its singular values');
  });

  it('takes Durbin–Watson of √w·e', () => {
    const weights = [1, 4, 9, 4];
    const answer = regression({ ...line, x: [1, 2, 4, 5], y: [1, 2, 6, 4], weights });
    const z = answer.residuals.map((e, i) => e * Math.sqrt(weights[i]!));
    const steps = z.slice(1).map((value, i) => (value - z[i]!) ** 2);
    const total = (values: number[]) => values.reduce((a, b) => a + b, 0);
    expectClose(answer.durbinWatson, total(steps) / total(z.map((value) => value ** 2)), rounding);
  });

  const refusals: [string, Partial<RegressionRequest>, string][] = [
    [
      'lag-missing',
      { covariance: { kind: 'newey-west' } },
      'regression, covariance.lag: expected a whole number of rows for newey-west',
    ],
    ['out-of-range', { covariance: { kind: 'newey-west', lag: 3 } }, 'lag'],
    ['option-unused', { covariance: { kind: 'classical', lag: 0 } }, 'covariance.lag: expected none for classical'],
    ['option-unused', { covariance: { kind: 'hc1', smallSample: true } }, 'covariance.smallSample: expected none'],
    [
      'option-unused',
      { covariance: { kind: 'hc3', prewhiten: 'var1' } },
      'covariance.prewhiten: expected none for hc3',
    ],
    ['option-unused', { covariance: { kind: 'classical', lag: 'newey-west-1994' } }, 'but found newey-west-1994'],
    [
      'exact-fit',
      { y: [3, 5, 9], covariance: { kind: 'newey-west', lag: 'newey-west-1994' } },
      'neweyWestAutomaticLag',
    ],
    [
      'too-few-observations',
      { covariance: { kind: 'newey-west', lag: 1, prewhiten: 'var1' } },
      'prewhitenedScores: expected more than 3 rows',
    ],
    [
      'gap-in-years',
      { covariance: { kind: 'newey-west', lag: 1, prewhiten: 'var1' }, years: [1, 2, 5] },
      'neweyWest, prewhiten: expected consecutive years, each foretold by the one before, but found 2 years are missing',
    ],
    ['not-finite', { y: [1, NaN, 6] }, 'regression, y[1]: expected a finite number, but found NaN'],
    ['not-finite', { x: [1, 2, Infinity] }, 'regression, x[2]'],
    ['not-finite', { weights: [1, 1, NaN] }, 'regression, weights[2]'],
    ['not-positive', { weights: [1, -1, 1] }, 'regression, weights[1]'],
    ['wrong-length', { x: [1, 2] }, 'regression, x: expected 3 values, but found 2'],
    ['wrong-length', { weights: [1, 2] }, 'regression, weights'],
    ['too-few-observations', { x: [1, 2], y: [1, 2] }, 'expected more than 2 rows for 2 coefficients, but found 2'],
    ['too-few-observations', { x: [1], y: [1] }, 'regression'],
    ['rank-deficient', { x: [5, 5, 5] }, 'a constant predictor doubles the intercept'],
    [
      'rank-deficient',
      {
        x: [
          [1, 2, 4, 5],
          [2, 4, 8, 10],
        ],
        y: [1, 2, 3, 5],
      },
      'regression',
    ],
    [
      'leverage-of-one',
      {
        x: [
          [0, 0, 0, 1],
          [1, 2, 4, 3],
        ],
        y: [1, 2, 6, 4],
        covariance: { kind: 'hc2' },
      },
      'row 3',
    ],
  ];
  it.each(refusals)('%s for %j', (code, change, sentence) => {
    let caught: unknown;
    try {
      regression({ ...line, ...change });
    } catch (error) {
      caught = error;
    }
    expect(isFootingError(caught) && caught.fields.code).toBe(code);
    expect(String(caught)).toContain(sentence);
  });
});
