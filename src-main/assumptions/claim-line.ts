import tQuantile from '@stdlib/stats-base-dists-t-quantile';
import { fittedLine, type FittedLine } from '../climate/procedures/fitted-line.ts';
import type { LogRegressionProcedure } from '../contract/procedure.ts';
import type { Caveat, Interval } from '../contract/primitives.ts';
import type { AlignedRows, RegressionAnswer } from '../contract/result.ts';
import { InputError } from '../errors.ts';
import type { TestContext } from './test-context.ts';

export interface LogClaimLine extends FittedLine {
  procedure: LogRegressionProcedure;
  rows: AlignedRows;
}

/** The line of a log-regression, with its rows. @throws InputError `no-line` for any other procedure */
export function logClaimLine(context: TestContext): LogClaimLine {
  const line = fittedLine(context);
  const { procedure, fit } = line;
  if (procedure.kind === 'log-regression' && fit.aligned) return { ...line, procedure, rows: fit.aligned };
  throw new InputError({
    code: 'no-line',
    where: 'assumption',
    expected: 'a log-regression',
    received: procedure.kind,
  });
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
