import { describe, expect, it } from 'vitest';
import { likelihoodTerm } from '../../../src-main/contract/finding.ts';
import {
  energyBudgetStudy,
  likelihoodMeaning,
  publishedConflict,
  publishedDefinition,
} from '../../../src-main/contract/published.ts';
import { energyBudgetStudies } from '../../../src-main/quantities/energy-budget-studies.ts';
import { likelihoods } from '../../../src-main/quantities/likelihoods.ts';
import { publishedBudget } from '../../../src-main/quantities/published-budget.ts';
import { publishedConflicts } from '../../../src-main/quantities/published-conflicts.ts';
import { publishedDefinitions } from '../../../src-main/quantities/published-definitions.ts';
import { publishedValues } from '../../../src-main/quantities/published-values.ts';
import { expectClose } from '../../helpers/close.ts';

const ids = publishedValues.map(({ id }) => id);
const best = (id: string | null): number => publishedValues.find((value) => value.id === id)?.best ?? NaN;
const printed = (digits: number) => ({
  rel: 0,
  abs: 0.5 * 10 ** -digits,
  why: 'half a unit of the last printed digit',
});

describe('likelihoods', () => {
  it('have a meaning for each word, ordered, the negative ones mirrored', () => {
    for (const one of likelihoods) expect(likelihoodMeaning.parse(one)).toEqual(one);
    expect(likelihoods.map(({ term }) => term)).toEqual(likelihoodTerm.options);
    const meaning = (term: string) => likelihoods.find((one) => one.term === term)!;
    for (const [yes, no] of [
      ['extremely likely', 'extremely unlikely'],
      ['very likely', 'very unlikely'],
      ['virtually certain', 'exceptionally unlikely'],
    ]) {
      expect(100 - meaning(yes!).lowPercent).toBe(meaning(no!).highPercent);
      expect([meaning(yes!).highPercent, meaning(no!).lowPercent]).toEqual([100, 0]);
    }
    expect(meaning('likely')).toMatchObject({ lowPercent: 66, highPercent: 100 });
    expect(meaning('about as likely as not')).toMatchObject({ lowPercent: 33, highPercent: 66 });
  });
});

describe('publishedDefinitions', () => {
  it('are of quantities that have values', () => {
    for (const one of publishedDefinitions) {
      expect(publishedDefinition.parse(one)).toEqual(one);
      expect(publishedValues.some(({ quantity }) => quantity === one.quantity)).toBe(true);
    }
  });

  it('1.01ⁿ = 2 at n = 69.66 years', () => {
    expectClose(Math.LN2 / Math.log(1.01), 69.66, printed(2));
    expect(publishedDefinitions.some(({ text }) => text.includes('69.66 years'))).toBe(true);
  });
});

describe('energyBudgetStudies', () => {
  it('fit the contract and name published values', () => {
    for (const study of energyBudgetStudies) {
      expect(energyBudgetStudy.parse(study)).toEqual(study);
      for (const id of [study.effcsId, study.tcrId]) if (id !== null) expect(ids).toContain(id);
      for (const { best: central, range } of [study.warmingK, study.forcingWm2, study.uptakeWm2, study.doublingWm2])
        if (range) expect(range.low < central && central < range.high, study.id).toBe(true);
    }
  });

  // Worked by hand from the central inputs.
  it.each([
    ['gregory-2002', 6.541, 3.551, 0.567],
    ['otto-2013-2000s', 1.985, 1.323, 1.733],
    ['otto-2013-1970-2009', 1.92, 1.365, 1.792],
    ['lewis-curry-2015', 1.626, 1.33, 2.282],
    ['lewis-curry-2018', 1.505, 1.206, 2.525],
    ['lewis-curry-2018-infilled', 1.655, 1.327, 2.295],
    ['ar6', 2.514, 1.84, 1.563],
    ['sherwood-2020', 3.35, 2.251, 1.194],
  ])('%s: the central inputs give %d and %d K per doubling, λ = %d', (id, effcs, tcr, lambda) => {
    const { warmingK: t, forcingWm2: f, uptakeWm2: n, doublingWm2: d } = energyBudgetStudies.find((s) => s.id === id)!;
    const net = f.best - n.best;
    const found = [(d.best * t.best) / net, (d.best * t.best) / f.best, net / t.best];
    expectClose(found, [effcs, tcr, lambda], printed(3));
  });

  it('come to their published values, within what the printed digits leave open', () => {
    const half = (value: number): number => 0.5 * 10 ** -(String(value).split('.')[1]?.length ?? 0);
    for (const study of energyBudgetStudies) {
      const { warmingK: t, forcingWm2: f, uptakeWm2: n, doublingWm2: d } = study;
      // Inputs are printed to two decimals where String() may show one.
      const ends = (value: number): [number, number] => [value - 0.005, value + 0.005];
      const [warming, forcing, uptake, doubling] = [t, f, n, d].map(({ best: central }) => ends(central));
      const reach = (net: [number, number]): [number, number] => [
        (doubling![0] * warming![0]) / net[1],
        (doubling![1] * warming![1]) / net[0],
      ];
      const overlaps = ([low, high]: [number, number], id: string): boolean =>
        high >= best(id) - half(best(id)) && low <= best(id) + half(best(id));
      // The published 6.1 is a median, not the ratio of the central values.
      if (study.effcsId !== null && study.id !== 'gregory-2002')
        expect(overlaps(reach([forcing![0] - uptake![1], forcing![1] - uptake![0]]), study.effcsId), study.id).toBe(
          true,
        );
      if (study.tcrId !== null) expect(overlaps(reach(forcing!), study.tcrId), study.id).toBe(true);
    }
  });

  it('have AR6’s budget as the one that is offered for a claim', () => {
    const { warmingK, forcingWm2, uptakeWm2, doublingWm2 } = energyBudgetStudies.find(({ id }) => id === 'ar6')!;
    for (const [name, { best, range }] of Object.entries({ warmingK, forcingWm2, uptakeWm2, doublingWm2 })) {
      const offered = publishedBudget[name as keyof typeof publishedBudget];
      expectClose([offered.best, offered.low, offered.high], [best, range!.low, range!.high], {
        rel: 1e-12,
        abs: 0,
        why: 'rounding',
      });
    }
  });
});

describe('publishedConflicts', () => {
  const conflict = (id: string) => publishedConflicts.find((one) => one.id === id)!;
  const values = (id: string): number[] => conflict(id).readings.map(({ value }) => value);

  it('fit the contract and name published values', () => {
    for (const one of publishedConflicts) {
      expect(publishedConflict.parse(one)).toEqual(one);
      for (const id of one.valueIds) expect(ids, one.id).toContain(id);
      expect(new Set(one.readings.map(({ value }) => value)).size, one.id).toBe(one.readings.length);
    }
  });

  it('±0.47 as a 5–95 % range is a standard deviation of 0.286, and 12 % of 3.93', () => {
    expectClose(values('ar6-doubling-uncertainty'), [0.47 / 1.645, 0.47], printed(3));
    expectClose(0.12 * best('ar6-doubling'), 0.47, printed(2));
  });

  it('the pattern effect with the printed sign gives 1.90, with the other 3.70', () => {
    const alpha = -(2.2 - 0.59) / 1.03;
    const found = [3.93 / (-alpha + 0.5), -3.93 / (alpha + 0.5)];
    expectClose(found, values('ar6-pattern-sign'), printed(2));
    expect(best('ar6-ecs-pattern-observed')).toBeGreaterThan(best('ar6-effcs-energy-budget'));
  });

  it('AR6’s central inputs give a TCR of 1.84; their rounding alone reaches 1.855', () => {
    expectClose([1.9, (3.93 * 1.03) / 2.2], values('ar6-tcr-central'), printed(2));
    expectClose((3.935 * 1.035) / 2.195, 1.855, printed(3));
    expect(best('ar6-tcr-energy-budget')).toBe(1.9);
  });

  it('the data file that goes with AR6 does not round to the printed forcings', () => {
    expect(values('ar6-erf-data-file')).toEqual([best('ar6-erf-anthropogenic'), 2.68047]);
    expect(Math.abs(2.68047 - best('ar6-erf-anthropogenic'))).toBeGreaterThan(0.005);
    expect(Math.abs(2.14886 - best('ar6-erf-co2'))).toBeGreaterThan(0.005);
  });

  it('AR6 quotes twice the uncertainty of AR5’s CO2 forcing', () => {
    const [first, second] = values('ar5-co2-uncertainty');
    expect(second).toBe(2 * first!);
    const { interval } = publishedValues.find(({ id }) => id === 'ar5-rf-co2')!.ranges[0]!;
    expectClose((interval.high! - interval.low!) / 2, first!, { rel: 1e-12, abs: 0, why: 'rounding' });
  });
});
