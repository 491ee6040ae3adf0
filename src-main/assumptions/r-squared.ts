import { fittedLine } from '../climate/procedures/fitted-line.ts';
import type { AssumptionOutcome, Recomputation } from '../contract/result.ts';
import { isFootingError } from '../errors.ts';
import { formatNumber } from '../quantities/notation.ts';
import { correlation } from '../statistics/correlation.ts';
import { outcome, type Assumption } from './assumption.ts';
import { forcingLine, forcingMissing, type ForcingLine } from './forcing-line.ts';
import { statedRSquared, type StatedRSquared } from './stated-r-squared.ts';
import type { TestContext } from './test-context.ts';

/** What the stated figure can be, in the order in which it is named. */
interface Measures {
  centred: number | null;
  uncentred: number | null;
  r: number | null;
}

/**
 * R² measures what is said. 1 − RSS/Σ(y − ȳ)² compares the line with the mean; 1 − RSS/Σy², which programs print for a
 * line through zero, compares it with zero, and is high for anything far from zero. Neither tells rival predictors of
 * a rising series apart.
 */
export const rSquared: Assumption = {
  id: 'r-squared',
  group: 'The errors',
  title: 'R² measures what is said',
  shortTitle: 'Meaning of R²',
  explanation:
    'For a line through zero, programs print another R², which compares the line with zero instead of with the mean and comes out high for almost anything. And with a rising record any rising predictor gets a high R²: it says nothing on the cause.',
  method:
    'Computes both R² and the correlation, finds which of them the stated figure equals within rounding, and sets beside them the R² of the calendar year alone and, where it is given, of total forcing.',
  formula: 'centred 1 − RSS/Σ(y − ȳ)²; uncentred 1 − RSS/Σy²; r = corr(x, y)',
  needs: 'The R² that the source states, for the comparison; total forcing, for one more rival.',
  source: 'Kvålseth 1985, Am. Stat. 39, 279–285',

  applies: ({ procedure, statement }) =>
    procedure.kind === 'log-regression' || (procedure.kind === 'trend' && statement.statedRSquared !== null),

  test(context) {
    const { statement } = context.computation;
    const { fit, procedure } = fittedLine(context);
    const { rSquaredCentred: centred, rSquaredUncentred: uncentred, correlation: r } = fit.diagnostics;
    const measures: Measures = { centred, uncentred, r };
    const stated = statement.statedRSquared?.trim() ? statedRSquared(statement.statedRSquared) : null;
    const rivals = procedure.kind === 'log-regression' ? rivalMeasures(context, fit) : [];
    const { mark, reason } = verdict(stated, measures, procedure.kind === 'trend' || procedure.intercept);
    const figures = `R² ${shown(centred)} against the mean, ${shown(uncentred)} against zero; r ${shown(r)}`;
    const rivalText = rivals.map(({ label, value }) => `${shown(value)} for ${label}`).join(', ');
    return outcome('r-squared', {
      statistic:
        centred === null
          ? null
          : {
              label: 'R², centred',
              value: centred,
              p: null,
              interval: null,
              convention:
                '1 − RSS/Σ(y − ȳ)², of the procedure’s own line; below 0 when the mean predicts better than the line',
            },
      test: figures,
      reading: `${figures}.${stated ? ` Stated: ${stated.text}.` : ''} ${reason}${rivalText ? ` With an intercept, R² is ${rivalText}. A rising record gives every rising predictor a high R²: it does not tell them apart.` : ''}`,
      proposal: { mark, reason },
      sentence: `${stated ? `An R² of ${stated.text} is stated. ` : ''}The line of the procedure has an R² of ${shown(centred)} in the usual sense (against the mean) and of ${shown(uncentred)} against zero. ${reason}${rivalText ? ` A high R² does not show a cause: with an intercept it is ${rivalText}.` : ''}`,
      table: {
        columns: ['Measure', 'Value', 'Rounds to the stated figure'],
        rows: [
          ...(
            [
              ['R², centred: against the mean', centred],
              ['R², uncentred: against zero', uncentred],
              ['correlation r', r],
            ] as const
          ).map(([label, value]) => [label, value, stated ? (stated.agreesWith(value) ? 'yes' : 'no') : null]),
          ...rivals.map(({ label, value }) => [`R² with an intercept: ${label}`, value, null]),
        ],
      },
    });
  },
};

/** R² with an intercept of predictors that might all be the cause, on the claim's temperatures. */
function rivalMeasures(context: TestContext, fit: NonNullable<Recomputation['fit']>) {
  const rivals = [
    { label: 'the logarithm of CO₂', value: squaredCorrelation(fit.x, fit.y) },
    { label: 'the calendar year alone', value: squaredCorrelation(fit.years, fit.y) },
  ];
  const forced = forcingOrNull(context);
  if (forced)
    rivals.push({ label: 'total forcing', value: squaredCorrelation(forced.forcingWm2, forced.rows.warmingK) });
  return rivals;
}

/** A forcing that cannot be used is said where it is needed; here it is one rival fewer. */
function forcingOrNull(context: TestContext): ForcingLine | null {
  if (forcingMissing(context.computation)) return null;
  try {
    return forcingLine(context, true);
  } catch (error) {
    if (isFootingError(error)) return null;
    throw error;
  }
}

function squaredCorrelation(x: readonly number[], y: readonly number[]): number {
  return correlation(x, y) ** 2;
}

function verdict(
  stated: StatedRSquared | null,
  { centred, uncentred, r }: Measures,
  hasIntercept: boolean,
): AssumptionOutcome['proposal'] {
  if (!stated) {
    return { mark: 'untested', reason: 'No R² is stated beside the number, so nothing rests on it.' };
  }
  if (stated.agreesWith(centred)) {
    return { mark: 'met', reason: 'The stated figure equals the R² in the usual sense, within rounding.' };
  }
  if (!hasIntercept && stated.agreesWith(uncentred)) {
    return {
      mark: 'not met',
      reason: `The stated figure equals the uncentred R², which compares the line with zero; in the usual sense R² is ${shown(centred)}.`,
    };
  }
  if (stated.agreesWith(r)) {
    return {
      mark: 'not met',
      reason: `The stated figure equals the correlation r, not its square; R² is ${shown(centred)}.`,
    };
  }
  if (stated.agreesWith(r === null ? null : r ** 2)) {
    return {
      mark: 'not met',
      reason: `The stated figure equals r², the R² of a line with a free intercept; the line through zero has ${shown(centred)}.`,
    };
  }
  return {
    mark: 'not met',
    reason: 'The stated figure equals neither R² nor r of this procedure on these series, within rounding.',
  };
}

function shown(value: number | null): string {
  return value === null ? 'none' : formatNumber(value, { decimals: 3 });
}
