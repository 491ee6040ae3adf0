import type { CarbonBudgetInput } from '../../contract/carbon.ts';
import type { Caveat } from '../../contract/primitives.ts';
import { errorSentence, type ErrorFields } from '../../errors.ts';
import { gtCPerPpm as usualGtCPerPpm, otherGtCPerPpm } from '../../quantities/carbon-units.ts';

/**
 * What must stand beside a carbon budget.
 *
 * @param doubt  about the unit, when it was confirmed or rests on few years
 * @returns  suspected-unit, suspected-sign, carbonation-deducted or carbonation-as-given, converted-from-ppm
 *
 * Checked   test/unit/climate/carbon/carbon-budget.test.ts (C: each on and off)
 */
export function budgetCaveats(input: CarbonBudgetInput, doubt: ErrorFields | null): Caveat[] {
  const sinks = { oceanSinkGtCPerYr: input.oceanSinkGtCPerYr, landSinkGtCPerYr: input.landSinkGtCPerYr };
  return [
    ...(doubt ? [{ code: 'suspected-unit', detail: errorSentence(doubt) }] : []),
    ...Object.entries(sinks).flatMap(([name, values]) =>
      values?.every((value) => value < 0)
        ? [
            {
              code: 'suspected-sign',
              detail: `Every value of ${name} is negative. Sinks are positive here; with the other sign the residual comes out too large.`,
            },
          ]
        : [],
    ),
    carbonation(input),
    ...conversion(input),
  ];
}

function carbonation({ cementCarbonationGtCPerYr }: CarbonBudgetInput): Caveat {
  return cementCarbonationGtCPerYr
    ? {
        code: 'carbonation-deducted',
        detail: 'Cement carbonation, a sink, was taken off the fossil emissions, which are gross of it.',
      }
    : {
        code: 'carbonation-as-given',
        detail:
          'Fossil emissions as given; whether they are net of cement carbonation (about 0.2 GtC per year today, from memory) is for their source to say.',
      };
}

function conversion({ growthPpmPerYr, gtCPerPpm = usualGtCPerPpm }: CarbonBudgetInput): Caveat[] {
  if (!growthPpmPerYr) return [];
  const others = [usualGtCPerPpm, ...otherGtCPerPpm.map((other) => other.gtCPerPpm)].filter(
    (factor) => factor !== gtCPerPpm,
  );
  return [
    {
      code: 'converted-from-ppm',
      detail: `Growth was converted with ${gtCPerPpm} GtC per ppm; ${others.join(', ')} are also in use and move it by up to 0.5 %.`,
    },
  ];
}
