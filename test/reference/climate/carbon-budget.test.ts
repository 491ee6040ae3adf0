import { describe, expect, it } from 'vitest';
import { carbonBudget } from '../../../src-main/climate/carbon/carbon-budget.ts';
import { expectClose } from '../../helpers/close.ts';

// Decadal means of the Global Carbon Budget, GtC/yr, fossil emissions net of cement carbonation. From memory but for: the
// land-use value of 2024, seen in its summary; the land sink of 2024, second-hand.
const gcb2024 = { fossil: 9.7, landUse: 1.1, growth: 5.2, ocean: 2.9, land: 3.2 };
const gcb2023 = { fossil: 9.6, landUse: 1.3, growth: 5.2, ocean: 2.8, land: 3.3 };

const budgetOf = ({ fossil, landUse, growth, ocean, land }: typeof gcb2024) =>
  carbonBudget({
    fossilGtCPerYr: [fossil],
    landUseGtCPerYr: [landUse],
    growthGtCPerYr: [growth],
    oceanSinkGtCPerYr: [ocean],
    landSinkGtCPerYr: [land],
  });
const near = { rel: 1e-12, abs: 1e-12, why: 'sums of a few numbers of one decimal' };
/** Five terms, each rounded to 0.1. */
const closing = { rel: 0, abs: 0.25, why: 'five terms rounded to one decimal' };

describe('carbonBudget', () => {
  it('Global Carbon Budget 2024, 2014–2023: nature takes up 5.6; imbalance −0.5 from rounded terms, printed −0.4', () => {
    const { mean, sign } = budgetOf(gcb2024);
    expectClose(mean.emissionsGtCPerYr, 10.8, near);
    expectClose(mean.naturalNetFluxGtCPerYr, -5.6, near);
    expectClose(mean.imbalanceGtCPerYr, -0.5, near);
    expectClose(mean.imbalanceGtCPerYr, -0.4, closing);
    expectClose(mean.residualLandSinkGtCPerYr, 2.7, near);
    expectClose(mean.airborneFractionOfTotal, 5.2 / 10.8, near);
    expectClose(mean.airborneFractionOfFossil, 5.2 / 9.7, near);
    expect(sign.statement).toBe('Nature is a net sink in 1 of 1 year. On average it takes up 5.6 GtC per year.');
  });

  it('Global Carbon Budget 2023, 2013–2022: imbalance −0.4', () => {
    const { mean } = budgetOf(gcb2023);
    expectClose(mean.imbalanceGtCPerYr, -0.4, near);
    expectClose(mean.naturalNetFluxGtCPerYr, -5.7, near);
  });

  it('about 2.5 ppm a year are the 5.2 GtC of the same decade', () => {
    const rounded = { rel: 0, abs: 0.05 * 2.124 + 0.05, why: 'half a unit of 2.5 ppm and of 5.2 GtC' };
    const { mean } = carbonBudget({ fossilGtCPerYr: [9.7], landUseGtCPerYr: [1.1], growthPpmPerYr: [2.5] });
    expectClose(mean.growthGtCPerYr, 5.2, rounded);
  });

  it('by hand: two years, carbonation taken off, fractions of the sums', () => {
    const value = carbonBudget({
      years: [2001, 2002],
      fossilGtCPerYr: [7, 8],
      landUseGtCPerYr: [2, 1],
      growthGtCPerYr: [3, 10],
      cementCarbonationGtCPerYr: [0.5, 1],
      oceanSinkGtCPerYr: [2, 2.5],
      landSinkGtCPerYr: [3, -4],
    });
    const { caveats, ...numbers } = value;
    expectClose(
      numbers,
      {
        emissionsGtCPerYr: [8.5, 8],
        growthGtCPerYr: [3, 10],
        naturalNetFluxGtCPerYr: [-5.5, 2],
        airborneFractionOfTotal: [3 / 8.5, 10 / 8],
        airborneFractionOfFossil: [3 / 6.5, 10 / 7],
        residualLandSinkGtCPerYr: [3.5, -4.5],
        imbalanceGtCPerYr: [0.5, -0.5],
        mean: {
          emissionsGtCPerYr: 8.25,
          growthGtCPerYr: 6.5,
          naturalNetFluxGtCPerYr: -1.75,
          airborneFractionOfTotal: 13 / 16.5,
          airborneFractionOfFossil: 13 / 13.5,
          residualLandSinkGtCPerYr: -0.5,
          imbalanceGtCPerYr: 0,
        },
        sign: {
          nSinkYears: 1,
          nSourceYears: 1,
          nYears: 2,
          exceptions: [2002],
          statement: 'Nature is a net sink in 1 of 2 years. On average it takes up 1.8 GtC per year.',
        },
      },
      near,
    );
    expect(caveats.map(({ code }) => code)).toEqual(['carbonation-deducted']);
  });
});
