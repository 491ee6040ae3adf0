import { describe, expect, it } from 'vitest';
import { budgetCaveats } from '../../../../src-main/climate/carbon/budget-caveats.ts';
import { budgetColumns } from '../../../../src-main/climate/carbon/budget-columns.ts';
import { budgetUnitDoubt } from '../../../../src-main/climate/carbon/budget-unit-doubt.ts';
import { carbonBudget } from '../../../../src-main/climate/carbon/carbon-budget.ts';
import type { CarbonBudgetInput } from '../../../../src-main/contract/carbon.ts';
import { InputError } from '../../../../src-main/errors.ts';

/** Invented: a decade of the size of the 1960s. */
const years = Array.from({ length: 10 }, (_, t) => 1960 + t);
const fossil = years.map((_, t) => 2.5 + 0.13 * t);
const landUse = years.map((_, t) => 1.5 - 0.02 * t);
const growth = years.map((_, t) => 1.7 + 0.4 * Math.sin(2 * t));
const budget = {
  years,
  fossilGtCPerYr: fossil,
  landUseGtCPerYr: landUse,
  growthGtCPerYr: growth,
} satisfies CarbonBudgetInput;
const times = (values: readonly number[], factor: number) => values.map((value) => value * factor);
const { growthGtCPerYr: _, ...withoutGrowth } = budget;
const inPpm = (factor: number) => ({ ...withoutGrowth, growthPpmPerYr: times(growth, factor) });

const doubtOf = (input: CarbonBudgetInput) => budgetUnitDoubt(input, budgetColumns(input));
function errorOf(input: CarbonBudgetInput): InputError['fields'] {
  try {
    carbonBudget(input);
  } catch (error) {
    if (error instanceof InputError) return error.fields;
  }
  throw new Error('no InputError');
}

describe('budgetUnitDoubt', () => {
  it('suspects nothing of right units, with years or without, in GtC or in ppm', () => {
    expect(doubtOf(budget)).toBeNull();
    expect(doubtOf({ ...budget, years: undefined })).toBeNull();
    expect(doubtOf(inPpm(1 / 2.124))).toBeNull();
    // A year after a great eruption: growth a fifth of emissions. And a year of a strong El Niño.
    expect(doubtOf({ ...budget, growthGtCPerYr: times(fossil, 0.45) })).toBeNull();
    expect(doubtOf({ ...budget, growthGtCPerYr: times(fossil, 1.2) })).toBeNull();
  });

  const everything = { ...budget, fossilGtCPerYr: times(fossil, 3.664), landUseGtCPerYr: times(landUse, 3.664) };
  it.each<[string, CarbonBudgetInput, string, string]>([
    ['all of it in GtCO2', { ...everything, growthGtCPerYr: times(growth, 3.664) }, 'fossilGtCPerYr', 'GtCO2'],
    ['emissions in GtCO2', everything, 'fossilGtCPerYr', 'GtCO2'],
    ['emissions in GtCO2, without years', { ...everything, years: undefined }, 'fossilGtCPerYr', 'GtCO2'],
    ['growth in GtCO2', { ...budget, growthGtCPerYr: times(growth, 3.664) }, 'growthGtCPerYr', 'GtCO2'],
    ['growth in ppm', { ...budget, growthGtCPerYr: times(growth, 1 / 2.124) }, 'growthGtCPerYr', 'growthPpmPerYr'],
    ['growth in GtC called ppm', inPpm(1), 'growthPpmPerYr', 'growthGtCPerYr'],
    [
      'today’s emissions in GtCO2, without years',
      { fossilGtCPerYr: [37, 37.2], landUseGtCPerYr: [4, 4], growthGtCPerYr: [19, 20] },
      'fossilGtCPerYr',
      'which gives 10.1',
    ],
  ])('%s is refused, and the way out named', (_, input, field, hint) => {
    const error = errorOf(input);
    expect(error).toMatchObject({ code: 'suspected-unit', where: `carbonBudget, ${field}` });
    expect(error.hint).toContain(hint);
    expect(error.hint).toContain('unitConfirmed');
    const { caveats } = carbonBudget({ ...input, unitConfirmed: true });
    expect(caveats.find(({ code }) => code === 'suspected-unit')?.detail).toContain(hint);
  });

  it('of a few years it is a caveat: they can be that way', () => {
    const few = { fossilGtCPerYr: [6.1], landUseGtCPerYr: [1.5], growthGtCPerYr: [1.5] };
    expect(doubtOf(few)).toMatchObject({ isCertain: false });
    expect(carbonBudget(few).caveats.map(({ code }) => code)).toContain('suspected-unit');
  });
});

describe('budgetColumns', () => {
  it('converts growth and takes carbonation off', () => {
    const columns = budgetColumns({
      fossilGtCPerYr: [8],
      landUseGtCPerYr: [1],
      growthPpmPerYr: [2],
      gtCPerPpm: 2.13,
      cementCarbonationGtCPerYr: [0.25],
    });
    expect([columns.fossil[0], columns.growth[0]]).toEqual([7.75, 4.26]);
    expect(columns.oceanSink).toBeNull();
    expect(budgetColumns({ fossilGtCPerYr: [8], landUseGtCPerYr: [1], growthPpmPerYr: [2] }).growth[0]).toBe(4.248);
  });

  it.each<[string, Partial<CarbonBudgetInput>, string, string]>([
    ['land use of another length', { landUseGtCPerYr: [1] }, 'wrong-length', 'carbonBudget, landUseGtCPerYr'],
    ['growth of another length', { growthGtCPerYr: [1] }, 'wrong-length', 'carbonBudget, growthGtCPerYr'],
    ['sinks of another length', { oceanSinkGtCPerYr: [1] }, 'wrong-length', 'carbonBudget, oceanSinkGtCPerYr'],
    ['land sinks of another length', { landSinkGtCPerYr: [1] }, 'wrong-length', 'carbonBudget, landSinkGtCPerYr'],
    ['years of another length', { years: [1960] }, 'wrong-length', 'carbonBudget, years'],
    ['a year twice', { years: years.with(4, 1963) }, 'unordered-years', 'carbonBudget, years[4]'],
    ['a missing value', { landUseGtCPerYr: landUse.with(2, NaN) }, 'not-finite', 'carbonBudget, landUseGtCPerYr[2]'],
    ['negative emissions', { fossilGtCPerYr: fossil.with(0, -1) }, 'negative', 'carbonBudget, fossilGtCPerYr[0]'],
    [
      'carbonation with the sign of an emission',
      { cementCarbonationGtCPerYr: years.map(() => -0.1) },
      'negative',
      'carbonBudget, cementCarbonationGtCPerYr[0]',
    ],
    ['GtCO2 per ppm', { gtCPerPpm: 7.78 }, 'out-of-range', 'carbonBudget, gtCPerPpm'],
  ])('refuses %s', (_, change, code, where) => {
    expect(errorOf({ ...budget, ...change })).toMatchObject({ code, where });
  });

  it('a year of no emissions has no airborne fraction', () => {
    const value = carbonBudget({ fossilGtCPerYr: [0], landUseGtCPerYr: [0.3], growthGtCPerYr: [0.1] });
    expect(value.airborneFractionOfFossil).toEqual([null]);
    expect(value.mean.airborneFractionOfFossil).toBeNull();
    expect(value.mean.airborneFractionOfTotal).toBeCloseTo(1 / 3, 12);
  });

  it('an ocean sink alone leaves the rest to the land; a land sink alone closes nothing', () => {
    const withOcean = carbonBudget({ ...budget, oceanSinkGtCPerYr: times(fossil, 0.3) });
    expect(withOcean).toHaveProperty('residualLandSinkGtCPerYr');
    expect(withOcean).not.toHaveProperty('imbalanceGtCPerYr');
    const withLand = carbonBudget({ ...budget, landSinkGtCPerYr: times(fossil, 0.3) });
    expect(withLand).not.toHaveProperty('residualLandSinkGtCPerYr');
    expect(withLand).not.toHaveProperty('imbalanceGtCPerYr');
  });
});

describe('budgetCaveats', () => {
  const codes = (input: CarbonBudgetInput) => budgetCaveats(input, null).map(({ code }) => code);

  it('says how cement carbonation was treated', () => {
    expect(codes(budget)).toEqual(['carbonation-as-given']);
    expect(codes({ ...budget, cementCarbonationGtCPerYr: times(fossil, 0.02) })).toEqual(['carbonation-deducted']);
  });

  it('suspects the sign of sinks that are all negative', () => {
    expect(codes({ ...budget, oceanSinkGtCPerYr: times(fossil, -0.3) })).toContain('suspected-sign');
    expect(codes({ ...budget, landSinkGtCPerYr: times(fossil, -0.3) })).toContain('suspected-sign');
    expect(codes({ ...budget, landSinkGtCPerYr: times(fossil, -0.3).with(3, 0.1) })).not.toContain('suspected-sign');
  });

  it('names the factor and the other ones in use', () => {
    const caveat = (gtCPerPpm?: number) =>
      budgetCaveats({ ...inPpm(0.47), gtCPerPpm }, null).find(({ code }) => code === 'converted-from-ppm')?.detail;
    expect(caveat()).toContain('with 2.124 GtC per ppm; 2.12, 2.123, 2.13 are');
    expect(caveat(2.13)).toContain('with 2.13 GtC per ppm; 2.124, 2.12, 2.123 are');
  });
});
