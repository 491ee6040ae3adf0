import { fitsLine, type LineProcedure, type SlopeCovariance } from '../../contract/procedure.ts';
import type { ClaimComputation } from '../../contract/compute.ts';
import type { Recomputation } from '../../contract/result.ts';
import { InputError } from '../../errors.ts';
import { neweyWestLag } from '../../statistics/newey-west-lag.ts';
import { slopeConversion } from './slope-conversion.ts';

/** The line that a claim's number is the slope of. */
export interface FittedLine {
  procedure: LineProcedure;
  fit: NonNullable<Recomputation['fit']>;
  intercept: boolean;
  /** number = slope × factor, in the claim's unit. */
  factor: number;
  /** Errors that allow for correlated residuals: the procedure's own, or the rule of thumb's lag. */
  serialCovariance: Extract<SlopeCovariance, { kind: 'newey-west' }>;
}

/**
 * The line of a recomputed claim, with what turns its slope into the claim's number.
 *
 * @throws  InputError `no-line` for a procedure without one; as `slopeConversion`
 *
 * Checked  test/unit/climate/procedures/fitted-line.test.ts (C: slope × factor is the number)
 */
export function fittedLine({
  computation: { procedure, statement },
  recomputation: { fit },
}: {
  computation: Pick<ClaimComputation, 'procedure' | 'statement'>;
  recomputation: Recomputation;
}): FittedLine {
  if (!fitsLine(procedure) || !fit) {
    throw new InputError({
      code: 'no-line',
      where: `procedure ${procedure.kind}`,
      expected: 'a procedure that fits a line to a record',
      received: 'one that works from a few figures',
      hint: 'Without a line there are no residuals and no other estimators.',
    });
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
