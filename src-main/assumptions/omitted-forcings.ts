import { covarianceWords } from '../climate/procedures/slope-estimates.ts';
import { fitLogRegression } from '../climate/procedures/fit-log-regression.ts';
import type { Caveat } from '../contract/primitives.ts';
import { NumericError } from '../errors.ts';
import { inputText } from '../quantities/input-text.ts';
import { formatInterval, formatNumber, formatYearList, formatYears } from '../quantities/notation.ts';
import { interval90 } from '../robustness/ladder.ts';
import { designColumns } from '../statistics/design-columns.ts';
import { leastSquares } from '../statistics/least-squares.ts';
import { regression } from '../statistics/regression.ts';
import { mean } from '../statistics/summation.ts';
import { varianceInflation } from '../statistics/variance-inflation.ts';
import { outcome, untestable, type Assumption } from './assumption.ts';
import { fitCaveats, logClaimLine } from './claim-line.ts';
import { numberOnFooting } from './footing.ts';
import { forcingLine, forcingMissing, type ForcingLine } from './forcing-line.ts';
import { weightWords } from './weigh.ts';

/**
 * CO2 is the only forcing, or all others move in step with it. A record that answers to total forcing, regressed on CO2
 * alone, gives S = r S_F with r = ΔF_total/ΔF_CO2: what the other agents did is put on CO2.
 */
export const omittedForcings: Assumption = {
  id: 'omitted-forcings',
  group: 'What the slope stands for',
  title: 'CO₂ is the only forcing, or all others move in step with it',
  shortTitle: 'Other forcings',
  explanation:
    'Methane, other gases, aerosols, volcanoes and the sun have warmed and cooled in the same years. A slope on CO₂ alone puts the net of all of them on CO₂.',
  method:
    'Regresses the same temperatures on total effective forcing, by the same rule for anchor and intercept, and turns that slope into K per doubling with the forcing of a doubling. Compares the change of total forcing with that of CO₂; with CO₂ forcing given, tries both in one regression.',
  formula: 'S = F2x · b_F; r = ΔF_total / ΔF_CO₂; CO₂ alone gives S = r · F2x · b_F',
  needs:
    'A series of total effective radiative forcing (W/m²) and the forcing of a CO₂ doubling; optionally CO₂ forcing.',
  source: 'AR6 WG1 §7.3 for forcings; Marquardt 1970, Technometrics 12, 591–612, for variance inflation',

  applies: ({ procedure }) => procedure.kind === 'log-regression',

  test(context) {
    const { computation, recomputation, show, showWithUnit, showShift } = context;
    const missing = forcingMissing(computation);
    if (missing) return untestable(omittedForcings, missing);
    const { procedure, intercept, serialCovariance, factor } = logClaimLine(context);
    const line = forcingLine(context, intercept);
    const footing = { hasFreeIntercept: intercept, predictor: 'total-forcing', countsHeatUptake: false } as const;
    const { value, draws } = numberOnFooting(context, footing, context.draws);
    const interval = interval90(draws);
    const effect = value - recomputation.value;
    const weight = context.weigh(value);
    const ratio = forcingRatio(line);
    const sameRows = fitLogRegression(line.rows, {
      anchor: procedure.anchor,
      intercept,
      covariance: serialCovariance,
    });
    const both = twoPredictors(line, intercept);
    const r = formatNumber(ratio.value, { decimals: 2 });
    const doubling = formatNumber(line.doublingWm2.best, { decimals: 2 });
    const slope = formatNumber(line.slope, { decimals: 3 });
    return outcome('omitted-forcings', {
      statistic: {
        label: 'ΔF total ÷ ΔF CO₂',
        value: ratio.value,
        p: null,
        interval: null,
        convention: `mean of the last ${ratio.nYears} years minus mean of the first ${ratio.nYears}, ${formatYears(ratio.span)}; CO₂ forcing ${line.co2ForcingWm2 ? 'from its series' : `as ${doubling} W/m² per doubling`}; slope errors: ${covarianceWords(serialCovariance)}`,
      },
      test: `slope on total forcing ${slope} K per W/m²; ΔF total is ${r} × ΔF CO₂`,
      alternative: {
        value,
        interval,
        quantity: recomputation.quantity,
        unit: recomputation.unit,
        label: 'on all forcings together',
      },
      effect,
      weight,
      reading: `From the start of the record to its end total forcing rose ${r} times as much as that of CO₂. On total forcing the slope is ${slope} K per W/m²; times ${doubling} W/m² for a doubling the number is ${showWithUnit(value)} (${formatInterval(interval)}, 5–95 %), against ${show(recomputation.value)} with all warming put on CO₂.`,
      proposal:
        weight === 'negligible'
          ? {
              mark: 'met',
              reason: `Putting the warming on all forcings moves the number by ${showShift(effect)} only.`,
            }
          : {
              mark: 'not met',
              reason: `Putting the warming on all forcings instead of CO₂ alone moves the number by ${showShift(effect)}.`,
            },
      sentence: `The number puts all warming on CO₂. Put on the total of all forcings, which rose ${r} times as much over these years, the same temperatures give ${show(value)} (${formatInterval(interval)}, 5–95 %) instead of ${showWithUnit(recomputation.value)}: a change of ${showShift(effect)}, ${weightWords[weight]}.`,
      table: {
        columns: ['Figure', 'Value', 'Standard error'],
        rows: [
          ['slope on total forcing (K per W/m²)', line.slope, line.slopeStandardError],
          [`forcing of a doubling, ${inputText(line.doublingWm2, 'W/m²')}`, line.doublingWm2.best, null],
          ['ΔF total (W/m²)', ratio.total, null],
          ['ΔF CO₂ (W/m²)', ratio.co2, null],
          [
            `number on CO₂ alone, same years (${recomputation.unit})`,
            sameRows.slope * factor,
            sameRows.slopeStandardError * factor,
          ],
          [`the same ÷ ratio (${recomputation.unit})`, (sameRows.slope * factor) / ratio.value, null],
          ...both.rows,
        ],
      },
      caveats: [...forcingCaveats(line), ...both.caveats, ...fitCaveats(line.regression)],
    });
  },

  rung(context) {
    const missing = forcingMissing(context.computation);
    if (missing) return { reason: `${missing.reason} ${missing.wouldNeed}` };
    return {
      label: 'All forcings, not CO₂ alone',
      change: (footing) => ({ ...footing, predictor: 'total-forcing' }),
      caveats: forcingCaveats(forcingLine(context, logClaimLine(context).intercept)),
    };
  },
};

/** Period means, so that one volcanic year at an end does not decide the ratio. */
function forcingRatio({ rows, forcingWm2, co2ForcingWm2, doublingWm2 }: ForcingLine) {
  const { years, logRatio } = rows;
  const nYears = Math.max(1, Math.min(10, Math.floor(years.length / 3)));
  const change = (values: readonly number[]) => mean(values.slice(-nYears)) - mean(values.slice(0, nYears));
  const total = change(forcingWm2);
  const co2 = change(co2ForcingWm2 ?? logRatio.map((x) => (doublingWm2.best * x) / Math.LN2));
  if (co2 === 0) {
    throw new NumericError({
      code: 'no-spread',
      where: 'omitted-forcings, CO₂',
      expected: 'a CO₂ forcing that changes from the start of the record to its end',
      received: 'no change',
    });
  }
  return { value: total / co2, total, co2, nYears, span: { start: years[0] ?? NaN, end: years.at(-1) ?? NaN } };
}

/** CO2 and everything else as two predictors, where CO2 forcing is given: are they two at all? */
function twoPredictors(
  line: ForcingLine,
  intercept: boolean,
): { rows: (string | number | null)[][]; caveats: Caveat[] } {
  const { co2ForcingWm2, forcingWm2, rows, doublingWm2 } = line;
  if (!co2ForcingWm2) return { rows: [], caveats: [] };
  const x = [co2ForcingWm2, forcingWm2.map((value, row) => value - (co2ForcingWm2[row] ?? NaN))];
  try {
    const y = rows.warmingK;
    const answer = regression({ x, y, intercept, covariance: { kind: 'classical' } });
    const columns = designColumns('omitted-forcings', x, y.length, intercept);
    const inflation = varianceInflation(leastSquares({ columns, y, caller: 'omitted-forcings' }), intercept);
    const place = intercept ? 1 : 0;
    return {
      rows: [
        ...['CO₂', 'all others'].flatMap((name, j) => [
          [
            `two predictors: slope on ${name} (K per W/m²)`,
            answer.coefficients[place + j] ?? null,
            answer.standardErrors[place + j] ?? null,
          ],
          [`two predictors: variance inflation of ${name}`, inflation[j] ?? null, null],
        ]),
        [
          'two predictors: forcing of a doubling × slope on CO₂ (K per doubling)',
          doublingWm2.best * (answer.coefficients[place] ?? NaN),
          null,
        ],
      ],
      caveats: answer.caveats.filter(({ code }) => code === 'collinear'),
    };
  } catch (error) {
    if (!(error instanceof NumericError)) throw error;
    return {
      rows: [],
      caveats: [
        {
          code: 'inseparable',
          detail:
            'CO₂ and the other forcings move exactly in step in these years: one regression cannot tell them apart.',
        },
      ],
    };
  }
}

/** W/m² from one year to the next: no slow forcing moves that fast, an eruption does. Common practice, no source. */
const largestSlowStepWm2 = 0.3;

function forcingCaveats({ yearsWithout, forcingWm2 }: ForcingLine): Caveat[] {
  const caveats: Caveat[] = [];
  if (yearsWithout.length > 0) {
    caveats.push({
      code: 'forcing-years-missing',
      detail: `No total forcing in ${formatYearList(yearsWithout)}: the line on forcing does without these years of the record. The table gives the number on CO₂ alone in the same years.`,
    });
  }
  const steps = forcingWm2.slice(1).map((value, row) => Math.abs(value - (forcingWm2[row] ?? NaN)));
  const largest = steps.reduce((most, step) => Math.max(most, step), 0);
  if (largest > largestSlowStepWm2) {
    caveats.push({
      code: 'forcing-with-eruptions',
      detail: `Total forcing steps by up to ${formatNumber(largest, { decimals: 1 })} W/m² from one year to the next, as after an eruption. Temperature answers over years, not within one, so the slope on forcing as it is comes out too low; the number ÷ ratio in the table does not depend on single years.`,
    });
  }
  return caveats;
}
