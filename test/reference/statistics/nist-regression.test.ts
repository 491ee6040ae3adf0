import { describe, expect, it } from 'vitest';
import { durbinWatson } from '../../../src-main/statistics/durbin-watson.ts';
import { regression } from '../../../src-main/statistics/regression.ts';
import { checkRegression, type RegressionReference } from '../../helpers/check-regression.ts';
import { expectClose, type Tolerance } from '../../helpers/close.ts';
import exact from './nist-exact.json' with { type: 'json' };
import sets from './nist-strd.json' with { type: 'json' };

// Level A: NIST's certified values (15 digits). Level C: the same and more, in exact rational arithmetic (nist-exact.py).

type SetName = keyof typeof sets;

const answerFor = (name: SetName, intercept = sets[name].intercept) => {
  const { x, y, powers } = sets[name];
  const columns = (Array.isArray(x[0]) ? x : [x]) as number[][];
  const [first = []] = columns;
  const predictors =
    columns.length > 1 ? columns : Array.from({ length: powers }, (_, k) => first.map((value) => value ** (k + 1)));
  return regression({ x: predictors, y, intercept, covariance: { kind: 'classical' } });
};

const certifiedFigures = (name: SetName): RegressionReference => {
  const { coefficients, standardErrors, residualStandardDeviation, rSquared } = sets[name].certified;
  return {
    coefficients: coefficients.map(Number),
    standardErrors: standardErrors.map(Number),
    residualStandardDeviation: [Number(residualStandardDeviation)],
    [sets[name].intercept ? 'rSquaredCentred' : 'rSquaredUncentred']: [Number(rSquared)],
  };
};

const exactFigures = (name: SetName): RegressionReference =>
  Object.fromEntries(
    Object.entries(exact[name]).flatMap(([figure, digits]) =>
      digits === null ? [] : [[figure, (Array.isArray(digits) ? digits : [digits]).map(Number)]],
    ),
  );

function tolerances(rel: number, why: string, largestY: number) {
  const figures: Tolerance = { rel, abs: 0, why };
  return {
    figures,
    tails: figures,
    rows: { rel, abs: rel * largestY, why: 'a residual is a difference of numbers of y’s size' },
  };
}

describe('NIST StRD linear regression', () => {
  const cases: [SetName, number, string][] = [
    ['Norris', 1e-13, 'a well-posed line'],
    ['NoInt1', 1e-14, 'one column of whole numbers'],
    ['NoInt2', 1e-14, 'one column of whole numbers'],
    ['Longley', 1e-12, 'condition number 1e4 on scaled columns'],
    ['Pontius', 1e-12, 'a quadratic over one decade; x² is exact'],
  ];
  it.each(cases)('%s: certified and exact values to %f', (name, rel, why) => {
    const largestY = Math.max(...sets[name].y.map(Math.abs));
    checkRegression(answerFor(name), certifiedFigures(name), tolerances(Math.max(rel, 2e-14), why, largestY));
    checkRegression(answerFor(name), exactFigures(name), tolerances(rel, why, largestY));
  });

  it('Filip: seven digits, and says how near its columns are to being dependent', () => {
    const why = 'x¹⁰ rounded to a double moves the coefficients by 1e-8 to 1e-7';
    checkRegression(answerFor('Filip'), certifiedFigures('Filip'), tolerances(1e-7, why, 1));
    checkRegression(answerFor('Filip'), exactFigures('Filip'), tolerances(1e-6, `${why}, the leverage by 1e-6`, 1));
    expect(answerFor('Filip').caveats.map(({ code }) => code)).toContain('ill-conditioned');
  });

  it('Wampler1: an exact polynomial comes out exact, with null where nothing exists', () => {
    const answer = answerFor('Wampler1');
    expect(answer.coefficients).toEqual([1, 1, 1, 1, 1, 1]);
    expect(answer.residuals).toEqual(Array(21).fill(0));
    expect(answer.standardErrors).toEqual([0, 0, 0, 0, 0, 0]);
    expect(answer).toMatchObject({
      rSquaredCentred: 1,
      residualStandardDeviation: 0,
      t: Array(6).fill(null),
      aic: null,
    });
    expect(answer).toMatchObject({ fStatistic: null, fP: null, logLikelihood: null, durbinWatson: null });
    expect(answer.caveats.map(({ code }) => code)).toContain('exact-fit');
  });

  it('NoInt1: certified R² 0.999 through the origin, worse than the mean; with an intercept 70 + x exactly', () => {
    const origin = answerFor('NoInt1');
    expectClose(origin.rSquaredCentred, -0.15702479338843, { rel: 1e-13, abs: 0, why: 'all printed digits' });
    const line = answerFor('NoInt1', true);
    expect(line.coefficients).toEqual([70, 1]);
    expect(line.rSquaredCentred).toBe(1);
  });

  it('durbinWatson of the exact residuals', () => {
    for (const name of ['Norris', 'NoInt1', 'NoInt2', 'Longley', 'Pontius', 'Filip'] as const) {
      const { residuals, durbinWatson: expected } = exact[name];
      expectClose(durbinWatson(residuals.map(Number)), Number(expected), { rel: 1e-14, abs: 0, why: 'two short sums' });
    }
  });

  it('the exact values give the certified digits, so the data were copied right', () => {
    for (const name of Object.keys(sets) as SetName[]) {
      const { coefficients, standardErrors } = exact[name];
      const printed = { rel: 1e-14, abs: 0, why: 'half a unit of the 15th digit' };
      const { certified } = sets[name];
      expectClose(coefficients.map(Number), certified.coefficients.map(Number), printed, name);
      expectClose(standardErrors.map(Number), certified.standardErrors.map(Number), printed, name);
    }
  });
});
