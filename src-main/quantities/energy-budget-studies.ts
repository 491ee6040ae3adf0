import type { EnergyBudgetStudy } from '../contract/published.ts';

type Input = EnergyBudgetStudy['warmingK'];

/** A central value with the half-width of its 5–95 % range. */
function within(best: number, halfWidth90: number): Input {
  return between(best, best - halfWidth90, best + halfWidth90);
}

function between(best: number, low: number, high: number, levelPercent = 90): Input {
  const printed = (value: number): number => Number(value.toFixed(6));
  return { best, range: { low: printed(low), high: printed(high), levelPercent } };
}

function alone(best: number): Input {
  return { best, range: null };
}

const lewisCurry2018 = {
  periods: '1869–1882 to 2007–2016',
  forcingWm2: alone(2.52),
  uptakeWm2: alone(0.5),
  doublingWm2: alone(3.8),
  provenance: 'memory' as const,
  remark: null,
};

/**
 * Studies of the historical energy budget, with what went in: EffCS = F2x ΔT/(ΔF − ΔN), TCR = F2x ΔT/ΔF. Of Otto et al. 2013
 * only two of five periods are here; the others could not be verified.
 */
export const energyBudgetStudies: readonly EnergyBudgetStudy[] = [
  {
    id: 'ar6',
    label: 'AR6 WG1, §7.5.2.1',
    periods: '1850–1900 to 2006–2019',
    warmingK: within(1.03, 0.2),
    forcingWm2: between(2.2, 1.53, 2.91),
    uptakeWm2: within(0.59, 0.35),
    doublingWm2: within(3.93, 0.47),
    effcsId: 'ar6-effcs-energy-budget',
    tcrId: 'ar6-tcr-energy-budget',
    provenance: 'seen',
    remark: '±0.47 read as the 5–95 % range.',
  },
  {
    id: 'otto-2013-2000s',
    label: 'Otto et al. 2013, 2000s',
    periods: '1860–1879 to 2000–2009',
    warmingK: within(0.75, 0.2),
    forcingWm2: within(1.95, 0.58),
    uptakeWm2: within(0.65, 0.27),
    doublingWm2: within(3.44, 0.34),
    effcsId: 'otto-2013-effcs',
    tcrId: 'otto-2013-tcr',
    provenance: 'second-hand',
    remark: 'Ranges and base period from memory. The forcing is 2.83 of greenhouse gases less 0.88.',
  },
  {
    id: 'otto-2013-1970-2009',
    label: 'Otto et al. 2013, 1970–2009',
    periods: '1860–1879 to 1970–2009',
    warmingK: within(0.48, 0.2),
    forcingWm2: within(1.21, 0.52),
    uptakeWm2: within(0.35, 0.13),
    doublingWm2: alone(3.44),
    effcsId: 'otto-2013-effcs-1970-2009',
    tcrId: 'otto-2013-tcr-1970-2009',
    provenance: 'memory',
    remark: null,
  },
  {
    ...lewisCurry2018,
    id: 'lewis-curry-2018',
    label: 'Lewis & Curry 2018, HadCRUT4',
    warmingK: alone(0.8),
    effcsId: 'lewis-curry-2018-effcs',
    tcrId: 'lewis-curry-2018-tcr',
  },
  {
    ...lewisCurry2018,
    id: 'lewis-curry-2018-infilled',
    label: 'Lewis & Curry 2018, infilled HadCRUT4',
    warmingK: alone(0.88),
    effcsId: 'lewis-curry-2018-effcs-infilled',
    tcrId: 'lewis-curry-2018-tcr-infilled',
  },
  {
    id: 'lewis-curry-2015',
    label: 'Lewis & Curry 2015',
    periods: '1859–1882 to 1995–2011',
    warmingK: alone(0.71),
    forcingWm2: alone(1.98),
    uptakeWm2: alone(0.36),
    doublingWm2: alone(3.71),
    effcsId: 'lewis-curry-2015-effcs',
    tcrId: 'lewis-curry-2015-tcr',
    provenance: 'memory',
    remark: null,
  },
  {
    id: 'gregory-2002',
    label: 'Gregory et al. 2002',
    periods: '1861–1900 to 1957–1994',
    warmingK: alone(0.335),
    forcingWm2: between(0.35, -0.3, 1, 95),
    uptakeWm2: alone(0.16),
    doublingWm2: alone(3.71),
    effcsId: 'gregory-2002-effcs',
    tcrId: null,
    provenance: 'memory',
    remark:
      'The published 6.1 is a median; the central inputs give 6.5. In 29 % of draws forcing does not exceed uptake.',
  },
  {
    id: 'sherwood-2020',
    label: 'Sherwood et al. 2020, historical evidence',
    periods: '1861–1880 to 2006–2018',
    warmingK: within(1.03, 0.14),
    forcingWm2: between(1.83, -0.03, 2.71),
    uptakeWm2: within(0.6, 0.18),
    doublingWm2: between(4, 3.7, 4.3, 68.3),
    effcsId: null,
    tcrId: null,
    provenance: 'memory',
    remark:
      'Warming and doubling second-hand, from the authors’ code; forcing and uptake from memory. No result of this line alone is on record here.',
  },
];
