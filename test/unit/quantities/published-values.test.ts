import { describe, expect, it } from 'vitest';
import { publishedValue } from '../../../src-main/contract/finding.ts';
import { publishedQuantityId, quantityId } from '../../../src-main/contract/primitives.ts';
import { likelihoods } from '../../../src-main/quantities/likelihoods.ts';
import { publishedBudget } from '../../../src-main/quantities/published-budget.ts';
import { publishedFor, publishedValues } from '../../../src-main/quantities/published-values.ts';
import { publishedQuantityNames, quantityNames } from '../../../src-main/quantities/quantity-names.ts';
import { expectClose } from '../../helpers/close.ts';

function value(id: string) {
  const found = publishedValues.find((candidate) => candidate.id === id);
  if (!found) throw new Error(`no published value ${id}`);
  return found;
}
const best = (id: string): number => value(id).best ?? NaN;
const sum = (ids: readonly string[]): number => ids.reduce((total, id) => total + best(id), 0);

describe('publishedValues', () => {
  it('fit the contract, each under its own id', () => {
    for (const one of publishedValues) expect(publishedValue.parse(one)).toEqual(one);
    expect(new Set(publishedValues.map(({ id }) => id)).size).toBe(publishedValues.length);
    expect(publishedValues.length).toBeGreaterThan(90);
  });

  it('say of what they are, in a unit of their quantity, where they stand, and something to hold a claim against', () => {
    for (const { id, quantity, subject, label, unit, edition, source, best: central, ranges } of publishedValues) {
      expect(publishedQuantityNames[quantity].units, id).toContain(unit);
      for (const words of [label, edition, source]) expect(words.trim(), id).not.toBe('');
      expect(central !== null || ranges.length > 0, id).toBe(true);
      const isOneOfAKind = publishedQuantityNames[quantity].units.includes('K per doubling');
      if (isOneOfAKind) expect(subject, id).toBe('');
    }
    const keys = publishedValues
      .filter(({ quantity }) => !publishedQuantityNames[quantity].units.includes('K per doubling'))
      .map(({ quantity, subject, edition }) => `${quantity} | ${subject} | ${edition}`);
    expect(new Set(keys).size, 'one value for each quantity, subject and edition').toBe(keys.length);
  });

  it('have ordered ranges around the best value, from narrow to wide, the wider one at the higher level', () => {
    for (const { best: central, ranges, id } of publishedValues) {
      for (const [index, { interval }] of ranges.entries()) {
        const low = interval.low ?? -Infinity;
        const high = interval.high ?? Infinity;
        expect(low, id).toBeLessThan(high);
        if (central !== null) expect(central >= low && central <= high, id).toBe(true);
        const narrower = ranges[index - 1]?.interval;
        if (!narrower) continue;
        expect(narrower.levelPercent, id).toBeLessThan(interval.levelPercent ?? NaN);
        expect((narrower.low ?? -Infinity) >= low && (narrower.high ?? Infinity) <= high, id).toBe(true);
      }
    }
  });

  it('state limits outside the inside of their ranges', () => {
    const limited = publishedValues.filter(({ limits }) => limits.length > 0);
    expect(limited.map(({ id }) => id)).toEqual(['ar6-ecs', 'ar5-ecs', 'ar5-tcr', 'ar4-ecs', 'ar4-tcr']);
    for (const { id, ranges, limits } of limited) {
      const { low, high } = ranges.at(-1)!.interval;
      for (const limit of limits) expect(limit.value <= low! || limit.value >= high!, id).toBe(true);
    }
  });

  it('use a likelihood word for the share that it stands for', () => {
    const meaning = Object.fromEntries(likelihoods.map(({ term, lowPercent }) => [term, lowPercent]));
    for (const { id, ranges } of publishedValues) {
      for (const { words, interval } of ranges) {
        if (words.startsWith('likely')) expect(interval.levelPercent, id).toBe(meaning['likely']);
        if (words.startsWith('very likely (')) expect(interval.levelPercent, id).toBe(meaning['very likely']);
        if (words.startsWith('5–95 %')) expect(interval.levelPercent, id).toBe(90);
      }
    }
  });

  // AR6 WG1 (2021), read there.
  it.each([
    ['ar6-ecs', 3, [66, 2.5, 4], [90, 2, 5]],
    ['ar6-ecs-process', 3.4, [66, 2.5, 5.1], [90, 2.1, 7.7]],
    ['ar6-tcr', 1.8, [66, 1.4, 2.2], [90, 1.2, 2.4]],
    ['ar6-tcr-process', 2, [66, 1.6, 2.7], [90, 1.3, 3.1]],
    ['ar6-effcs-energy-budget', 2.5, [90, 1.6, 4.8]],
    ['ar6-tcr-energy-budget', 1.9, [90, 1.3, 2.7]],
    ['ar6-ecs-pattern-observed', 3.5, [90, 1.7, 13.8]],
    ['ar6-ecs-pattern-models', 2.7, [90, 1.7, 5.9]],
    ['ar6-feedback', -1.16, [68.3, -1.56, -0.76], [90, -1.81, -0.51]],
    ['ar6-feedback-cloud', 0.42, [66, 0.12, 0.72], [90, -0.1, 0.94]],
    ['ar6-doubling', 3.93, [90, 3.46, 4.4]],
    ['ar6-erf-co2', 2.16, [90, 1.9, 2.41]],
    ['ar6-erf-ch4', 0.54, [90, 0.43, 0.65]],
    ['ar6-erf-n2o', 0.21, [90, 0.18, 0.24]],
    ['ar6-erf-halogenated', 0.41, [90, 0.33, 0.49]],
    ['ar6-erf-well-mixed', 3.32, [90, 3.03, 3.61]],
    ['ar6-erf-greenhouse-gases', 3.84, [90, 3.46, 4.22]],
    ['ar6-erf-ozone', 0.47, [90, 0.24, 0.71]],
    ['ar6-erf-aerosol', -1.1, [90, -1.7, -0.4]],
    ['ar6-erf-aerosol-2014', -1.3, [90, -2, -0.6]],
    ['ar6-erf-anthropogenic', 2.72, [90, 1.96, 3.48]],
    ['ar6-warming-2011-2020', 1.09, [90, 0.95, 1.2]],
    ['ar6-warming-2011-2020-land', 1.59, [90, 1.34, 1.83]],
    ['ar6-warming-2011-2020-ocean', 0.88, [90, 0.68, 1.01]],
    ['ar6-attributed-human', 1.07, [66, 0.8, 1.3]],
    ['ar6-imbalance-2006-2018', 0.79, [90, 0.52, 1.06]],
    ['ar6-imbalance-1971-2018', 0.57, [90, 0.43, 0.72]],
    ['ar6-inventory-2006-2018', 153, [90, 101, 206]],
    ['ar6-inventory-1971-2018', 435, [90, 325, 545]],
  ] as const)('%s is quoted as printed', (id, central, ...expected) => {
    expect(value(id)).toMatchObject({ best: central, provenance: 'seen', edition: 'IPCC AR6 WG1 (2021)' });
    const ranges = value(id).ranges.map(({ interval }) => [interval.levelPercent, interval.low, interval.high]);
    expect(ranges).toEqual(expected);
  });

  it('marks what was recalled and not looked up', () => {
    expect(publishedValues.filter(({ provenance }) => provenance === 'memory').map(({ id }) => id)).toEqual([
      'otto-2013-effcs-1970-2009',
      'lewis-curry-2015-effcs',
      'sherwood-2020-effcs',
      'gregory-2002-effcs',
      'otto-2013-tcr-1970-2009',
      'lewis-curry-2015-tcr',
      'ar5-ecs',
      'ar5-tcr',
      'ar4-tcr',
      'tar-ecs',
      'far-ecs',
      'ar6-feedback-planck',
      'ar6-feedback-water-vapour',
      'ar6-feedback-albedo',
      'ar6-feedback-biogeochemical',
      'ar6-erf-solar',
      'ar5-rf-anthropogenic',
      'ar5-rf-co2',
      'ar4-rf-anthropogenic',
      'ar5-imbalance-1971-2010',
    ]);
  });

  it('has values of the same quantity only, the current assessment first, and none for an apparent sensitivity', () => {
    expect(publishedFor('apparent-sensitivity')).toEqual([]);
    for (const quantity of publishedQuantityId.options)
      expect(publishedFor(quantity).every((one) => one.quantity === quantity)).toBe(true);
    const firsts = [
      'equilibrium-climate-sensitivity',
      'transient-climate-response',
      'feedback-parameter',
      'effective-doubling-forcing',
      'effective-radiative-forcing',
      'energy-imbalance',
      'warming',
    ] as const;
    for (const quantity of firsts) expect(publishedFor(quantity)[0]?.edition, quantity).toBe('IPCC AR6 WG1 (2021)');
    expect(publishedFor('equilibrium-climate-sensitivity')[0]?.id).toBe('ar6-ecs');
    expect(publishedFor('transient-climate-response')[0]?.id).toBe('ar6-tcr');
  });

  it('says which of two readings it takes of the doubling forcing’s uncertainty', () => {
    expect(publishedBudget.doublingWm2).toMatchObject({ best: 3.93, low: 3.46, high: 4.4, levelPercent: 90 });
    expect(publishedBudget.doublingWm2.source).toContain('5–95 %');
    // The other reading, one standard deviation, would be wider by the normal 95 % point.
    expect(0.47 * 1.645).toBeCloseTo(0.77, 2);
  });
});

describe('published values that belong together', () => {
  const terms = (n: number, unit = 0.005) => ({
    rel: 0,
    abs: n * unit + 1e-12,
    why: 'half a unit of each printed term',
  });

  it('AR6’s feedback terms add up to its net feedback', () => {
    const ids = ['planck', 'water-vapour', 'albedo', 'cloud', 'biogeochemical'].map((id) => `ar6-feedback-${id}`);
    expectClose(sum(ids), best('ar6-feedback'), terms(1));
  });

  it('AR6’s sensitivity from processes is about 3.93/1.16, its doubling forcing 1.05 times the adjusted one', () => {
    const processEcs = best('ar6-ecs-process');
    expectClose(-best('ar6-doubling') / best('ar6-feedback'), processEcs, terms(1, 0.05));
    const factor = 1 + best('ar6-adjustment-co2') / 100;
    expectClose(factor * best('ar6-doubling-adjusted'), best('ar6-doubling'), terms(2));
  });

  it('AR6’s TCR from processes is about F2x/(κ − α)', () => {
    const approximate = best('ar6-doubling') / (best('ar6-ocean-uptake') - best('ar6-feedback'));
    expectClose(approximate, best('ar6-tcr-process'), terms(1, 0.05));
  });

  it('Sherwood’s terms add up to −1.30, their standard deviations in quadrature to 0.44, and S to 3.08', () => {
    const all = publishedValues.filter(({ id }) => id.startsWith('sherwood-2020-feedback-'));
    expect(all).toHaveLength(6);
    expectClose(sum(all.map(({ id }) => id)), best('sherwood-2020-feedback'), { rel: 1e-12, abs: 0, why: 'rounding' });
    const deviations = all.map(({ ranges }) => (ranges[0]!.interval.high! - ranges[0]!.interval.low!) / 2);
    expectClose(Math.hypot(...deviations), 0.44, terms(1));
    const printed = value('sherwood-2020-feedback').ranges[0]!.interval;
    expectClose((printed.high! - printed.low!) / 2, 0.44, { rel: 1e-12, abs: 0, why: 'rounding' });
    expectClose(-best('sherwood-2020-doubling') / best('sherwood-2020-feedback'), 3.08, terms(1));
  });

  it('AR6’s forcings add up: well-mixed gases, all greenhouse gases, all human influences', () => {
    const erf = (...agents: string[]) => sum(agents.map((agent) => `ar6-erf-${agent}`));
    expectClose(erf('co2', 'ch4', 'n2o', 'halogenated'), best('ar6-erf-well-mixed'), terms(4));
    expectClose(erf('well-mixed', 'ozone', 'stratospheric-water'), best('ar6-erf-greenhouse-gases'), terms(3));
    // The aerosol term is printed to a tenth only.
    const total = erf('greenhouse-gases', 'land-use', 'black-carbon-on-snow', 'contrails', 'aerosol');
    expectClose(total, best('ar6-erf-anthropogenic'), terms(1, 0.05 + 4 * 0.005));
    expectClose(erf('aerosol-radiation-2014', 'aerosol-cloud-2014'), best('ar6-erf-aerosol-2014'), terms(1));
  });

  it('AR6’s imbalance is its energy gain over the Earth’s surface and the years', () => {
    const surfaceM2 = 5.10072e14;
    const secondsPerYr = 365.25 * 86_400;
    const imbalance = (id: string, years: number): number => (best(id) * 1e21) / (surfaceM2 * years * secondsPerYr);
    const long = imbalance('ar6-inventory-1971-2018', 47);
    const short = imbalance('ar6-inventory-2006-2018', 12);
    expectClose([long, short], [0.575, 0.792], terms(1, 0.0005));
    expectClose(long, best('ar6-imbalance-1971-2018'), terms(1, 0.0055));
    expectClose(short, best('ar6-imbalance-2006-2018'), terms(1));
  });

  it('the shares of the energy gain make up all of it, and AR6’s causes the warming', () => {
    const shares = publishedFor('inventory-share').map(({ id }) => id);
    expect(sum(shares)).toBe(100);
    const causes = ['ar6-attributed-greenhouse-gases', 'ar6-attributed-other-human'];
    expectClose(sum(causes), best('ar6-attributed-human'), terms(1, 0.05));
  });

  it('AR5’s adjusted forcing of a doubling is 5.35 ln 2', () => {
    expectClose(5.35 * Math.LN2, best('ar5-doubling-adjusted'), terms(1));
  });
});

describe('quantityNames', () => {
  it('name and define every quantity', () => {
    expect(Object.keys(quantityNames).sort()).toEqual([...quantityId.options].sort());
    expect(Object.keys(publishedQuantityNames).sort()).toEqual([...publishedQuantityId.options].sort());
    for (const { label, definition, units } of Object.values(publishedQuantityNames)) {
      expect(label).not.toBe('');
      expect(definition).toMatch(/\.$/);
      expect(units.length).toBeGreaterThan(0);
    }
  });

  it('does not call b·ln 2 a climate sensitivity', () => {
    expect(quantityNames['apparent-sensitivity'].definition).toMatch(/none of ECS/);
  });
});
