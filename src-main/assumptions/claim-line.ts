import tQuantile from '@stdlib/stats-base-dists-t-quantile';
import { slopeConversion } from '../climate/procedures/slope-conversion.ts';
import type { LogRegressionProcedure, SlopeCovariance, TrendProcedure } from '../contract/claim.ts';
import type { Caveat, Interval } from '../contract/primitives.ts';
import type { AlignedRows, Recomputation, RegressionAnswer } from '../contract/result.ts';
import { InputError } from '../errors.ts';
import { neweyWestLag } from '../statistics/newey-west-lag.ts';
import type { TestContext } from './test-context.ts';

export interface ClaimLine {
  procedure: LogRegressionProcedure | TrendProcedure;
  fit: NonNullable<Recomputation['fit']>;
  intercept: boolean;
  /** number = slope × factor, in the claim's unit. */
  factor: number;
  /** Errors that allow for correlated residuals: the procedure's own, or the rule of thumb's lag. */
  serialCovariance: Extract<SlopeCovariance, { kind: 'newey-west' }>;
}

export interface LogClaimLine extends ClaimLine {
  procedure: LogRegressionProcedure;
  rows: AlignedRows;
}

/** The line that a claim's number is the slope of. @throws InputError `no-line` for a procedure without one */
export function claimLine({ computation, recomputation }: TestContext): ClaimLine {
  const { procedure, statement } = computation;
  const { fit } = recomputation;
  if (procedure.kind === 'ratio' || !fit) {
    throw noLine('a procedure that fits a line to a record', procedure.kind);
  }
  const { covariance } = procedure;
  return {
    procedure,
    fit,
    intercept: procedure.kind === 'trend' || procedure.intercept,
    factor:
      procedure.kind === 'trend'
        ? { decade: 10, year: 1 }[procedure.per]
        : slopeConversion(procedure.conversion, statement.unit).factor,
    serialCovariance:
      covariance.kind === 'newey-west'
        ? covariance
        : { kind: 'newey-west', lag: neweyWestLag(fit.years.length), smallSample: false },
  };
}

/** The same for a log-regression, with its rows. @throws InputError `no-line` */
export function logClaimLine(context: TestContext): LogClaimLine {
  const line = claimLine(context);
  const { procedure, fit } = line;
  if (procedure.kind !== 'log-regression' || !fit.aligned) throw noLine('a log-regression', procedure.kind);
  return { ...line, procedure, rows: fit.aligned };
}

function noLine(expected: string, received: string): InputError {
  return new InputError({ code: 'no-line', where: 'assumption', expected, received });
}

const telling = ['exact-fit', 'few-degrees-of-freedom', 'short-series-for-lag', 'ill-conditioned'];

/** Doubts about a fit that bear on the number; those on figures that are not shown stay out. */
export function fitCaveats({ caveats }: Pick<RegressionAnswer, 'caveats'>): Caveat[] {
  return caveats.filter(({ code }) => telling.includes(code));
}

/** Central 90 % of an estimate, from the t distribution. */
export function interval90(value: number, standardError: number, degreesOfFreedom: number): Interval {
  const halfWidth = tQuantile(0.95, degreesOfFreedom) * standardError;
  return { low: value - halfWidth, high: value + halfWidth, levelPercent: 90 };
}
