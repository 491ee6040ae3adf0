import { fitsLine } from '../contract/procedure.ts';
import { fittedLine } from '../climate/procedures/fitted-line.ts';
import { InputError } from '../errors.ts';
import { formatNumber, formatShare, formatYears } from '../quantities/notation.ts';
import { claimSweep, defaultMinYears } from '../robustness/claim-sweep.ts';
import { quantile } from '../statistics/quantile.ts';
import { outcome, untestable, type Assumption } from './assumption.ts';
import type { TestContext } from './test-context.ts';
import { heavier, weightWords } from './weigh.ts';

/** The start and end years do not matter: the same procedure over every window of the record. */
export const window: Assumption = {
  id: 'window',
  group: 'The line',
  title: 'The start and end years do not matter',
  shortTitle: 'Choice of years',
  explanation:
    'A number that holds for the record should not hinge on where the record is made to start and stop. If it does, the choice of years is part of the claim.',
  method: `Runs the procedure over every window of at least ${defaultMinYears} years that the series allow, with the anchor taken anew in each, and finds where the stated window stands among them.`,
  formula: `number(start, end) for all end − start + 1 ≥ ${defaultMinYears} years with data`,
  needs: `Series that share more than ${defaultMinYears} years.`,
  source: 'Rahmstorf, Foster & Cahill 2017, Environ. Res. Lett. 12, 054001, on trends over all start and end years',

  applies: ({ procedure }) => fitsLine(procedure),

  test(context) {
    const { computation, recomputation, show, showWithUnit, showShift } = context;
    const minYears = shortestWindow(context);
    const sweep = sweepOrNull(context, minYears);
    if (!sweep) {
      return untestable(window, {
        reason: `The series do not share more than ${minYears} years.`,
        wouldNeed: 'Give longer series; or sweep shorter windows under Robustness.',
      });
    }
    const { windows, factor, valueQuantiles, stated, shareAtOrBelowStated } = sweep;
    const others = windows.filter(({ start, end }) => start !== stated.window.start || end !== stated.window.end);
    const typicalShift = quantile(
      others.map(({ slope }) => Math.abs(slope * factor - recomputation.value)),
      0.5,
    );
    const { min, q05, q50, q95, max } = valueQuantiles;
    const weight = heavier(context.weigh(q50), context.weighShift(typicalShift));
    const percentile = formatNumber(stated.percentile, { decimals: 0 });
    const { statement } = computation;
    return outcome('window', {
      statistic: {
        label: 'percentile of the stated window',
        value: stated.percentile,
        p: null,
        interval: null,
        convention: `per cent of ${windows.length} windows of at least ${minYears} years with data whose number is at or below that of ${formatYears(stated.window)}; windows overlap, so this is a description and not a test of significance`,
      },
      test: `${formatNumber(windows.length, { decimals: 0 })} windows: ${show(q05)} to ${show(q95)} (5–95 %); stated window at ${percentile} %`,
      alternative: {
        value: q50,
        interval: { low: q05, high: q95, levelPercent: 90 },
        quantity: recomputation.quantity,
        unit: recomputation.unit,
        label: `median over all windows of at least ${minYears} years`,
      },
      effect: q50 - recomputation.value,
      weight,
      reading: `Over all windows of at least ${minYears} years the number runs from ${show(min)} to ${showWithUnit(max)}; half of them move it by more than ${show(typicalShift)}. The stated window ${formatYears(stated.window)} gives more than or as much as ${percentile} % of them. ${formatShare(shareAtOrBelowStated)} of the windows stay at or below the stated ${statement.value}.`,
      proposal:
        weight === 'negligible'
          ? { mark: 'met', reason: `Half of the other windows move the number by less than ${show(typicalShift)}.` }
          : {
              mark: 'not met',
              reason: `Half of the other windows move the number by more than ${show(typicalShift)}; their median is ${showShift(q50 - recomputation.value)} away.`,
            },
      sentence: `The number needs the choice of years not to matter. Over all windows of at least ${minYears} years the same procedure gives ${show(q05)} to ${showWithUnit(q95)} (5–95 % of the windows, median ${show(q50)}), against ${show(recomputation.value)} for ${formatYears(stated.window)}; half of the windows differ by more than ${show(typicalShift)}, which is ${weightWords[weight]}.`,
      table: {
        columns: ['Of all windows', `Number (${recomputation.unit})`],
        rows: [
          ['smallest', min],
          ['5 %', q05],
          ['50 %', q50],
          ['95 %', q95],
          ['largest', max],
          [`stated window, ${formatYears(stated.window)}`, recomputation.value],
        ],
      },
      caveats: sweep.caveats,
    });
  },
};

/** At least the usual fewest years, and long enough for the procedure's own anchor and lag. */
function shortestWindow(context: TestContext): number {
  const { procedure } = fittedLine(context);
  const anchorYears =
    procedure.kind === 'log-regression' && procedure.anchor.kind === 'mean-of-first' ? procedure.anchor.years : 1;
  const lag = procedure.covariance.kind === 'newey-west' ? procedure.covariance.lag : 0;
  return Math.max(defaultMinYears, anchorYears + 1, lag + 1);
}

/** null when the record is one window or none. */
function sweepOrNull({ computation }: TestContext, minYears: number) {
  try {
    const sweep = claimSweep({ ...computation, minYears });
    return sweep.windows.length > 1 ? sweep : null;
  } catch (error) {
    if (error instanceof InputError && error.fields.code === 'no-window') return null;
    throw error;
  }
}
