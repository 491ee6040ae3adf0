import type { PublishedValue } from '../../contract/finding.ts';
import { ar5, ar6, publishedEntry, range90, standardDeviation } from './published-entry.ts';

const unit = 'W/m²';

const adjustments = [
  ['co2', 'CO₂', 5, 5, 12],
  ['ch4', 'CH₄', -14, 15, 20],
  ['n2o', 'N₂O', 7, 13, 16],
] as const;

/** Forcing of doubled CO2, and what makes effective forcing of adjusted forcing. */
export const doublingForcings: readonly PublishedValue[] = [
  publishedEntry({
    id: 'ar6-doubling',
    quantity: 'effective-doubling-forcing',
    label: 'AR6 effective forcing of a CO₂ doubling',
    best: 3.93,
    ranges: [range90(3.46, 4.4)],
    unit,
    edition: ar6,
    source: 'Chapter 7, §7.3.2',
    provenance: 'seen',
    remark:
      '±12 %, that is ±0.47, as the 5–95 % range where it is derived; §7.5.1 calls the same ±0.47 one standard deviation.',
  }),
  publishedEntry({
    id: 'sherwood-2020-doubling',
    quantity: 'effective-doubling-forcing',
    label: 'Sherwood et al. 2020, effective forcing of a CO₂ doubling',
    best: 4,
    ranges: [standardDeviation(3.7, 4.3)],
    unit,
    edition: 'Sherwood et al. 2020',
    source: 'Reviews of Geophysics 58, e2019RG000678',
    provenance: 'second-hand',
    remark: 'Read in the authors’ own published code.',
  }),
  publishedEntry({
    id: 'ar6-doubling-adjusted',
    quantity: 'adjusted-doubling-forcing',
    label: 'AR6 adjusted forcing of a CO₂ doubling',
    best: 3.75,
    unit,
    edition: ar6,
    source: 'Chapter 7, §7.3.2',
    provenance: 'seen',
    remark: 'Before the tropospheric adjustment of +5 % that makes it 3.93.',
  }),
  publishedEntry({
    id: 'ar5-doubling-adjusted',
    quantity: 'adjusted-doubling-forcing',
    label: 'AR5 adjusted forcing of a CO₂ doubling',
    best: 3.71,
    unit,
    edition: ar5,
    source: 'Chapter 8',
    provenance: 'second-hand',
    remark: '5.35 ln 2, after Myhre et al. 1998; as quoted in AR6, chapter 7.',
  }),
  ...adjustments.map(([id, gas, best, halfWidth, overall]) =>
    publishedEntry({
      id: `ar6-adjustment-${id}`,
      quantity: 'tropospheric-adjustment',
      subject: gas,
      label: `AR6 tropospheric adjustment, ${gas}`,
      best,
      ranges: [range90(best - halfWidth, best + halfWidth)],
      unit: '%',
      edition: ar6,
      source: 'Chapter 7, §7.3.2',
      provenance: 'seen',
      remark: `Of the stratospherically adjusted forcing. The effective forcing as a whole is given to ±${overall} % (5–95 %).`,
    }),
  ),
];
