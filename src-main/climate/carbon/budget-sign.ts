import type { CarbonBudgetValue } from '../../contract/carbon.ts';
import { formatNumber } from '../../quantities/notation.ts';
import { mean } from '../../statistics/summation.ts';

/**
 * In how many years nature took up more carbon than it gave off, counted and said in a sentence.
 *
 * @param naturalNetFlux  [nYears] GtC/yr, into the atmosphere positive; a year at exactly zero is neither sink nor source
 * @param years           [nYears], or none: rows are then numbered from 0
 * @returns  counts, the years that are no sink, the sentence
 * @throws   InputError `too-few-values`
 *
 * Checked   test/unit/climate/carbon/budget-sign.test.ts (C: by hand)
 */
export function budgetSign(naturalNetFlux: readonly number[], years?: readonly number[]): CarbonBudgetValue['sign'] {
  const nYears = naturalNetFlux.length;
  const nSinkYears = naturalNetFlux.filter((flux) => flux < 0).length;
  const average = mean(naturalNetFlux);
  const size = `${formatNumber(Math.abs(average), 1)} GtC per year`;
  const onAverage =
    average === 0
      ? 'On average its net flux is zero'
      : `On average it ${average < 0 ? 'takes up' : 'gives off'} ${size}`;
  return {
    nSinkYears,
    nSourceYears: naturalNetFlux.filter((flux) => flux > 0).length,
    nYears,
    exceptions: naturalNetFlux.flatMap((flux, t) => (flux < 0 ? [] : [years?.[t] ?? t])),
    statement: `Nature is a net sink in ${nSinkYears} of ${nYears} ${nYears === 1 ? 'year' : 'years'}. ${onAverage}.`,
  };
}
