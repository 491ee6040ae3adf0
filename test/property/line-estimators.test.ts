import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { isFootingError } from '../../src-main/errors.ts';
import { ar1Line } from '../../src-main/statistics/ar1-line.ts';
import { deming } from '../../src-main/statistics/deming.ts';
import { glsArma11 } from '../../src-main/statistics/gls-arma11.ts';
import { huber } from '../../src-main/statistics/huber.ts';
import { leastSquares } from '../../src-main/statistics/least-squares.ts';
import { leaveOneOut } from '../../src-main/statistics/leave-one-out.ts';
import { movingBlockBootstrap } from '../../src-main/statistics/moving-block-bootstrap.ts';
import { regression } from '../../src-main/statistics/regression.ts';
import { theilSen } from '../../src-main/statistics/theil-sen.ts';
import { york } from '../../src-main/statistics/york.ts';
import { expectClose, type Table } from '../helpers/close.ts';
import { drawnOrder, drawnRecord, inOrder, units } from '../helpers/drawn-record.ts';

// Level D: what must hold of every line whatever the data.

interface Figures {
  /** In y per x: the slope and the ends of its interval. */
  slopes: number[];
  /** In y per x, and untouched by whatever is added to y. */
  slopeErrors: number[];
  /** In y; null where the estimator gives none, or its line has none. */
  intercept: number | null;
  /** Without a unit: ρ, weights, a chosen lag. */
  pure: Table;
}

interface Line {
  name: string;
  /** Error sizes and the like follow the units of x and y. */
  fit: (x: number[], y: number[], unitX: number, unitY: number) => Figures;
  /** any: rows may come in any order; reversible: time may run backwards. */
  order: 'any' | 'reversible' | 'directed';
  /** Whether adding m·x to y adds m to the slope: not where x has errors too. */
  addsUp: boolean;
  /** A line through zero knows the level of x and y. */
  throughZero?: true;
  numRuns?: number;
}

const ar1 = (estimator: 'ml' | 'reml' | 'prais-winsten' | 'cochrane-orcutt'): Line => ({
  name: `gls-ar1, ${estimator}`,
  fit: (x, y) => {
    const { coefficients, standardErrors, rho } = ar1Line({ x, y, intercept: true, estimator });
    return { slopes: [coefficients[1]!], slopeErrors: [standardErrors[1]!], intercept: coefficients[0]!, pure: [rho] };
  },
  // Prais–Winsten and Cochrane–Orcutt divide by the squares of all residuals but the last.
  order: estimator === 'ml' || estimator === 'reml' ? 'reversible' : 'directed',
  addsUp: true,
});

const neweyWest = (prewhiten?: 'var1'): Line => ({
  name: `regression, newey-west ${prewhiten ?? 'at a chosen lag'}`,
  fit: (x, y) => {
    // With a free origin the lag is given: the score of a predictor depends on where its zero is.
    const lag = prewhiten ? 3 : 'newey-west-1994';
    const covariance = { kind: 'newey-west', lag, prewhiten } as const;
    const { coefficients, standardErrors, confidence95, chosenLag } = regression({
      x,
      y,
      intercept: prewhiten !== undefined,
      covariance,
    });
    return {
      slopes: [coefficients.at(-1)!, ...confidence95.at(-1)!],
      slopeErrors: [standardErrors.at(-1)!],
      intercept: prewhiten ? coefficients[0]! : null,
      pure: [chosenLag ?? null],
    };
  },
  order: prewhiten ? 'directed' : 'reversible',
  addsUp: true,
  ...(prewhiten ? {} : { throughZero: true }),
});

const bootstrap = (resample: 'pairs' | 'residuals'): Line => ({
  name: `block-bootstrap, ${resample}`,
  fit: (x, y) => {
    const asked = { x, y, intercept: true, blockLength: 4, draws: 120, seed: 9, resample };
    const { slope, quantiles, standardError } = movingBlockBootstrap(asked);
    return { slopes: [slope, ...Object.values(quantiles)], slopeErrors: [standardError], intercept: null, pure: [] };
  },
  order: 'directed',
  addsUp: true,
});

const lines: Line[] = [
  ar1('ml'),
  ar1('reml'),
  ar1('prais-winsten'),
  ar1('cochrane-orcutt'),
  {
    name: 'gls-arma11',
    fit: (x, y) => {
      const { coefficients, standardErrors, phi, theta } = glsArma11({ x, y, intercept: true });
      const [intercept = NaN, slope = NaN] = coefficients;
      return { slopes: [slope], slopeErrors: [standardErrors[1]!], intercept, pure: [phi, theta] };
    },
    order: 'reversible',
    addsUp: true,
    numRuns: 6,
  },
  {
    name: 'theil-sen',
    fit: (x, y) => {
      const { slope, intercept, confidence } = theilSen({ x, y });
      return { slopes: [slope, ...(confidence ?? [])], slopeErrors: [], intercept, pure: [] };
    },
    order: 'any',
    addsUp: true,
  },
  {
    name: 'huber',
    fit: (x, y) => {
      const { coefficients, standardErrors } = huber({ x, y, intercept: true, k: 1.345 });
      return { slopes: [coefficients[1]!], slopeErrors: [standardErrors[1]!], intercept: coefficients[0]!, pure: [] };
    },
    order: 'any',
    addsUp: true,
  },
  {
    name: 'york',
    fit: (x, y, unitX, unitY) => {
      const fit = york({ x, y, sx: 0.3 * unitX, sy: 2 * unitY, r: 0.2 });
      return {
        slopes: [fit.slope],
        slopeErrors: [fit.slopeStandardError, fit.scaledSlopeStandardError],
        intercept: fit.intercept,
        pure: [fit.chiSquare, fit.goodness],
      };
    },
    order: 'any',
    addsUp: false,
  },
  {
    name: 'deming',
    fit: (x, y, unitX, unitY) => {
      const { slope, intercept, slopeStandardError } = deming({ x, y, delta: 9 * (unitY / unitX) ** 2 });
      return { slopes: [slope], slopeErrors: [slopeStandardError], intercept, pure: [] };
    },
    order: 'any',
    addsUp: false,
  },
  neweyWest(),
  neweyWest('var1'),
  bootstrap('pairs'),
  bootstrap('residuals'),
];

const near = {
  rel: 1e-5,
  abs: 1e-6,
  why: 'ρ, φ and θ are found by the height of a likelihood that is flat at its top',
};

let nAnswers = 0;

/** A refusal must not depend on units either. */
function outcome(fit: () => Figures): Figures | { code: string } {
  try {
    const figures = fit();
    nAnswers++;
    return figures;
  } catch (error) {
    if (isFootingError(error)) return { code: error.fields.code };
    throw error;
  }
}

/** What the figures of a changed record must be, from those of the record itself. */
function expectFollows(
  after: Figures | { code: string },
  before: Figures | { code: string },
  { times = 1, plus = 0, intercept }: { times?: number; plus?: number; intercept?: (a: number, b: number) => number },
): void {
  if ('code' in before || 'code' in after) return expectClose(after, before, near);
  const { slopes, slopeErrors, pure } = after;
  expectClose(
    { slopes: slopes.map((b) => b / times), slopeErrors: slopeErrors.map((s) => s / times), pure },
    { slopes: before.slopes.map((b) => b + plus), slopeErrors: before.slopeErrors, pure: before.pure },
    near,
  );
  if (!intercept || before.intercept === null) return;
  expectClose(after.intercept, intercept(before.intercept, before.slopes[0] ?? NaN), { ...near, abs: 1e-4 });
}

describe.each(lines)('$name', ({ fit, order, addsUp, throughZero, numRuns = 15 }) => {
  const options = { seed: 20_260_102, numRuns };
  const holds = (check: (record: { x: number[]; y: number[] }, unit: number, key: number) => void) => {
    nAnswers = 0;
    fc.assert(fc.property(drawnRecord, units, fc.nat(1000), check), options);
    // Two fits in each run: a property that holds among refusals alone would say nothing.
    expect(nAnswers).toBeGreaterThan(1.5 * numRuns);
  };

  it('follows the unit of y', () =>
    holds(({ x, y }, unit) => {
      const scaled = y.map((value) => unit * value);
      expectFollows(
        outcome(() => {
          const { intercept, ...figures } = fit(x, scaled, 1, unit);
          return { ...figures, intercept: intercept === null ? null : intercept / unit };
        }),
        outcome(() => fit(x, y, 1, 1)),
        { times: unit, intercept: (a) => a },
      );
    }));

  it('follows the unit of x', () =>
    holds(({ x, y }, unit) => {
      const scaled = x.map((value) => unit * value);
      const after = outcome(() => fit(scaled, y, unit, 1));
      expectFollows(
        after,
        outcome(() => fit(x, y, 1, 1)),
        { times: 1 / unit, intercept: (a) => a },
      );
    }));

  if (!throughZero) {
    it('does not mind where x and y have their zero', () =>
      holds(({ x, y }, _, key) => {
        const moved = { x: x.map((value) => value + key / 10), y: y.map((value) => value - key / 7) };
        const after = outcome(() => fit(moved.x, moved.y, 1, 1));
        expectFollows(
          after,
          outcome(() => fit(x, y, 1, 1)),
          { intercept: (a, b) => a - key / 7 - (b * key) / 10 },
        );
      }));
  }

  if (addsUp) {
    it('adds up: a multiple of x added to y is added to the slope', () =>
      holds(({ x, y }, _, key) => {
        const m = (key - 500) / 300;
        const tilted = y.map((value, t) => value + m * x[t]!);
        const after = outcome(() => fit(x, tilted, 1, 1));
        expectFollows(
          after,
          outcome(() => fit(x, y, 1, 1)),
          { plus: m },
        );
      }));
  }

  if (order !== 'directed') {
    it(order === 'any' ? 'does not know the order of the rows' : 'says the same of time run backwards', () =>
      holds(({ x, y }, _, key) => {
        const rows = order === 'any' ? drawnOrder(x.length, key) : [...x.keys()].reverse();
        const after = outcome(() => fit(inOrder(x, rows), inOrder(y, rows), 1, 1));
        expectFollows(
          after,
          outcome(() => fit(x, y, 1, 1)),
          { intercept: (a) => a },
        );
      }),
    );
  }
});

describe('block-bootstrap', () => {
  it('draws the same from the same seed, and other from another', () => {
    fc.assert(
      fc.property(drawnRecord, fc.nat(1_000_000), (record, seed) => {
        const drawn = (from: number) =>
          movingBlockBootstrap({ ...record, intercept: true, blockLength: 4, draws: 100, seed: from }).standardError;
        expectClose(drawn(seed), drawn(seed), { rel: 0, abs: 0, why: 'the same digits' });
        if (drawn(seed + 1) === drawn(seed)) throw new Error('the seed does not arrive');
      }),
      { seed: 20_260_102, numRuns: 15 },
    );
  });
});

describe('leave-one-out', () => {
  const without = (x: number[], y: number[], place: number) =>
    leaveOneOut(leastSquares({ columns: [x.map(() => 1), x], y }), place).coefficients.map((value) => value ?? NaN);
  const holds = (check: (record: { x: number[]; y: number[] }, unit: number, key: number) => void) =>
    fc.assert(fc.property(drawnRecord, units, fc.nat(1000), check), { seed: 20_260_102, numRuns: 30 });

  it('follows units and levels, and a multiple of x', () =>
    holds(({ x, y }, unit, key) => {
      const before = without(x, y, 1);
      const [m, shift] = [(key - 500) / 300, key / 7];
      const changed = (change: (value: number, t: number) => number) => without(x, y.map(change), 1);
      expectClose(
        changed((value) => unit * value).map((b) => b / unit),
        before,
        near,
      );
      expectClose(
        changed((value) => value + shift),
        before,
        near,
      );
      expectClose(
        changed((value, t) => value + m * x[t]!).map((b) => b - m),
        before,
        near,
      );
      const wide = x.map((value) => unit * value - shift);
      expectClose(
        without(wide, y, 1).map((b) => b * unit),
        before,
        near,
      );
      expectClose(
        without(
          x,
          y.map((value) => value + shift),
          0,
        ).map((a) => a - shift),
        without(x, y, 0),
        near,
      );
    }));

  it('keeps each figure with its row, in whatever order the rows come', () =>
    holds(({ x, y }, _, key) => {
      const rows = drawnOrder(x.length, key);
      expectClose(without(inOrder(x, rows), inOrder(y, rows), 1), inOrder(without(x, y, 1), rows), near);
    }));
});
